import { collectReadings } from '../fitting/readings';
import type { DecaySeries } from '../types';
import type { BlankConstant } from './blankModel';

/** The catalyst's own constant, fitted beside a blank that is held. */
export interface OwnConstant {
  k: number;
  /** Of the fit alone; the blank's error is not in it. */
  se: number | null;
}

/** Steps of the integration over a well's readings, at least. */
const STEPS = 240;
const MOST_ROUNDS = 60;
const CLOSE_ENOUGH = 1e-11;

/**
 * Fits −dC/dt = k Cⁿ + k_b C^m, k_b and m held, by Gauss–Newton with damping (Levenberg 1944). The
 * curve is integrated by the classical method of Runge (1895) and Kutta (1901).
 *
 * @param start k and C0 to begin with, base units
 * @returns null where the search does not settle, or readings do not carry concentrations
 */
export function fitBesideBlank(
  series: DecaySeries,
  order: number,
  blank: BlankConstant,
  start: { k: number; c0: number },
): OwnConstant | null {
  if (series.kind === 'signal' || !(start.c0 > 0 && start.k > 0)) return null;
  const readings = collectReadings(series);
  const unit = start.c0;
  const growing = series.kind !== 'reactant';
  const origin = growing ? 0 : readings.times[0]!;
  const span = readings.times[readings.times.length - 1]! - origin;
  if (!(span > 0)) return null;
  const times = readings.times.map((time) => Math.max(time - origin, 0) / span);
  const concentrations = readings.values.map((value) => {
    if (series.kind === 'product') return value / series.productPerReactant / unit;
    if (series.kind === 'conversion') return value;
    return value / unit;
  });
  // In units of C0 and of the span.
  const rates = (k: number): Rates => ({
    order,
    k,
    blankOrder: blank.order,
    blankK: blank.k * unit ** (blank.order - 1) * span,
  });
  const fixed = series.kind === 'conversion';
  const curve = ([k, c0]: readonly number[]) => {
    const amount = fixed ? 1 : c0!;
    const c = integrate(rates(k!), amount, times);
    return growing ? c.map((value) => amount - value) : c;
  };
  const scaledK = start.k * unit ** (order - 1) * span;
  const found = settle(curve, concentrations, fixed ? [scaledK] : [scaledK, 1]);
  if (found === null) return null;
  const toK = unit ** (1 - order) / span;
  return { k: found.k * toK, se: found.se === null ? null : found.se * toK };
}

interface Rates {
  order: number;
  k: number;
  blankOrder: number;
  blankK: number;
}

/** C at each time, from `c0` at 0; what is used up stays at 0. */
function integrate({ order, k, blankOrder, blankK }: Rates, c0: number, times: number[]): number[] {
  const fall = (c: number) => (c > 0 ? -k * c ** order - blankK * c ** blankOrder : 0);
  let [t, c] = [0, c0];
  return times.map((time) => {
    const steps = Math.max(Math.ceil((time - t) * STEPS), 1);
    const h = (time - t) / steps;
    for (let i = 0; i < steps && h > 0; i += 1) {
      const a = fall(c);
      const b = fall(c + (h / 2) * a);
      const d = fall(c + (h / 2) * b);
      const e = fall(c + h * d);
      c = Math.max(c + (h / 6) * (a + 2 * b + 2 * d + e), 0);
    }
    t = time;
    return c;
  });
}

type Curve = (parameters: readonly number[]) => number[];

const squares = (values: readonly number[]) =>
  values.reduce((sum, value) => sum + value * value, 0);

/** Least squares in k and, as the second parameter if there is one, C0. */
function settle(curve: Curve, readings: readonly number[], start: number[]): OwnConstant | null {
  const residuals = (at: readonly number[]) => curve(at).map((value, i) => readings[i]! - value);
  let at = start;
  let rest = residuals(at);
  let damping = 1e-3;
  for (let round = 0; round < MOST_ROUNDS; round += 1) {
    const { kk, ka, aa, gk, ga } = normalEquations(curve, at, rest);
    const [dk, da] = [kk * (1 + damping), aa * (1 + damping)];
    const determinant = dk * da - ka * ka;
    const step = [(gk * da - ga * ka) / determinant, (ga * dk - gk * ka) / determinant];
    const next = at.map((value, i) => value + step[i]!);
    const after = residuals(next);
    if (!(squares(after) <= squares(rest))) {
      damping *= 8;
      if (damping > 1e9) break;
      continue;
    }
    const small = next.every(
      (value, i) => Math.abs(value - at[i]!) <= CLOSE_ENOUGH * Math.abs(value),
    );
    [at, rest, damping] = [next, after, damping / 8];
    if (small) break;
  }
  const dof = readings.length - start.length;
  const { kk, ka, aa } = normalEquations(curve, at, rest);
  const variance = (squares(rest) / dof) * (aa / (kk * aa - ka * ka));
  const k = at[0]!;
  if (!Number.isFinite(k)) return null;
  return { k, se: dof > 0 && variance >= 0 ? Math.sqrt(variance) : null };
}

function normalEquations(curve: Curve, at: readonly number[], rest: readonly number[]) {
  const columns = at.map((value, j) => {
    const h = 1e-5 * Math.max(Math.abs(value), 1e-3);
    const shifted = (by: number) => curve(at.map((one, i) => (i === j ? one + by : one)));
    const [up, down] = [shifted(h), shifted(-h)];
    return up.map((one, i) => (one - down[i]!) / (2 * h));
  });
  const [k, a] = [columns[0]!, columns[1] ?? null];
  let [kk, ka, aa, gk, ga] = [0, 0, a === null ? 1 : 0, 0, 0];
  for (let i = 0; i < rest.length; i += 1) {
    kk += k[i]! ** 2;
    gk += k[i]! * rest[i]!;
    if (a === null) continue;
    ka += k[i]! * a[i]!;
    aa += a[i]! ** 2;
    ga += a[i]! * rest[i]!;
  }
  return { kk, ka, aa, gk, ga };
}

import {
  HIGHEST_ORDER,
  log1pOver,
  LOWEST_ORDER,
  orderSlope,
  relativeOfOrder,
} from '../rateLaws/apparentOrder';
import type { RelativeFit } from './fitLaw';
import { fitShape, type ShapeFit, type ShapeRange, type TwoParameterFill } from './fitShape';
import type { ReadingMode } from './problem';

/** The free order of −dC/dt = k Cⁿ in one well. */
export interface ApparentOrderFit {
  order: number;
  /** Null where the order is not determined or lies at an end of its range. */
  orderSe: number | null;
  /** The reading's base unit, squared. */
  rss: number;
  parameters: number;
  dof: number;
}

/** Where the search for n starts from a fit of order 0, 1 or 2: off the kink of n = 0. */
const startOrder = (order: number) => (order === 0 ? 0.2 : order);

const range: ShapeRange = { p: [-700, 700], q: [LOWEST_ORDER, HIGHEST_ORDER] };
const SMALLEST_GAIN = 1e-12;

/** Shape parameters ln kRel and n. */
const orderFill =
  (mode: ReadingMode): TwoParameterFill =>
  (lnRate, order, t, f, byRate, byOrder) => {
    const kRel = Math.exp(lnRate);
    const sign = mode === 'decay' ? 1 : -1;
    for (let i = 0; i < t.length; i += 1) {
      const u = kRel * t[i]!;
      const g = relativeOfOrder(order, u);
      const x = (order - 1) * u;
      f[i] = mode === 'decay' ? g : x <= -1 ? 1 : -Math.expm1(-u * log1pOver(x));
      // −u gⁿ = −u g/(1 + (n−1)u), without a power.
      byRate[i] = g > 0 ? (-sign * u * g) / (1 + x) : 0;
      byOrder[i] = sign * orderSlope(order, u, g);
    }
  };

/**
 * Fits the apparent order together with kRel and the amplitude, n between −1 and 4, from the two
 * best of the given fits.
 *
 * @param fits fits of whole orders to the same well
 * @returns null when no given fit decays or there are no degrees of freedom
 */
export function fitApparentOrder(fits: readonly RelativeFit[]): ApparentOrderFit | null {
  const starts = fits
    .filter((fit) => fit.kRel !== null && fit.kRel > 0 && fit.amplitude !== null)
    .sort((a, b) => a.rss - b.rss)
    .slice(0, 2);
  const first = starts[0];
  if (first === undefined) return null;
  const { problem } = first;
  const fixed = problem.mode === 'fraction';
  const parameters = fixed ? 2 : 3;
  const dof = problem.t.length - parameters;
  if (dof < 1) return null;
  const fill = orderFill(problem.mode);
  let best: ShapeFit | null = null;
  for (const fit of starts) {
    const start = { p: Math.log(fit.kRel! * problem.timeScale), q: startOrder(fit.law.order) };
    const found = fitShape(fill, problem, start, range, fixed, SMALLEST_GAIN);
    if (best === null || found.rss < best.rss) best = found;
  }
  const { q: order, rss, inverse } = best!;
  const inside = order > LOWEST_ORDER && order < HIGHEST_ORDER;
  return {
    order,
    orderSe: inside && inverse !== null ? Math.sqrt((inverse.qq * rss) / dof) : null,
    rss: rss * problem.valueScale ** 2,
    parameters,
    dof,
  };
}

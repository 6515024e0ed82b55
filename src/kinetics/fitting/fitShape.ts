import type { FitProblem } from './problem';

/**
 * A shape f(t; p, q) over all readings: fills in f, ∂f/∂p and ∂f/∂q, each as long as `t`.
 */
export type TwoParameterFill = (
  p: number,
  q: number,
  t: Float64Array,
  f: Float64Array,
  byP: Float64Array,
  byQ: Float64Array,
) => void;

/** Where p and q may lie; a step beyond an end stops there. */
export interface ShapeRange {
  p: readonly [low: number, high: number];
  q: readonly [low: number, high: number];
}

/** The least-squares fit y = A f(t; p, q). */
export interface ShapeFit {
  amplitude: number;
  p: number;
  q: number;
  rss: number;
  /** (JᵀJ)⁻¹ of p and q, the amplitude eliminated; null where it is singular. */
  inverse: { pp: number; pq: number; qq: number } | null;
}

const MOST_STEPS = 60;
const MOST_DAMPING = 1e10;
const SINGULAR = 1e-13;

let f = new Float64Array(256);
let byP = new Float64Array(256);
let byQ = new Float64Array(256);

/** Sums of one trial. */
interface Trial {
  p: number;
  q: number;
  amplitude: number;
  rss: number;
  gp: number;
  gq: number;
  hpp: number;
  hpq: number;
  hqq: number;
}

const emptyTrial = (): Trial => ({
  p: 0.5,
  q: 0.5,
  amplitude: 0.5,
  rss: 0.5,
  gp: 0.5,
  gq: 0.5,
  hpp: 0.5,
  hpq: 0.5,
  hqq: 0.5,
});

/** The best trial and the one under way change places: a search leaves nothing to clean up. */
const trials: [Trial, Trial] = [emptyTrial(), emptyTrial()];

/**
 * Least squares with the amplitude profiled out (Golub & Pereyra 1973, with the Jacobian of Kaufman
 * 1975) and Marquardt's damping (1963).
 *
 * @param fixed the amplitude is 1
 * @param smallestGain relative fall of the sum of squares below which the search stops
 */
export function fitShape(
  fill: TwoParameterFill,
  problem: Pick<FitProblem, 't' | 'y' | 'roots'>,
  start: { p: number; q: number },
  range: ShapeRange,
  fixed: boolean,
  smallestGain: number,
): ShapeFit {
  const { t, y, roots } = problem;
  makeRoom(t.length);
  let [best, trial] = trials;
  tryAt(best, fill, t, y, roots, start.p, start.q, fixed);
  let damping = 1e-3;
  for (let i = 0; i < MOST_STEPS && damping < MOST_DAMPING; i += 1) {
    const step = dampedStep(best, range, damping);
    const p = within(best.p + step.p, range.p);
    const q = within(best.q + step.q, range.q);
    // What the linearised curve promises; near the optimum it is what is still to be had.
    const promised = (p - best.p) * best.gp + (q - best.q) * best.gq;
    if (!(promised > 0)) break;
    tryAt(trial, fill, t, y, roots, p, q, fixed);
    const gained = trial.rss < best.rss;
    if (gained) [best, trial] = [trial, best];
    if (promised < smallestGain * best.rss) break;
    damping = gained ? Math.max(damping / 8, 1e-12) : damping * 6;
  }
  const { amplitude, p, q, rss, hpp, hpq, hqq } = best;
  const determinant = hpp * hqq - hpq * hpq;
  const regular = determinant > SINGULAR * hpp * hqq;
  return {
    amplitude,
    p,
    q,
    rss,
    inverse: regular
      ? { pp: hqq / determinant, pq: -hpq / determinant, qq: hpp / determinant }
      : null,
  };
}

/** Marquardt's step; a parameter that its end of the range holds back stays there. */
function dampedStep(at: Trial, range: ShapeRange, damping: number): { p: number; q: number } {
  const held = (value: number, [low, high]: readonly [number, number], gradient: number) =>
    (value <= low && gradient < 0) || (value >= high && gradient > 0);
  const hpp = at.hpp * (1 + damping) + 1e-300;
  const hqq = at.hqq * (1 + damping) + 1e-300;
  const pHeld = held(at.p, range.p, at.gp);
  const qHeld = held(at.q, range.q, at.gq);
  const determinant = hpp * hqq - at.hpq * at.hpq;
  if (pHeld || qHeld || !(determinant > SINGULAR * hpp * hqq)) {
    return { p: pHeld ? 0 : at.gp / hpp, q: qHeld ? 0 : at.gq / hqq };
  }
  return {
    p: (hqq * at.gp - at.hpq * at.gq) / determinant,
    q: (hpp * at.gq - at.hpq * at.gp) / determinant,
  };
}

function makeRoom(n: number): void {
  if (f.length >= n) return;
  f = new Float64Array(2 * n);
  byP = new Float64Array(2 * n);
  byQ = new Float64Array(2 * n);
}

const within = (value: number, [low, high]: readonly [number, number]) =>
  Math.min(Math.max(value, low), high);

function tryAt(
  into: Trial,
  fill: TwoParameterFill,
  t: Float64Array,
  y: Float64Array,
  roots: Float64Array | null,
  p: number,
  q: number,
  fixed: boolean,
): void {
  fill(p, q, t, f, byP, byQ);
  const n = t.length;
  if (roots !== null) {
    for (let i = 0; i < n; i += 1) {
      f[i]! *= roots[i]!;
      byP[i]! *= roots[i]!;
      byQ[i]! *= roots[i]!;
    }
  }
  let [fy, ff, fp, fq, pp, pq, qq] = [0, 0, 0, 0, 0, 0, 0];
  for (let i = 0; i < n; i += 1) {
    const fi = f[i]!;
    const pi = byP[i]!;
    const qi = byQ[i]!;
    fy += fi * y[i]!;
    ff += fi * fi;
    fp += fi * pi;
    fq += fi * qi;
    pp += pi * pi;
    pq += pi * qi;
    qq += qi * qi;
  }
  const amplitude = fixed ? 1 : ff > 0 ? fy / ff : 0;
  let [rss, gp, gq] = [0, 0, 0];
  for (let i = 0; i < n; i += 1) {
    const residual = y[i]! - amplitude * f[i]!;
    rss += residual * residual;
    gp += residual * byP[i]!;
    gq += residual * byQ[i]!;
  }
  if (!fixed && ff > 0) {
    pp -= (fp * fp) / ff;
    pq -= (fp * fq) / ff;
    qq -= (fq * fq) / ff;
  }
  const square = amplitude * amplitude;
  into.p = p;
  into.q = q;
  into.amplitude = amplitude;
  into.rss = Number.isFinite(rss) ? rss : Infinity;
  into.gp = amplitude * gp;
  into.gq = amplitude * gq;
  into.hpp = square * Math.max(pp, 0);
  into.hpq = square * pq;
  into.hqq = square * Math.max(qq, 0);
}

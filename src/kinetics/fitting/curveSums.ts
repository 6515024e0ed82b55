import type { RateLaw } from '../rateLaws/rateLaw';
import type { FitProblem } from './problem';

/** One curve over a well's readings, scaled: what its least squares are made of. */
export interface CurveSums {
  amplitude: number;
  rss: number;
  /** Sums over the Jacobian's columns, amplitude and kRel. */
  aa: number;
  ak: number;
  kk: number;
}

let f = new Float64Array(256);
let byRate = new Float64Array(256);

/** Room for `n` readings; what it holds is over at the next curve. */
function makeRoom(n: number): void {
  if (f.length >= n) return;
  f = new Float64Array(2 * n);
  byRate = new Float64Array(2 * n);
}

/** Fills in f and ∂f/∂kRel of a law for the readings of a problem. */
function fill(problem: FitProblem, law: RateLaw, kRel: number): void {
  makeRoom(problem.t.length);
  if (problem.mode === 'decay') law.decayFill(kRel, problem.t, f, byRate);
  else law.growthFill(kRel, problem.t, f, byRate);
  const { roots } = problem;
  if (roots === null) return;
  for (let i = 0; i < roots.length; i += 1) {
    f[i]! *= roots[i]!;
    byRate[i]! *= roots[i]!;
  }
}

/** The curve of a law at kRel with the amplitude that fits best, or 1 for a fraction. */
export function fitAmplitude(problem: FitProblem, law: RateLaw, kRel: number): CurveSums {
  fill(problem, law, kRel);
  const { y, mode } = problem;
  let fy = 0;
  let ff = 0;
  for (let i = 0; i < y.length; i += 1) {
    fy += f[i]! * y[i]!;
    ff += f[i]! * f[i]!;
  }
  const amplitude = mode === 'fraction' ? 1 : ff > 0 ? fy / ff : 0;
  return sumsAt(y, amplitude, mode === 'fraction' ? 1 : ff, mode === 'fraction');
}

/** The curve of a law at kRel and an amplitude. */
export function curveSums(
  problem: FitProblem,
  law: RateLaw,
  kRel: number,
  amplitude: number,
): CurveSums {
  fill(problem, law, kRel);
  let ff = 0;
  for (let i = 0; i < problem.y.length; i += 1) ff += f[i]! * f[i]!;
  const fixed = problem.mode === 'fraction';
  return sumsAt(problem.y, amplitude, fixed ? 1 : ff, fixed);
}

function sumsAt(y: Float64Array, amplitude: number, aa: number, fixed: boolean): CurveSums {
  let rss = 0;
  let fd = 0;
  let dd = 0;
  for (let i = 0; i < y.length; i += 1) {
    const residual = y[i]! - amplitude * f[i]!;
    const slope = byRate[i]!;
    rss += residual * residual;
    fd += f[i]! * slope;
    dd += slope * slope;
  }
  return { amplitude, rss, aa, ak: fixed ? 0 : amplitude * fd, kk: amplitude * amplitude * dd };
}

/** Scaled residuals of a curve, in time order. */
export function residualsOfCurve(
  problem: FitProblem,
  law: RateLaw,
  kRel: number,
  amplitude: number,
): number[] {
  fill(problem, law, kRel);
  return Array.from(problem.y, (value, i) => value - amplitude * f[i]!);
}

/** Diagonal of the hat matrix of a curve whose sums are regular. */
export function leveragesOfCurve(
  problem: FitProblem,
  law: RateLaw,
  kRel: number,
  { amplitude, aa, ak, kk }: CurveSums,
): number[] {
  fill(problem, law, kRel);
  const determinant = aa * kk - ak * ak;
  return Array.from(problem.y, (_, i) => {
    const byAmplitude = problem.mode === 'fraction' ? 0 : f[i]!;
    const slope = amplitude * byRate[i]!;
    return (kk * byAmplitude ** 2 - 2 * ak * byAmplitude * slope + aa * slope ** 2) / determinant;
  });
}

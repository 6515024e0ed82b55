import type { RateLaw } from '../rateLaws/rateLaw';
import { invertPositive } from '../statistics/positiveDefinite';
import type { FitProblem } from './problem';
import { lowestInBracket } from './rootInBracket';

/** y = A g(κt) + B for a decay, y = A (1 − g(κt)) for growth, in the reading's base unit and s. */
export interface LevelFit {
  law: RateLaw;
  problem: FitProblem;
  amplitude: number;
  /** κ, s⁻¹: the rate of approach over the distance from the level. */
  kRel: number;
  /** B; 0 for growth, whose level is what A falls short by. */
  level: number;
  rss: number;
  parameters: number;
  dof: number;
  /** Of (A, κ, B), row by row; B's are 0 for growth. Null where it is singular. */
  covariance: number[] | null;
}

const FASTEST_STEPS = 300;
const SLOWEST = 0.02;
const GRID = 1.6;
const POLISHING = 12;

/** The linear parameters at one κ, scaled. */
interface Linear {
  amplitude: number;
  level: number;
  rss: number;
}

/**
 * Least squares of a law that approaches a level which stays, amplitude and level profiled out
 * (Golub & Pereyra 1973); κ by a search over the decades, refined by Gauss–Newton.
 *
 * @param problem at least 4 readings at 3 distinct times
 * @returns null where no approach can be told from a level alone
 */
export function fitLevel(problem: FitProblem, law: RateLaw): LevelFit | null {
  const { t, firstStep, mode } = problem;
  const growing = mode !== 'decay';
  const shape = (u: number) => (growing ? law.converted(u) : law.relative(u));
  const at = (kRel: number) => linearAt(problem, (i) => shape(kRel * t[i]!), growing);
  const grid: number[] = [];
  for (let k = SLOWEST; k < FASTEST_STEPS / firstStep && k < 1e9; k *= GRID) grid.push(k);
  const heights = grid.map((kRel) => at(kRel).rss);
  const best = heights.indexOf(Math.min(...heights));
  const [low, high] = [grid[Math.max(best - 1, 0)]!, grid[Math.min(best + 1, grid.length - 1)]!];
  let kRel = lowestInBracket((k) => at(k).rss, low, high);
  for (let i = 0; i < POLISHING; i += 1) {
    const step = gaussNewton(problem, law, kRel, at(kRel), growing);
    if (step === null) break;
    const next = kRel + step;
    if (!(next > low && next < high) || at(next).rss > at(kRel).rss) break;
    const small = Math.abs(step) < 1e-13 * kRel;
    kRel = next;
    if (small) break;
  }
  const { amplitude, level, rss } = at(kRel);
  if (!Number.isFinite(rss) || !(amplitude > 0)) return null;
  const parameters = growing ? 2 : 3;
  const dof = t.length - parameters;
  const columns = columnsAt(problem, law, kRel, amplitude, growing);
  return {
    law,
    problem,
    amplitude: amplitude * problem.valueScale,
    kRel: kRel / problem.timeScale,
    level: level * problem.valueScale,
    rss: rss * problem.valueScale * problem.valueScale,
    parameters,
    dof,
    covariance: covarianceOf(columns, rss / dof, problem, dof),
  };
}

/** A (and B of a decay) that fit best at one shape. */
function linearAt({ t, y }: FitProblem, shape: (i: number) => number, growing: boolean): Linear {
  let [f, ff, s, fs] = [0, 0, 0, 0];
  for (let i = 0; i < t.length; i += 1) {
    const value = shape(i);
    f += value;
    ff += value * value;
    s += y[i]!;
    fs += value * y[i]!;
  }
  const n = t.length;
  const determinant = n * ff - f * f;
  const free = !growing && determinant > 1e-12 * n * ff;
  const amplitude = free ? (n * fs - f * s) / determinant : ff > 0 ? fs / ff : 0;
  const level = free ? (s - amplitude * f) / n : 0;
  let rss = 0;
  for (let i = 0; i < n; i += 1) rss += (y[i]! - amplitude * shape(i) - level) ** 2;
  return { amplitude, level, rss };
}

/** Derivatives of the curve by A, κ and, for a decay, B. */
function columnsAt(
  { t }: FitProblem,
  law: RateLaw,
  kRel: number,
  amplitude: number,
  growing: boolean,
): number[][] {
  const sign = growing ? -1 : 1;
  return Array.from(t, (time) => {
    const u = kRel * time;
    const shape = growing ? law.converted(u) : law.relative(u);
    const byRate = sign * amplitude * time * law.slope(u);
    return growing ? [shape, byRate] : [shape, byRate, 1];
  });
}

function normalOf(columns: readonly (readonly number[])[]): number[][] {
  const size = columns[0]?.length ?? 0;
  return Array.from({ length: size }, (_, a) =>
    Array.from({ length: size }, (__, b) =>
      columns.reduce((sum, row) => sum + row[a]! * row[b]!, 0),
    ),
  );
}

function gaussNewton(
  problem: FitProblem,
  law: RateLaw,
  kRel: number,
  { amplitude, level }: Linear,
  growing: boolean,
): number | null {
  const columns = columnsAt(problem, law, kRel, amplitude, growing);
  const inverse = invertPositive(normalOf(columns));
  if (inverse === null) return null;
  const right = inverse.map((_, a) =>
    columns.reduce((sum, row, i) => {
      const residual = problem.y[i]! - amplitude * row[0]! - level;
      return sum + row[a]! * residual;
    }, 0),
  );
  return inverse[1]!.reduce((sum, value, b) => sum + value * right[b]!, 0);
}

function covarianceOf(
  columns: readonly (readonly number[])[],
  variance: number,
  { valueScale, timeScale }: FitProblem,
  dof: number,
): number[] | null {
  const inverse = dof > 0 ? invertPositive(normalOf(columns)) : null;
  if (inverse === null) return null;
  const unit = [valueScale, 1 / timeScale, valueScale];
  const covariance = [0, 1, 2].flatMap((a) =>
    [0, 1, 2].map((b) => (inverse[a]?.[b] ?? 0) * variance * unit[a]! * unit[b]!),
  );
  return covariance.every(Number.isFinite) ? covariance : null;
}

/** Readings less the curve, in the reading's base unit, in time order. */
export function levelResiduals({ law, problem, amplitude, kRel, level }: LevelFit): number[] {
  const growing = problem.mode !== 'decay';
  return Array.from(problem.y, (y, i) => {
    const u = kRel * problem.timeScale * problem.t[i]!;
    const shape = growing ? law.converted(u) : law.relative(u);
    return y * problem.valueScale - amplitude * shape - level;
  });
}

/** Diagonal of the hat matrix, in time order; null where the Jacobian is singular. */
export function levelLeverages(fit: LevelFit): number[] | null {
  const { law, problem, amplitude, kRel } = fit;
  const columns = columnsAt(
    problem,
    law,
    kRel * problem.timeScale,
    amplitude / problem.valueScale,
    problem.mode !== 'decay',
  );
  const inverse = invertPositive(normalOf(columns));
  if (inverse === null) return null;
  return columns.map((row) =>
    row.reduce((sum, a, i) => sum + a * row.reduce((s, b, j) => s + b * inverse[i]![j]!, 0), 0),
  );
}

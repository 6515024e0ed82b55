import type { RateLaw } from '../rateLaws/rateLaw';
import type { FitProblem } from './problem';
import { fitAmplitude, type CurveSums } from './curveSums';
import { integralRate, newtonSums, profiledNewton } from './profiledNewton';
import { lowestInBracket, rootInBracket } from './rootInBracket';

/** The best kRel of a law for scaled readings, its amplitude profiled out. */
export interface RelativeRate {
  /** Scaled kRel. */
  kRel: number;
  /** Scaled amplitude A. */
  amplitude: number;
  rss: number;
  /** True when the search ended at the end of its range: kRel is then only a bound. */
  atBound: boolean;
  /** Sums of the curve, where the search ended with them. */
  sums: CurveSums | null;
}

/** Scaled kRel below which growth cannot be told from a straight line. */
const LEAST_GROWTH = 1e-6;
const MOST_STEPS = 1e3;
const FARTHEST = 1e10;

function searchGrid(problem: FitProblem, law: RateLaw): number[] {
  const top = Math.min(MOST_STEPS / problem.firstStep, FARTHEST);
  const grid: number[] = [];
  if (problem.mode === 'growth') {
    for (let k = LEAST_GROWTH; k < 0.01; k *= 3.1) grid.push(k);
  } else {
    const bottom = Math.max(0.9 * law.lowestU, -5);
    grid.push(bottom, 0.4 * bottom, 0.1 * bottom, 0.01 * bottom, 0);
  }
  for (let k = 0.01; k < top; k *= 1.8) grid.push(k);
  grid.push(top);
  return grid;
}

/** A curve that leaves less of Σ(y − ȳ)² than this has no rival minimum. */
const CLEARLY_FALLING = 0.2;

/**
 * Least-squares kRel of one law, its amplitude profiled out. Readings that clearly follow a falling
 * curve of order 1 or more have one minimum, which Newton's method finds at once; the others are
 * searched over the decades.
 */
export function searchRelativeRate(problem: FitProblem, law: RateLaw): RelativeRate {
  const quick = law.order >= 1 ? newtonRate(problem, law) : null;
  return quick ?? searchDecades(problem, law);
}

function newtonRate(problem: FitProblem, law: RateLaw): RelativeRate | null {
  const { t, y, mode } = problem;
  const fixed = mode === 'fraction';
  const start = mode === 'decay' ? integralRate(t, y, law.order < 1.5 ? 1 : 2) : 1;
  if (!(start > 1e-3)) return null;
  const sumsAt = mode === 'decay' ? law.decaySums : law.growthSums;
  const kRel = profiledNewton(sumsAt, t, y, start, fixed);
  if (!(kRel > 1e-3 && kRel < MOST_STEPS / problem.firstStep)) return null;
  const sums =
    (mode === 'decay' ? decaySumsAt(problem, law) : null) ?? fitAmplitude(problem, law, kRel);
  const { amplitude, rss } = sums;
  return rss < CLEARLY_FALLING * problem.spread
    ? { kRel, amplitude, rss, atBound: false, sums }
    : null;
}

/** Residuals smaller than this beside the readings lose digits when they come from sums. */
const LEAST_SHARE = 1e-6;

/**
 * The curve's sums from those of the search, without another pass: for −dg/du = gⁿ the second
 * derivative of Σf² is 2(1 + n) Σf'². Null where the residuals are too small for that.
 */
function decaySumsAt({ squares }: FitProblem, { order }: RateLaw): CurveSums | null {
  const [fy, ff, ff1, ff2] = [newtonSums[0]!, newtonSums[3]!, newtonSums[4]!, newtonSums[5]!];
  const amplitude = fy / ff;
  const rss = squares - amplitude * fy;
  if (!(rss > LEAST_SHARE * squares)) return null;
  const ak = 0.5 * amplitude * ff1;
  return { amplitude, rss, aa: ff, ak, kk: (amplitude * amplitude * ff2) / (2 * (1 + order)) };
}

/**
 * Global search: the amplitude is linear and drops out (Golub & Pereyra 1973), a grid over the
 * decades brackets every minimum, and the two best are refined on the analytic gradient to the last
 * digits.
 */
function searchDecades(problem: FitProblem, law: RateLaw): RelativeRate {
  const { t, y, mode } = problem;
  const n = t.length;
  const shape = new Float64Array(n);
  let amplitude = 1;
  let gradient = 0;

  const rssAt = (kRel: number): number => {
    let yy = 0;
    let ff = 0;
    for (let i = 0; i < n; i += 1) {
      const u = kRel * t[i]!;
      const f = mode === 'decay' ? law.relative(u) : law.converted(u);
      shape[i] = f;
      yy += f * y[i]!;
      ff += f * f;
    }
    amplitude = mode === 'fraction' ? 1 : ff > 0 ? yy / ff : 0;
    let rss = 0;
    for (let i = 0; i < n; i += 1) rss += (y[i]! - amplitude * shape[i]!) ** 2;
    return rss;
  };
  // dRSS/dkRel; the profiled amplitude contributes nothing to it.
  const gradientAt = (kRel: number): number => {
    rssAt(kRel);
    gradient = 0;
    for (let i = 0; i < n; i += 1) {
      const slope = t[i]! * law.slope(kRel * t[i]!);
      gradient += (y[i]! - amplitude * shape[i]!) * amplitude * (mode === 'decay' ? slope : -slope);
    }
    return -2 * gradient;
  };

  const grid = searchGrid(problem, law);
  const heights = grid.map(rssAt);
  const minima = grid
    .map((_, j) => j)
    .filter(
      (j) =>
        heights[j]! <= (heights[j - 1] ?? Infinity) && heights[j]! <= (heights[j + 1] ?? Infinity),
    )
    .sort((a, b) => heights[a]! - heights[b]! || a - b)
    .slice(0, 2);

  let best: { kRel: number; rss: number } | null = null;
  for (const j of minima) {
    const low = grid[Math.max(j - 1, 0)]!;
    const high = grid[Math.min(j + 1, grid.length - 1)]!;
    const atLow = gradientAt(low);
    const atHigh = gradientAt(high);
    const candidates = [grid[j]!];
    if (atLow < 0 && atHigh > 0)
      candidates.push(rootInBracket(gradientAt, low, high, atLow, atHigh));
    else if (j > 0 && j < grid.length - 1) candidates.push(lowestInBracket(rssAt, low, high));
    for (const kRel of candidates) {
      const rss = rssAt(kRel);
      // The refined root wins a tie: at the floor of rounding rss no longer tells them apart.
      if (best === null || rss <= best.rss) best = { kRel, rss };
    }
  }
  const kRel = best?.kRel ?? 0;
  const rss = rssAt(kRel);
  return {
    kRel,
    amplitude,
    rss,
    atBound: kRel <= grid[0]! || kRel >= grid[grid.length - 1]!,
    sums: null,
  };
}

import type { FitProblem } from './problem';
import type { RelativeRate } from './searchRelativeRate';
import { studentTUpperTail } from '../statistics/tDistribution';

/** A zero-order optimum; for growth that has not run out only the slope is known. */
export interface ZeroOrderRate extends RelativeRate {
  /** Scaled slope of growth before exhaustion; null once amplitude and kRel are known. */
  slopeOnly: number | null;
}

interface Candidate {
  explained: number;
  kRel: number;
  amplitude: number;
}

/** Exhaustion of growth is believed when a straight line misses at this level. */
const EXHAUSTION_LEVEL = 0.01;

/**
 * Global least squares of the zero-order law: between two neighbouring reading times the problem
 * is linear, so running sums give the optimum of every interval, and the best of all intervals and
 * of their ends is the global one, without iterating.
 */
export function searchExhaustion(problem: FitProblem): ZeroOrderRate {
  const best =
    problem.mode === 'decay'
      ? bestDecay(problem)
      : bestOf(problem.mode === 'growth' ? growthCandidates(problem) : fractionCandidates(problem));
  const rss = residualSquares(problem, best);
  const found = {
    kRel: best.kRel,
    amplitude: best.amplitude,
    rss,
    atBound: false,
    sums: null,
    slopeOnly: null,
  };
  return problem.mode === 'growth' ? believeExhaustion(problem, found) : found;
}

function bestOf(candidates: readonly Candidate[]): Candidate {
  // Squares of the shortest spans vanish, and what is divided by them says nothing.
  const told = candidates.filter(({ explained, kRel }) => Number.isFinite(explained + kRel));
  const nothing = { explained: -Infinity, kRel: 0, amplitude: 1 };
  return told.reduce((best, one) => (one.explained > best.explained ? one : best), nothing);
}

function residualSquares(
  problem: FitProblem,
  { kRel, amplitude }: Candidate | RelativeRate,
): number {
  let rss = 0;
  for (let i = 0; i < problem.t.length; i += 1) {
    const u = kRel * problem.t[i]!;
    const shape = problem.mode === 'decay' ? Math.max(1 - u, 0) : Math.min(u, 1);
    rss += (problem.y[i]! - amplitude * shape) ** 2;
  }
  return rss;
}

/** Sums over the first m readings, for m = 1 … n. */
function eachPrefix(
  problem: FitProblem,
  visit: (sums: { m: number; t: number; tt: number; y: number; ty: number; next: number }) => void,
): void {
  const { t, y } = problem;
  let [st, stt, sy, sty] = [0, 0, 0, 0];
  for (let i = 0; i < t.length; i += 1) {
    st += t[i]!;
    stt += t[i]! * t[i]!;
    sy += y[i]!;
    sty += t[i]! * y[i]!;
    const next = t[i + 1] ?? Infinity;
    if (next > t[i]!) visit({ m: i + 1, t: st, tt: stt, y: sy, ty: sty, next });
  }
}

/**
 * The decay that explains most: the best line through the first m readings where it runs out before
 * the next, and the best curve that runs out just at the next.
 */
function bestDecay({ t, y }: FitProblem): Candidate {
  const n = t.length;
  let [st, stt, sy, sty] = [0, 0, 0, 0];
  // Readings that are all 0, or a line through 0 at the first reading, leave nothing above.
  let [explained, kRel, amplitude] = [-Infinity, 0, 0];
  for (let i = 0; i < n; i += 1) {
    const m = i + 1;
    const time = t[i]!;
    st += time;
    stt += time * time;
    sy += y[i]!;
    sty += time * y[i]!;
    const next = m < n ? t[m]! : Infinity;
    if (!(next > time)) continue;
    const determinant = m * stt - st * st;
    if (determinant > 0) {
      const slope = (m * sty - st * sy) / determinant;
      const level = (sy - slope * st) / m;
      const runsOutAt = slope < 0 && level > 0 ? -level / slope : Infinity;
      const here = level * sy + slope * sty;
      const fits = runsOutAt >= time && (runsOutAt <= next || next === Infinity);
      if (fits && here > explained && level !== 0) {
        [explained, kRel, amplitude] = [here, -slope / level, level];
      }
    }
    if (next < Infinity) {
      const shapeY = sy - sty / next;
      const shapeShape = m - (2 * st) / next + stt / (next * next);
      const here = (shapeY * shapeY) / shapeShape;
      if (here > explained) {
        [explained, kRel, amplitude] = [here, 1 / next, shapeY / shapeShape];
      }
    }
  }
  return { explained, kRel, amplitude };
}

function growthCandidates(problem: FitProblem): Candidate[] {
  const total = problem.y.reduce((sum, value) => sum + value, 0);
  const n = problem.t.length;
  const candidates: Candidate[] = [];
  eachPrefix(problem, ({ m, tt, y, ty, next }) => {
    if (next === Infinity) return;
    const rest = total - y;
    const level = rest / (n - m);
    const slope = tt > 0 ? ty / tt : 0;
    const runsOutAt = slope > 0 ? level / slope : NaN;
    if (runsOutAt >= problem.t[m - 1]! && runsOutAt <= next) {
      candidates.push({
        explained: slope * ty + level * rest,
        kRel: 1 / runsOutAt,
        amplitude: level,
      });
    }
    const shapeY = ty + next * rest;
    const shapeShape = tt + next * next * (n - m);
    const rate = shapeY / shapeShape;
    candidates.push({ explained: rate * shapeY, kRel: 1 / next, amplitude: rate * next });
  });
  return candidates;
}

function fractionCandidates(problem: FitProblem): Candidate[] {
  const total = problem.y.reduce((sum, value) => sum + value, 0);
  const n = problem.t.length;
  const candidates: Candidate[] = [];
  // Explained: Σy² − RSS, so that the three kinds share one comparison.
  eachPrefix(problem, ({ m, tt, y, ty, next }) => {
    const rest = 2 * (total - y) - (n - m);
    const rate = tt > 0 ? ty / tt : 0;
    const runsOutAt = rate > 0 ? 1 / rate : Infinity;
    if (tt > 0 && runsOutAt >= problem.t[m - 1]! && (runsOutAt <= next || next === Infinity)) {
      candidates.push({ explained: rate * ty + rest, kRel: rate, amplitude: 1 });
    }
    if (next < Infinity) {
      const explained = (2 * ty) / next - tt / (next * next) + rest;
      candidates.push({ explained, kRel: 1 / next, amplitude: 1 });
    }
  });
  return candidates.length > 0 ? candidates : [{ explained: 0, kRel: 0, amplitude: 1 }];
}

function believeExhaustion(problem: FitProblem, found: ZeroOrderRate): ZeroOrderRate {
  const { t, y } = problem;
  let [tt, ty] = [0, 0];
  for (let i = 0; i < t.length; i += 1) {
    tt += t[i]! * t[i]!;
    ty += t[i]! * y[i]!;
  }
  const slope = tt > 0 ? ty / tt : 0;
  const rss = y.reduce((sum, value, i) => sum + (value - slope * t[i]!) ** 2, 0);
  const dof = t.length - 2;
  const gain = Math.max(rss - found.rss, 0);
  const rounding = t.length * 1e-30;
  const tail =
    dof > 0 ? 2 * studentTUpperTail(Math.sqrt((gain * dof) / (found.rss + rounding)), dof) : 1;
  if (tail < EXHAUSTION_LEVEL && found.kRel * t[t.length - 1]! > 1) return found;
  return { kRel: 0, amplitude: 0, rss, atBound: false, sums: null, slopeOnly: slope };
}

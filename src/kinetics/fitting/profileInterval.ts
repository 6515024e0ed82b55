import { intervalFactor } from '../statistics/tDistribution';
import type { RelativeFit } from './fitLaw';
import type { FitProblem } from './problem';
import type { RateLaw } from '../rateLaws/rateLaw';
import { lowestInBracket, rootInBracket } from './rootInBracket';

/** Limits of k as multiples of its best value; `high` null where no k is too large. */
export interface ProfileInterval {
  low: number;
  high: number | null;
}

/** The sum of squares at the ends of the plain interval may differ so much from what it promises. */
const QUADRATIC_WITHIN = 0.15;
/** Limits beyond these multiples of k are none. */
const NEAREST_TO_0 = 1e-4;
const FARTHEST = 1e4;
/** How far, in ln, C0 may move to make up for another k. */
const AMPLITUDE_REACH = 1.5;

/**
 * The 95 % interval of k by its profile: where the sum of squares, everything else fitted anew,
 * rises to RSS (1 + t²/dof) (Bates & Watts 1988, ch. 6). Only where the plain interval k ± t se
 * misleads; where the sum of squares is a parabola both are one.
 *
 * @param fit of a law that has an order
 * @param relativeSe se(k)/k
 * @returns null where k ± t se will do, or k is not determined
 */
export function profileRateConstant(fit: RelativeFit, relativeSe: number): ProfileInterval | null {
  const { problem, law, amplitude, kRel, dof } = fit;
  if (amplitude === null || kRel === null || fit.growth !== null || !(dof > 0)) return null;
  if (!(amplitude > 0 && kRel > 0 && relativeSe > 0)) return null;
  const best = fit.rss / problem.valueScale ** 2;
  if (!(best > 0)) return null;
  const t = intervalFactor(dof);
  const bound = best * (1 + (t * t) / dof);
  const rssAt = profileOf(problem, law, amplitude / problem.valueScale, kRel * problem.timeScale);
  const excess = (lnK: number) => rssAt(Math.exp(lnK)) - bound;
  const half = t * relativeSe;
  const promised = (multiple: number) => {
    const rise = (rssAt(multiple) - best) / (bound - best);
    return Math.abs(rise - 1) < QUADRATIC_WITHIN;
  };
  if (half < 0.9 && promised(1 - half) && promised(1 + half)) return null;

  const low = crossing(excess, -half, Math.log(NEAREST_TO_0));
  const high = crossing(excess, half, Math.log(FARTHEST));
  return { low: low === null ? 0 : Math.exp(low), high: high === null ? null : Math.exp(high) };
}

/** Where the excess crosses 0 on one side of the best k; null where it never does. */
function crossing(excess: (lnK: number) => number, firstStep: number, farthest: number) {
  const atBest = excess(0);
  let [inner, atInner] = [0, atBest];
  const direction = Math.sign(firstStep);
  let outer = direction * Math.min(Math.abs(firstStep), 0.7);
  for (;;) {
    const atOuter = excess(outer);
    if (atOuter > 0) return rootInBracket(excess, inner, outer, atInner, atOuter);
    if (Math.abs(outer) >= Math.abs(farthest)) return null;
    [inner, atInner] = [outer, atOuter];
    outer = direction * Math.min(Math.abs(outer) * 1.7, Math.abs(farthest));
  }
}

/** RSS as a function of k over its best value, the amplitude fitted anew; scaled. */
function profileOf(problem: FitProblem, law: RateLaw, amplitude: number, kRel: number) {
  const { t, y, mode, roots } = problem;
  const n = law.order;
  const shape = (u: number) => (mode === 'decay' ? law.relative(u) : law.converted(u));
  const rss = (rate: number, a: number) => {
    let sum = 0;
    for (let i = 0; i < t.length; i += 1) {
      sum += (y[i]! - a * shape(rate * t[i]!) * (roots?.[i] ?? 1)) ** 2;
    }
    return sum;
  };
  if (mode === 'fraction') return (multiple: number) => rss(kRel * multiple, 1);
  if (n === 1) {
    return (multiple: number) => {
      let [fy, ff] = [0, 0];
      for (let i = 0; i < t.length; i += 1) {
        const f = shape(kRel * multiple * t[i]!) * (roots?.[i] ?? 1);
        fy += f * y[i]!;
        ff += f * f;
      }
      return rss(kRel * multiple, ff > 0 ? fy / ff : 0);
    };
  }
  // kRel = k Aⁿ⁻¹: at a given k the amplitude bends the curve too.
  return (multiple: number) => {
    const ofLn = (ln: number) => {
      const factor = Math.exp(ln);
      return rss(kRel * multiple * factor ** (n - 1), amplitude * factor);
    };
    return ofLn(lowestInBracket(ofLn, -AMPLITUDE_REACH, AMPLITUDE_REACH));
  };
}

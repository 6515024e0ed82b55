import type { RateLaw } from '../rateLaws/rateLaw';
import { saturatingShape } from '../rateLaws/saturating';
import type { Precision } from '../types';
import { completeFit, growthLine, type RelativeFit } from './fitLaw';
import { finishSaturating, type SaturatingFit } from './fitSaturating';
import { fitShape, type ShapeRange, type TwoParameterFill } from './fitShape';
import type { FitProblem } from './problem';

const SMALLEST_GAIN = 1e-13;
/** No reading counts as better than this share of the worst: near 0 a proportional error ends. */
const LEAST_SHARE = 0.01;

const rateRange: ShapeRange = { p: [-40, 40], q: [-1, 1] };
const saturatingRange: ShapeRange = { p: [-40, 40], q: [0, 1 - 1e-9] };

/**
 * The same readings with weights 1/σ², σ² = absolute² + (relative · C)² at the fitted curve (Carroll
 * & Ruppert 1988), scaled to a mean of 1, so that the residual standard deviation stays comparable.
 *
 * @param curve fitted readings, scaled as the problem's; the same for every law, so that their
 *   likelihoods compare
 */
export function weighted(
  problem: FitProblem,
  curve: readonly number[],
  { absolute, relative }: Precision,
): FitProblem {
  const deviations = curve.map((value) =>
    Math.hypot(absolute / problem.valueScale, relative * value),
  );
  const least = LEAST_SHARE * Math.max(...deviations);
  const weights = Float64Array.from(deviations, (deviation) => 1 / Math.max(deviation, least));
  const mean = weights.reduce((sum, w) => sum + w * w, 0) / weights.length;
  if (!(mean > 0) || !Number.isFinite(mean)) return problem;
  const roots = weights.map((w) => w / Math.sqrt(mean));
  return { ...problem, y: problem.y.map((y, i) => y * roots[i]!), roots };
}

/** Fits a law that has an order to weighted readings, from its fit without weights. */
export function fitWeighted(problem: FitProblem, plain: RelativeFit): RelativeFit {
  const { law } = plain;
  if (plain.kRel === null || plain.amplitude === null || !(plain.kRel > 0)) {
    return weightedLine(problem, law) ?? plain;
  }
  const growing = problem.mode !== 'decay';
  const fill: TwoParameterFill = (lnRate, _, t, f, byRate, byNothing) => {
    const kRel = Math.exp(lnRate);
    if (growing) law.growthFill(kRel, t, f, byRate);
    else law.decayFill(kRel, t, f, byRate);
    for (let i = 0; i < t.length; i += 1) {
      byRate[i]! *= kRel;
      byNothing[i] = 0;
    }
  };
  const start = { p: Math.log(plain.kRel * problem.timeScale), q: 0 };
  const fixed = problem.mode === 'fraction';
  const found = fitShape(fill, problem, start, rateRange, fixed, SMALLEST_GAIN);
  const kRel = Math.exp(found.p);
  return completeFit(problem, law, {
    kRel,
    amplitude: found.amplitude,
    rss: found.rss,
    atBound: plain.covariance === null,
    sums: null,
  });
}

/** Growth that has not bent yet: a weighted straight line. */
function weightedLine(problem: FitProblem, law: RateLaw): RelativeFit | null {
  const { t, y, roots } = problem;
  if (roots === null || problem.mode !== 'growth') return null;
  const along = t.map((time, i) => time * roots[i]!);
  const tt = along.reduce((sum, value) => sum + value * value, 0);
  const ty = along.reduce((sum, value, i) => sum + value * y[i]!, 0);
  return tt > 0 ? growthLine({ ...problem, t: along }, law, ty / tt) : null;
}

/** Fits the saturating law to weighted readings, from its fit without weights. */
export function fitSaturatingWeighted(problem: FitProblem, plain: SaturatingFit): SaturatingFit {
  const sign = problem.mode === 'decay' ? 1 : -1;
  const fill: TwoParameterFill = (lnRate, coverage, t, f, byRate, byCoverage) => {
    const kRel = Math.exp(lnRate);
    const shape = saturatingShape(coverage);
    for (let i = 0; i < t.length; i += 1) {
      const u = kRel * t[i]!;
      const lnW = shape.lnRelative(u);
      const w = Math.exp(lnW);
      const slope = shape.slope(u);
      f[i] = sign === 1 ? w : 1 - w;
      byRate[i] = sign * u * slope;
      byCoverage[i] = w === 0 ? 0 : -sign * slope * (1 - w + lnW);
    }
  };
  const start = { p: Math.log(plain.kRel), q: plain.coverage };
  const fixed = problem.mode === 'fraction';
  const found = fitShape(fill, problem, start, saturatingRange, fixed, SMALLEST_GAIN);
  return finishSaturating(problem, { kRel: Math.exp(found.p), coverage: found.q });
}

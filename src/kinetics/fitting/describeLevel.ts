import { aicc } from '../statistics/goodnessOfFit';
import { finiteOrNull } from '../statistics/estimate';
import type { DecaySeries } from '../types';
import { concentrationPerAmplitude, type DescribedFit } from './describeFit';
import type { LevelFit } from './fitLevel';
import { resultDimension, type Readings } from './readings';

/**
 * Puts a fit with a level into rate constant, initial concentration and initial rate: k is that of
 * the approach, −dC/dt = k (C − C∞)ⁿ, and r0 = k (C0 − C∞)ⁿ. A signal's baseline is no concentration:
 * C0 is then what stands above it.
 *
 * `c0` and `kRel` hold at `originS`: curves with a level are not continued back.
 */
export function describeLevel(
  fit: LevelFit,
  series: DecaySeries,
  readings: Readings,
): DescribedFit {
  const { law, problem, kRel, level, rss, dof, covariance } = fit;
  const n = readings.values.length;
  const dimension = resultDimension(series);
  const per = concentrationPerAmplitude(series);
  const scale = per ?? 1;
  const [aa, ak, kk] =
    covariance === null ? [null, 0, 0] : [covariance[0]!, covariance[1]!, covariance[4]!];
  const distance = fit.amplitude * scale;
  const order = law.order;
  const kKnown = order === 1 || (dimension !== 'ratio' && per !== null);
  const power = distance ** (1 - order);
  const byDistance = (kRel * (1 - order) * power) / fit.amplitude;
  const kVariance =
    aa === null ? null : power ** 2 * kk + 2 * power * byDistance * ak + byDistance ** 2 * aa;
  const baseline = series.kind === 'signal';
  // What conversion falls short of 1 stays; of product nobody knows.
  const stays =
    series.kind === 'conversion'
      ? scale * (1 - fit.amplitude)
      : series.kind === 'product'
        ? null
        : level;
  const first = Math.max(readings.times[0]! - problem.originS, 0);
  const last = Math.max(readings.times[n - 1]! - problem.originS, 0);
  const above = (time: number) => distance * law.relative(kRel * time);
  const rest = baseline ? 0 : stays;
  const c0 = rest === null ? null : distance + rest;
  const c0Variance =
    aa === null || series.kind === 'conversion' || rest === null
      ? null
      : baseline
        ? aa
        : aa + 2 * covariance![2]! + covariance![8]!;
  const slope = law.slope(kRel * first);
  const rateVariance =
    aa === null
      ? null
      : (scale * slope) ** 2 *
        (kRel ** 2 * aa + 2 * kRel * fit.amplitude * ak + fit.amplitude ** 2 * kk);
  const root = (variance: number | null) =>
    variance !== null && variance >= 0 ? finiteOrNull(Math.sqrt(variance)) : null;
  const start = rest === null ? null : above(first) + rest;
  return {
    fit: {
      k: kKnown ? finiteOrNull(kRel * power) : null,
      kSe: kKnown ? root(kVariance) : null,
      kRel: finiteOrNull(kRel),
      kRelSe: root(aa === null ? null : kk),
      c0: per === null || c0 === null ? null : finiteOrNull(c0),
      c0Se: per === null ? null : root(c0Variance),
      originS: problem.originS,
      covariance: null,
      rss: Math.min(rss, Number.MAX_VALUE),
      aicc: aicc(n, rss, fit.parameters),
      weight: null,
      residualSd: dof > 0 ? finiteOrNull(Math.sqrt(rss / dof)) : null,
      dof,
      saturation: null,
      level: {
        value: stays === null ? null : finiteOrNull(stays),
        se: root(
          covariance === null || stays === null
            ? null
            : series.kind === 'conversion'
              ? scale ** 2 * covariance[0]!
              : covariance[8]!,
        ),
        amplitude: fit.amplitude,
        offset: level,
        covariance,
      },
    },
    initialRate: { value: -distance * kRel * slope, se: root(rateVariance) },
    firstConcentration: per === null || start === null ? null : finiteOrNull(start),
    conversion:
      start !== null && start > 0 ? finiteOrNull((above(first) - above(last)) / start) : null,
  };
}

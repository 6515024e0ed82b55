import type { DecaySeries, LawFit, ReadingDimension } from '../types';
import { aicc } from '../statistics/goodnessOfFit';
import { finiteOrNull } from '../statistics/estimate';
import type { RelativeFit } from './fitLaw';
import type { Readings } from './readings';
import { resultDimension } from './readings';

/** A fit in the well's own terms, and what the curve says at the ends of the readings. */
export interface DescribedFit {
  fit: LawFit;
  /** −dC/dt at the first reading, base unit s⁻¹. */
  initialRate: { value: number; se: number | null };
  /** C of the curve at the first reading, base unit; null where C0 is not known. */
  firstConcentration: number | null;
  /** 1 − C(t_last)/C(t_first). */
  conversion: number | null;
}

/** A curve continued to time 0 by more than this factor is told at its first reading instead. */
const FARTHEST_CONTINUATION = 1e3;

const rootOrNull = (variance: number | null) =>
  variance !== null && variance >= 0 ? finiteOrNull(Math.sqrt(variance)) : null;

/** C per unit of amplitude; null where readings do not carry the concentration. */
export function concentrationPerAmplitude(series: DecaySeries): number | null {
  if (series.kind === 'product') return 1 / series.productPerReactant;
  if (series.kind === 'conversion') return series.initialConcentration;
  return 1;
}

/**
 * Puts a fit into rate constant, initial concentration and initial rate, with standard errors by
 * the delta method (exact for the linearised model).
 */
export function describeFit(
  fit: RelativeFit,
  series: DecaySeries,
  readings: Readings,
): DescribedFit {
  const dimension = resultDimension(series);
  const n = readings.values.length;
  const common = {
    rss: Math.min(fit.rss, Number.MAX_VALUE),
    aicc: aicc(n, fit.rss, fit.parameters),
    weight: null,
    residualSd: fit.dof > 0 ? finiteOrNull(Math.sqrt(fit.rss / fit.dof)) : null,
    dof: fit.dof,
    saturation: null,
  };
  if (fit.growth !== null) return describeGrowth(fit.growth, fit, series, dimension, common);

  const { law, problem } = fit;
  const amplitude = fit.amplitude!;
  const kRel = fit.kRel!;
  const covariance = fit.covariance;
  const perAmplitude = concentrationPerAmplitude(series);
  const c = perAmplitude === null ? null : amplitude * perAmplitude;
  const order = law.order;

  const kKnown = order === 1 || (dimension !== 'ratio' && c !== null && c > 0);
  const power = order === 1 ? 1 : (c ?? 1) ** (1 - order);
  const kByAmplitude = order === 1 ? 0 : (kRel * (1 - order) * power) / amplitude;
  const kVariance =
    covariance === null
      ? null
      : power ** 2 * covariance.kk +
        2 * power * kByAmplitude * covariance.ak +
        kByAmplitude ** 2 * covariance.aa;

  const start = atTimeZero(fit, perAmplitude);
  const uFirst = kRel * Math.max(readings.times[0]! - problem.originS, 0);
  const uLast = kRel * Math.max(readings.times[n - 1]! - problem.originS, 0);
  const slope = law.slope(uFirst);
  const scale = perAmplitude ?? 1;
  const rateByAmplitude = -scale * kRel * slope;
  const rateByRate = -scale * amplitude * (slope + uFirst * law.bend(uFirst));
  const gFirst = law.relative(uFirst);
  return {
    fit: {
      k: kKnown ? finiteOrNull(kRel * power) : null,
      kSe: kKnown ? rootOrNull(kVariance) : null,
      ...start,
      ...common,
    },
    initialRate: {
      value: -scale * amplitude * kRel * slope,
      se:
        covariance === null
          ? null
          : rootOrNull(
              rateByAmplitude ** 2 * covariance.aa +
                2 * rateByAmplitude * rateByRate * covariance.ak +
                rateByRate ** 2 * covariance.kk,
            ),
    },
    firstConcentration: c === null ? null : finiteOrNull(c * gFirst),
    conversion: gFirst > 0 ? finiteOrNull(1 - law.relative(uLast) / gFirst) : null,
  };
}

/** Growth that shows no curvature: a rate, but neither C0 nor kRel. */
function describeGrowth(
  growth: { slope: number; variance: number | null },
  fit: RelativeFit,
  series: DecaySeries,
  dimension: ReadingDimension,
  common: Pick<LawFit, 'rss' | 'aicc' | 'weight' | 'residualSd' | 'dof' | 'saturation'>,
): DescribedFit {
  const rate = growth.slope / series.productPerReactant;
  const slopeSe = rootOrNull(growth.variance);
  const se = slopeSe === null ? null : slopeSe / series.productPerReactant;
  const isZeroOrder = fit.law.order === 0 && dimension !== 'ratio';
  return {
    fit: {
      k: isZeroOrder ? finiteOrNull(rate) : null,
      kSe: isZeroOrder ? se : null,
      kRel: null,
      kRelSe: null,
      c0: null,
      c0Se: null,
      originS: 0,
      covariance: null,
      ...common,
    },
    initialRate: { value: rate, se },
    firstConcentration: null,
    conversion: null,
  };
}

/** c0 and kRel moved from the fit's origin to time 0 along the fitted curve. */
function atTimeZero(
  fit: RelativeFit,
  perAmplitude: number | null,
): Pick<LawFit, 'kRel' | 'kRelSe' | 'c0' | 'c0Se' | 'originS' | 'covariance'> {
  const { law, problem, covariance } = fit;
  const amplitude = fit.amplitude!;
  const kRel = fit.kRel!;
  let origin = problem.originS;
  let [g, slope] = [1, 0];
  const back = -kRel * origin;
  if (origin !== 0 && back > law.lowestU * 0.999) {
    const along = law.relative(back);
    if (along <= FARTHEST_CONTINUATION && along >= 1 / FARTHEST_CONTINUATION) {
      [g, slope] = [along, law.slope(back)];
      origin = 0;
    }
  }
  const moved = origin === problem.originS ? 0 : problem.originS;
  const n = law.order;
  const scale = perAmplitude ?? 1;
  const cByA = scale * g;
  const cByK = -scale * amplitude * moved * slope;
  const kByK = g ** (n - 1) - kRel * (n - 1) * g ** (n - 2) * slope * moved;
  const known = perAmplitude !== null;
  const free = known && problem.mode !== 'fraction';
  return {
    kRel: finiteOrNull(kRel * g ** (n - 1)),
    kRelSe: covariance === null ? null : rootOrNull(kByK ** 2 * covariance.kk),
    c0: known ? finiteOrNull(scale * amplitude * g) : null,
    c0Se:
      covariance !== null && free
        ? rootOrNull(
            cByA ** 2 * covariance.aa + 2 * cByA * cByK * covariance.ak + cByK ** 2 * covariance.kk,
          )
        : null,
    originS: origin,
    covariance:
      covariance !== null && free
        ? finiteOrNull(kByK * (cByA * covariance.ak + cByK * covariance.kk))
        : null,
  };
}

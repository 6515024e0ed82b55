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
  const criterion = aicc(n, fit.rss, fit.parameters);
  if (fit.growth !== null) return describeGrowth(fit.growth, fit, series, dimension, criterion);

  const { law, problem } = fit;
  const amplitude = fit.amplitude!;
  const kRel = fit.kRel!;
  const covariance = fit.covariance;
  const perAmplitude = concentrationPerAmplitude(series);
  const c = perAmplitude === null ? null : amplitude * perAmplitude;
  const order = law.order;

  const kKnown = order === 1 || (dimension !== 'ratio' && c !== null && c > 0);
  const power = concentrationPower(c ?? 1, 1 - order);
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
      kRel: start.kRel,
      kRelSe: start.kRelSe,
      c0: start.c0,
      c0Se: start.c0Se,
      originS: start.originS,
      covariance: start.covariance,
      rss: Math.min(fit.rss, Number.MAX_VALUE),
      aicc: criterion,
      weight: null,
      residualSd: residualSdOf(fit),
      dof: fit.dof,
      saturation: null,
      level: null,
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

/** Cⁿ, quickly for the orders that every well is fitted with. */
function concentrationPower(c: number, n: number): number {
  if (n === 0) return 1;
  if (n === 1) return c;
  return n === -1 ? 1 / c : c ** n;
}

const residualSdOf = ({ rss, dof }: RelativeFit) =>
  dof > 0 ? finiteOrNull(Math.sqrt(rss / dof)) : null;

/** Growth that shows no curvature: a rate, but neither C0 nor kRel. */
function describeGrowth(
  growth: { slope: number; variance: number | null },
  fit: RelativeFit,
  series: DecaySeries,
  dimension: ReadingDimension,
  criterion: number | null,
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
      rss: Math.min(fit.rss, Number.MAX_VALUE),
      aicc: criterion,
      weight: null,
      residualSd: residualSdOf(fit),
      dof: fit.dof,
      saturation: null,
      level: null,
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
  const known = perAmplitude !== null;
  const scale = perAmplitude ?? 1;
  const free = known && problem.mode !== 'fraction';
  let origin = problem.originS;
  if (origin === 0) {
    return {
      kRel: finiteOrNull(kRel),
      kRelSe: covariance === null ? null : rootOrNull(covariance.kk),
      c0: known ? finiteOrNull(scale * amplitude) : null,
      c0Se: covariance !== null && free ? rootOrNull(scale * scale * covariance.aa) : null,
      originS: 0,
      covariance: covariance !== null && free ? finiteOrNull(scale * covariance.ak) : null,
    };
  }
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
  const cByA = scale * g;
  const cByK = -scale * amplitude * moved * slope;
  const kByK = g ** (n - 1) - kRel * (n - 1) * g ** (n - 2) * slope * moved;
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

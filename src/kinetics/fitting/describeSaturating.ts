import type { DecaySeries, LawFit, SaturatingConstants } from '../types';
import { aicc } from '../statistics/goodnessOfFit';
import { finiteOrNull } from '../statistics/estimate';
import { saturatingShape } from '../rateLaws/saturating';
import { concentrationPerAmplitude, type DescribedFit } from './describeFit';
import type { SaturatingFit } from './fitSaturating';
import type { FitProblem } from './problem';
import { resultDimension, type Readings } from './readings';

/** Symmetric 3 × 3 matrix over (c0, kRel, coverage), row by row. */
type Covariance = number[];

/** A curve continued to time 0 by more than this factor is told at its first reading instead. */
const FARTHEST_CONTINUATION = 1e3;

/** √(gᵀ V g); null where there is no covariance. */
function errorOf(g0: number, g1: number, g2: number, v: Covariance | null): number | null {
  if (v === null) return null;
  const variance =
    g0 * g0 * v[0]! +
    g1 * g1 * v[4]! +
    g2 * g2 * v[8]! +
    2 * (g0 * g1 * v[1]! + g0 * g2 * v[2]! + g1 * g2 * v[5]!);
  return variance >= 0 ? finiteOrNull(Math.sqrt(variance)) : null;
}

/** J V Jᵀ. */
function carry(jacobian: readonly (readonly number[])[], covariance: Covariance): number[] {
  return jacobian.flatMap((a) =>
    jacobian.map((b) =>
      a.reduce(
        (sum, ai, i) => sum + b.reduce((s, bj, j) => s + ai * bj * covariance[3 * i + j]!, 0),
        0,
      ),
    ),
  );
}

/** The curve's constants at one moment, with their covariance. */
interface Moment {
  originS: number;
  c0: number;
  kRel: number;
  coverage: number;
  covariance: Covariance | null;
}

/**
 * Puts a fit of the saturating law into k, K, initial concentration and initial rate, standard
 * errors by the delta method. At a limit of the law k or K mean nothing and are null; the curve,
 * kRel and the rate stay.
 */
export function describeSaturating(
  fit: SaturatingFit,
  problem: FitProblem,
  series: DecaySeries,
  readings: Readings,
): DescribedFit {
  const n = readings.values.length;
  const fixed = problem.mode === 'fraction';
  const parameters = fixed ? 2 : 3;
  const dof = n - parameters;
  const rss = fit.rss * problem.valueScale * problem.valueScale;
  const perAmplitude = concentrationPerAmplitude(series);
  const known = perAmplitude !== null;
  const origin = momentOfFit(fit, problem, perAmplitude ?? 1, dof);
  const start = atTimeZero(origin);
  const first = moved(origin, Math.max(readings.times[0]! - problem.originS, 0));
  const lastU = origin.kRel * Math.max(readings.times[n - 1]! - problem.originS, 0);
  const last = origin.c0 * saturatingShape(origin.coverage).relative(lastU);
  const hasUnits = known && resultDimension(series) !== 'ratio' && series.kind !== 'signal';
  const constants = constantsOf(start, hasUnits ? fit.limit : 'unknown');
  return {
    fit: {
      k: constants.k,
      kSe: constants.kSe,
      kRel: finiteOrNull(start.kRel),
      kRelSe: errorOf(0, 1, 0, start.covariance),
      c0: known ? finiteOrNull(start.c0) : null,
      c0Se: known && !fixed ? errorOf(1, 0, 0, start.covariance) : null,
      originS: start.originS,
      covariance: start.covariance === null || fixed ? null : start.covariance[1]!,
      rss: Math.min(rss, Number.MAX_VALUE),
      aicc: aicc(n, rss, parameters),
      weight: null,
      residualSd: dof > 0 ? finiteOrNull(Math.sqrt(rss / dof)) : null,
      dof,
      saturation: constants.saturation,
      level: null,
    },
    initialRate: {
      value: first.c0 * first.kRel,
      se: errorOf(first.kRel, first.c0, 0, first.covariance),
    },
    firstConcentration: known ? finiteOrNull(first.c0) : null,
    conversion: first.c0 > 0 ? finiteOrNull(1 - last / first.c0) : null,
  };
}

/** The fit at its own origin, out of the scaled units. */
function momentOfFit(
  fit: SaturatingFit,
  problem: FitProblem,
  perAmplitude: number,
  dof: number,
): Moment {
  const toC = perAmplitude * problem.valueScale;
  const toRate = 1 / problem.timeScale;
  const variance = dof > 0 ? fit.rss / dof : NaN;
  return {
    originS: problem.originS,
    c0: fit.amplitude * toC,
    kRel: fit.kRel * toRate,
    coverage: fit.coverage,
    covariance:
      fit.inverse === null || !(dof > 0) ? null : inUnits(fit.inverse, variance, toC, toRate),
  };
}

/** The covariance of (c0, kRel, coverage) from the scaled inverse. */
function inUnits(v: ArrayLike<number>, variance: number, toC: number, toRate: number): number[] {
  const cr = v[1]! * variance * toC * toRate;
  const cs = v[2]! * variance * toC;
  const rs = v[5]! * variance * toRate;
  return [
    v[0]! * variance * toC * toC,
    cr,
    cs,
    cr,
    v[4]! * variance * toRate * toRate,
    rs,
    cs,
    rs,
    v[8]! * variance,
  ];
}

/** Moved to time 0 along the fitted curve, where it can be continued that far. */
function atTimeZero(at: Moment): Moment {
  const start = moved(at, -at.originS);
  const along = start.c0 / at.c0;
  const near = along <= FARTHEST_CONTINUATION && along >= 1 / FARTHEST_CONTINUATION;
  return near && start.originS === 0 ? start : at;
}

/** The same curve told from another moment, `forS` seconds later. */
function moved(at: Moment, forS: number): Moment {
  if (forS === 0) return at;
  const { c0, kRel, coverage } = at;
  const lnW = saturatingShape(coverage).lnRelative(kRel * forS);
  const w = Math.exp(lnW);
  const free = 1 - coverage;
  const d = free + coverage * w;
  // Used up: the rate law holds on, with nothing left to follow.
  if (w === 0 || d === 0) return { ...at, originS: at.originS + forS, c0: 0, covariance: null };
  const byRate = (-forS * w) / d;
  const byCoverage = (w * (1 - w + lnW)) / d;
  const jacobian = [
    [w, c0 * byRate, c0 * byCoverage],
    [
      0,
      1 / d - (kRel * coverage * byRate) / d ** 2,
      (-kRel * (w - 1 + coverage * byCoverage)) / d ** 2,
    ],
    [0, (coverage * free * byRate) / d ** 2, (w + coverage * free * byCoverage) / d ** 2],
  ];
  return {
    originS: at.originS + forS,
    c0: c0 * w,
    kRel: kRel / d,
    coverage: (coverage * w) / d,
    covariance: at.covariance === null ? null : carry(jacobian, at.covariance),
  };
}

function constantsOf(
  { c0, kRel, coverage, covariance }: Moment,
  limit: SaturatingFit['limit'] | 'unknown',
): Pick<LawFit, 'k' | 'kSe' | 'saturation'> {
  const inside = limit === null;
  const free = 1 - coverage;
  const saturation: SaturatingConstants = {
    coverage,
    coverageSe: errorOf(0, 0, 1, covariance),
    covariance,
    K: inside ? finiteOrNull(coverage / (free * c0)) : null,
    KSe: inside
      ? errorOf(-coverage / (free * c0 * c0), 0, 1 / (free * free * c0), covariance)
      : null,
  };
  const kKnown = inside || limit === 'zero';
  return {
    k: kKnown ? finiteOrNull((kRel * c0) / coverage) : null,
    kSe: kKnown
      ? errorOf(kRel / coverage, c0 / coverage, (-kRel * c0) / coverage ** 2, covariance)
      : null,
    saturation,
  };
}

import { rateConstantUnit } from '../rateLaws/rateConstantUnit';
import type { LawFit, ReadingDimension, ReferenceConditions } from '../types';
import { activationEnergyOf, lnPreExponentialOf, lnRateConstantAt } from './fitArrhenius';
import { constantPoint, referenceConcentration } from './lawBasis';
import type { BasisResult, PooledWell } from './pooledWell';
import {
  constantsOverTemperature,
  scaledConstant,
  timeFromConstant,
  type ConstantPoint,
  type LnConstant,
} from './rateAtReference';

/** The saturating law of one well in ratios: C/c0 and what follows from it stay finite. */
interface SaturatingState {
  c0: number;
  kRel: number;
  coverage: number;
  /** Of (c0, kRel, coverage), row by row. */
  covariance: readonly number[];
}

function stateOf(fit: LawFit): SaturatingState | null {
  const { c0, kRel, saturation } = fit;
  if (c0 === null || kRel === null || saturation?.covariance == null) return null;
  if (!(c0 > 0 && kRel > 0)) return null;
  return { c0, kRel, coverage: saturation.coverage, covariance: saturation.covariance };
}

/** A quantity with its standard error, from its gradient over the state. */
function withError(value: number, gradient: readonly number[], state: SaturatingState) {
  let variance = 0;
  gradient.forEach((a, i) =>
    gradient.forEach((b, j) => (variance += a * b * state.covariance[3 * i + j]!)),
  );
  return { value, se: Math.sqrt(Math.max(variance, 0)) };
}

/** k = kRel c0/σ; over c0 where concentrations have no unit of their own. */
function fullSurfaceRate(state: SaturatingState, inUnits: boolean) {
  const { c0, kRel, coverage } = state;
  const value = ((inUnits ? c0 : 1) * kRel) / coverage;
  return withError(value, [inUnits ? value / c0 : 0, value / kRel, -value / coverage], state);
}

/** r(C) = kRel C/((1 − σ) + σ C/c0): k K C/(1 + K C) without k and K. */
function rateAt(state: SaturatingState, c: number) {
  const { c0, kRel, coverage } = state;
  const d = 1 - coverage + (coverage * c) / c0;
  const rate = (kRel * c) / d;
  return withError(
    rate,
    [(rate * coverage * c) / (c0 * c0 * d), rate / kRel, (-rate * (c / c0 - 1)) / d],
    state,
  );
}

/** 1/t from c to conversion X, t = [(1 − σ)(−ln(1 − X)) + σ (c/c0) X]/kRel. */
function perTime(state: SaturatingState, c: number, conversion: number) {
  const { c0, kRel, coverage } = state;
  const log = -Math.log1p(-conversion);
  const linear = (c / c0) * conversion;
  const reach = (1 - coverage) * log + coverage * linear;
  const value = kRel / reach;
  return withError(
    value,
    [(value * coverage * linear) / (c0 * reach), value / kRel, (-value * (linear - log)) / reach],
    state,
  );
}

/** A well at a limit of the law, told by the law of that limit. */
function limitOf({ analysis: { fits } }: PooledWell): { order: 0 | 1; fit: LawFit } | null {
  const { zero, first, saturating } = fits;
  if (zero === undefined || first === undefined) return null;
  const coverage = saturating?.saturation?.coverage ?? (zero.rss < first.rss ? 1 : 0);
  return coverage > 0.5 ? { order: 0, fit: zero } : { order: 1, fit: first };
}

function pointsOf(
  wells: readonly PooledWell[],
  inside: (state: SaturatingState) => { value: number; se: number },
  atLimit: (order: 0 | 1, fit: LawFit) => { value: number | null; se: number | null },
): ConstantPoint[] {
  return wells.flatMap((well) => {
    const own = well.analysis.fits.saturating;
    const state = own === undefined ? null : stateOf(own);
    const limit = state === null ? limitOf(well) : null;
    const found =
      state !== null ? inside(state) : limit !== null ? atLimit(limit.order, limit.fit) : null;
    if (found === null) return [];
    const dof = (state === null ? limit?.fit.dof : own?.dof) ?? 0;
    const point = constantPoint(well, found.value, found.se, dof);
    return point === null ? [] : [point];
  });
}

/**
 * Reads points at a temperature by the straight line through their distances from a curve: rates of
 * this law bend against 1/T, and the lines of k and K tell how.
 */
function alongLines(
  points: readonly ConstantPoint[],
  temperatureK: number | null,
  curve: (temperatureK: number) => number,
): LnConstant | null {
  const distances = points.map((point) => ({
    ...point,
    lnK: point.lnK - curve(point.temperatureK),
  }));
  const { at } = constantsOverTemperature(distances, temperatureK);
  return at === null ? null : { ...at, lnK: at.lnK + curve(at.temperatureK) };
}

const times = (value: number | null, factor: number) => (value === null ? null : value * factor);

/**
 * Results of a catalyst that saturates: ln k and ln K of its wells each against 1/T, which gives
 * the activation energy on the full surface and the adsorption enthalpy (ln K = ln K_c −
 * (ΔH_ads/R)(1/T − 1/T_c)); rate and time at the reference well by well from the joint covariance
 * of each, so that they stay finite where a well reaches a limit of the law and k or K means
 * nothing. With the loading only k scales.
 */
export function describeBySaturation(
  wells: readonly PooledWell[],
  dimension: ReadingDimension,
  reference: ReferenceConditions,
): BasisResult {
  const kKnown = dimension !== 'ratio' && wells.some(({ series }) => series.kind !== 'signal');
  const fitted = wells.flatMap((well) => {
    const fit = well.analysis.fits.saturating;
    return fit?.saturation == null ? [] : [{ well, fit, saturation: fit.saturation }];
  });
  const constants = pointsOf(
    wells,
    (state) => fullSurfaceRate(state, kKnown),
    (order, fit) =>
      order === 1
        ? { value: null, se: null }
        : kKnown
          ? { value: fit.k, se: fit.kSe }
          : { value: fit.kRel, se: fit.kRelSe },
  );
  const adsorption = fitted.flatMap(({ well, fit, saturation }) => {
    const point = constantPoint({ ...well, factor: 1 }, saturation.K, saturation.KSe, fit.dof);
    return point === null ? [] : [point];
  });
  const { line, at } = constantsOverTemperature(constants, reference.temperatureK);
  const adsorbed = constantsOverTemperature(adsorption, reference.temperatureK);
  const k = kKnown ? at : null;

  const c = referenceConcentration(reference, dimension);
  const x = reference.targetConversion;
  const t = reference.temperatureK;
  const rates =
    c === null || t === null || !kKnown
      ? []
      : pointsOf(
          wells,
          (state) => rateAt(state, c),
          (order, fit) =>
            order === 0
              ? { value: fit.k, se: fit.kSe }
              : { value: times(fit.k, c), se: times(fit.kSe, c) },
        );
  const reciprocals =
    c === null || t === null || x === null || !kKnown
      ? []
      : pointsOf(
          wells,
          (state) => perTime(state, c, x),
          (order, fit) => {
            const factor = order === 0 ? 1 / (x * c) : 1 / -Math.log1p(-x);
            return { value: times(fit.k, factor), se: times(fit.kSe, factor) };
          },
        );
  const lines = line === null || adsorbed.line === null ? null : [line, adsorbed.line];
  const lnConstants = (temperatureK: number) =>
    (lines ?? []).map((one) => lnRateConstantAt(one, temperatureK).lnK);
  const lnRate = (temperatureK: number) => {
    const [lnK, lnAdsorption] = lnConstants(temperatureK);
    return lnK === undefined || c === null ? 0 : lnK - Math.log1p(Math.exp(-lnAdsorption!) / c);
  };
  const lnPerTime = (temperatureK: number) => {
    const [lnK, lnAdsorption] = lnConstants(temperatureK);
    if (lnK === undefined || c === null || x === null) return 0;
    return lnK - Math.log(-Math.log1p(-x) * Math.exp(-lnAdsorption!) + c * x);
  };
  return {
    kUnit: kKnown ? rateConstantUnit(0, dimension) : null,
    kRef: scaledConstant(k, 0),
    kRefTemperatureK: k === null ? null : k.temperatureK,
    rateRef: scaledConstant(alongLines(rates, t, lnRate), 0),
    timeToTarget: timeFromConstant(alongLines(reciprocals, t, lnPerTime), 0),
    bracket: false,
    net: false,
    arrhenius: line,
    activationEnergy: line === null ? null : activationEnergyOf(line),
    initialRateActivationEnergy: null,
    lnA: line === null || !kKnown ? null : lnPreExponentialOf(line),
    adsorption:
      adsorbed.at === null
        ? null
        : {
            K: scaledConstant(adsorbed.at, 0)!,
            temperatureK: adsorbed.at.temperatureK,
            enthalpy: adsorbed.line === null ? null : activationEnergyOf(adsorbed.line),
          },
  };
}

import { estimate, logEstimate } from '../statistics/estimate';
import type { ArrheniusLine, ArrheniusPoint, Estimate } from '../types';
import { fitArrhenius, lnRateConstantAt, poolBlocks } from './fitArrhenius';
import { aboutMean, betweenVariance, weightedMean } from './betweenVariance';
import { SAME_TEMPERATURE_K } from './temperatures';

/** ln of a constant at one temperature. */
export interface LnConstant {
  lnK: number;
  se: number | null;
  dof: number;
  temperatureK: number;
}

/** A well's constant with the degrees of freedom of its own fit. */
export interface ConstantPoint extends ArrheniusPoint {
  fitDof: number;
}

/** Constants of a catalyst's wells, the line through them, and the value at one temperature. */
export interface ConstantsOverTemperature {
  line: ArrheniusLine | null;
  at: LnConstant | null;
}

/**
 * Fits the Arrhenius line through the wells' constants and reads it at a temperature. At a measured
 * temperature a value exists without a line, from the wells there.
 *
 * @param temperatureK null for the (harmonic mean) temperature of the wells
 */
export function constantsOverTemperature(
  points: readonly ConstantPoint[],
  temperatureK: number | null,
): ConstantsOverTemperature {
  if (points.length === 0) return { line: null, at: null };
  const line = fitArrhenius(points.map(({ fitDof: _, ...point }) => point));
  const wanted = temperatureK ?? line?.centreK ?? harmonicMean(points);
  if (line !== null) {
    const { lnK, se } = lnRateConstantAt(line, wanted);
    if (se !== null) return { line, at: { lnK, se, dof: line.dof, temperatureK: wanted } };
    const local = constantAmong(points, wanted);
    // Two temperatures leave the line no interval; the wells at the temperature itself have one.
    return { line, at: local ?? { lnK, se: null, dof: 0, temperatureK: wanted } };
  }
  return { line, at: constantAmong(points, wanted) };
}

function harmonicMean(points: readonly ArrheniusPoint[]): number {
  return points.length / points.reduce((sum, point) => sum + 1 / point.temperatureK, 0);
}

function constantAmong(points: readonly ConstantPoint[], temperatureK: number): LnConstant | null {
  const own = points.filter((p) => Math.abs(p.temperatureK - temperatureK) <= SAME_TEMPERATURE_K);
  if (own.length === 0) return null;
  const { means } = poolBlocks(own, 0);
  const values = means.map((mean) => mean.y);
  const variances = means.map((mean) => mean.variance);
  const tau2 = betweenVariance((w) => aboutMean(values, w), variances, values.length - 1);
  const weights = variances.map((variance) => 1 / (variance + tau2));
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  return {
    lnK: weightedMean(values, weights),
    se: Math.sqrt(1 / total),
    dof: own.length === 1 ? own[0]!.fitDof : tau2 > 0 ? values.length - 1 : own.length - 1,
    temperatureK,
  };
}

/** The constant times a fixed positive factor, as a value with positive limits. */
export function scaledConstant(
  constant: LnConstant | null,
  lnFactor: number | null,
): Estimate | null {
  if (constant === null || lnFactor === null || !Number.isFinite(lnFactor)) return null;
  return logEstimate(constant.lnK + lnFactor, constant.se, constant.dof);
}

/** A time inversely proportional to the constant: exp(lnFactor)/k. */
export function timeFromConstant(constant: LnConstant | null, lnFactor: number): Estimate | null {
  if (constant === null || !Number.isFinite(lnFactor)) return null;
  return logEstimate(lnFactor - constant.lnK, constant.se, constant.dof);
}

/** The span of several estimates, limits included, around the middle one. */
export function bracketOf(
  middle: Estimate | null,
  ends: readonly (Estimate | null)[],
): Estimate | null {
  const all = [middle, ...ends].filter((one): one is Estimate => one !== null);
  if (middle === null || all.length < ends.length + 1) return null;
  return {
    ...estimate(middle.value, null, 0)!,
    low: Math.min(...all.map((one) => one.low ?? one.value)),
    high: Math.max(...all.map((one) => one.high ?? one.value)),
  };
}

import { rateLaws } from '../rateLaws/registry';
import type { Estimate, ReadingDimension, ReferenceConditions } from '../types';
import type { BasisResult, PooledWell } from './pooledWell';
import { activationEnergyOf } from './fitArrhenius';
import { constantPoint, referenceConcentration } from './lawBasis';
import {
  bracketOf,
  constantsOverTemperature,
  scaledConstant,
  timeFromConstant,
  type ConstantPoint,
} from './rateAtReference';

/**
 * Results of a catalyst whose order the wells do not tell: the activation energy of its initial
 * rates, and brackets between orders 0 and 2, r(C_ref) = r0 (C_ref/C0)ⁿ. The middle of a bracket is
 * its first-order value; its ends include the intervals of the initial rates.
 */
export function describeByInitialRate(
  wells: readonly PooledWell[],
  dimension: ReadingDimension,
  reference: ReferenceConditions,
): BasisResult {
  // Signals differ in scale from well to well: only rates relative to C0 compare.
  const relative = wells.some((well) => well.series.kind === 'signal');
  const net = wells.every(({ analysis }) => analysis.net?.initialRate != null);
  const own = (well: PooledWell) =>
    net ? well.analysis.net!.initialRate : well.analysis.initialRate;
  const line = constantsOverTemperature(pseudoConstants(wells, relative ? 1 : 0, own), null).line;
  const c = referenceConcentration(reference, dimension);
  const x = reference.targetConversion;

  const read = (order: number, rateOf: RateOf) =>
    reference.temperatureK === null || c === null
      ? null
      : constantsOverTemperature(pseudoConstants(wells, order, rateOf), reference.temperatureK).at;
  const byOrder = rateLaws.map((law) => ({
    law,
    at: read(law.order, own),
    beside: net ? read(law.order, withBlank) : read(law.order, own),
  }));
  const rates = byOrder.map(({ law, at }) => scaledConstant(at, law.order * Math.log(c ?? NaN)));
  const times = byOrder.map(({ law, beside }) =>
    timeFromConstant(
      beside,
      x === null ? NaN : Math.log(law.reach(x)) - (law.order - 1) * Math.log(c ?? NaN),
    ),
  );
  const middle = byOrder.findIndex(({ law }) => law.order === 1);
  const rateRef = bracketOf(rates[middle] ?? null, rates);
  const timeToTarget = bracketOf(times[middle] ?? null, times);
  return {
    kUnit: null,
    kRef: null,
    kRefTemperatureK: null,
    rateRef,
    timeToTarget,
    net: net && wells.some(takesOff),
    bracket: rateRef !== null || timeToTarget !== null,
    arrhenius: line,
    activationEnergy: null,
    initialRateActivationEnergy: line === null ? null : activationEnergyOf(line),
    lnA: null,
    adsorption: null,
  };
}

/** True where the blank beside a well reacts. */
const takesOff = ({ analysis: { initialRate, net } }: PooledWell) =>
  net?.initialRate != null && net.initialRate.value !== initialRate?.value;

type RateOf = (well: PooledWell) => Estimate | null;

/** The well's own rate with the blank's beside it, which does not grow with the loading. */
function withBlank({ analysis: { initialRate, net }, factor }: PooledWell): Estimate | null {
  const own = net?.initialRate ?? null;
  if (initialRate === null || own === null) return initialRate;
  return { ...own, value: own.value + (initialRate.value - own.value) / factor };
}

/** r0/Cⁿ of each well at its first reading: its k if the order were n. */
function pseudoConstants(
  wells: readonly PooledWell[],
  order: number,
  rateOf: RateOf,
): ConstantPoint[] {
  return wells.flatMap((well) => {
    const rate = rateOf(well);
    const c = well.firstConcentration;
    if (rate === null || (order !== 0 && !(c !== null && c > 0))) return [];
    const scale = order === 0 ? 1 : (c ?? 1) ** order;
    const dof = Math.max(well.analysis.pointsUsed - 2, 1);
    const se = rate.se === null ? null : rate.se / scale;
    const point = constantPoint(well, rate.value / scale, se, dof);
    return point === null ? [] : [point];
  });
}

import type { BlankModel } from '../blanks/blankModel';
import { netConstant } from '../blanks/netOfBlank';
import { timeBesideBlank } from '../blanks/timeBesideBlank';
import type { RateLaw } from '../rateLaws/rateLaw';
import type { ReadingDimension, ReferenceConditions } from '../types';
import { fitUnder, type BasisResult, type PooledWell } from './pooledWell';
import { activationEnergyOf, lnPreExponentialOf } from './fitArrhenius';
import {
  constantsOverTemperature,
  scaledConstant,
  timeFromConstant,
  type ConstantPoint,
} from './rateAtReference';

/** C_ref in the dimension of a catalyst's results, or null. */
export function referenceConcentration(
  reference: ReferenceConditions,
  dimension: ReadingDimension,
): number | null {
  if (dimension === 'ratio') return null;
  const own = reference.concentrationDimension ?? dimension;
  const { concentration } = reference;
  return own === dimension && concentration !== null && concentration > 0 ? concentration : null;
}

/** A positive constant of a well with its standard error as a point of ln k; null without one. */
export function constantPoint(
  well: PooledWell,
  value: number | null,
  se: number | null,
  fitDof: number,
): ConstantPoint | null {
  if (value === null || se === null || !(value > 0)) return null;
  const lnK = Math.log(value * well.factor);
  const relative = se / value;
  if (!Number.isFinite(lnK) || !Number.isFinite(relative)) return null;
  const { id, temperatureK, block } = well.series;
  return { seriesId: id, temperatureK, lnK, se: relative, block: block ?? '', fitDof };
}

/**
 * Results of a catalyst whose law is known: all wells under that law. Where k itself cannot be
 * given (its unit needs a concentration), kRel still gives the activation energy. Where blanks
 * cover every well, k and rates are the catalyst's own, and the time is that of both together.
 *
 * @param blank what goes on without the catalyst
 * @param loadingGPerL the loading that the wells are brought to
 */
export function describeByLaw(
  wells: readonly PooledWell[],
  law: RateLaw,
  dimension: ReadingDimension,
  reference: ReferenceConditions,
  blank: BlankModel | null,
  loadingGPerL: number | null,
): BasisResult {
  const nets = blank === null ? null : wells.map((well) => netConstant(well, law.order, blank));
  const netKnown = nets !== null && nets.every((net) => net !== null);
  const own = wells.flatMap((well, i) => {
    const fit = fitUnder(well, law.name);
    return fit === null ? [] : [{ well, fit, net: netKnown ? nets[i]! : null }];
  });
  const kKnown = own.some(({ fit }) => fit.k !== null);
  const points = own.flatMap(({ well, fit, net }) => {
    const point = kKnown
      ? constantPoint(well, net?.k ?? fit.k, net?.se ?? fit.kSe, fit.dof)
      : constantPoint(well, fit.kRel, fit.kRelSe, fit.dof);
    return point === null ? [] : [point];
  });
  const { line, at } = constantsOverTemperature(points, reference.temperatureK);
  const k = kKnown ? at : null;
  const atReference = reference.temperatureK === null ? null : k;
  const c = referenceConcentration(reference, dimension);
  const x = reference.targetConversion;
  const beside =
    netKnown && reference.temperatureK !== null
      ? blank!.at(law.order, reference.temperatureK, loadingGPerL)
      : null;
  // t = u(X) / (k C^(n−1)); first order needs no concentration.
  const lnTime =
    x === null
      ? NaN
      : Math.log(law.reach(x)) - (law.order === 1 ? 0 : (law.order - 1) * Math.log(c ?? NaN));
  return {
    kUnit: kKnown ? law.kUnit(dimension) : null,
    kRef: scaledConstant(k, 0),
    kRefTemperatureK: k === null ? null : k.temperatureK,
    rateRef: scaledConstant(atReference, c === null ? null : law.order * Math.log(c)),
    timeToTarget:
      beside === null || beside.k === 0 || x === null
        ? timeFromConstant(atReference, lnTime)
        : timeBesideBlank(atReference, law, beside, c, x),
    net: netKnown && nets.some((one) => (one?.blank.k ?? 0) > 0),
    bracket: false,
    arrhenius: line,
    activationEnergy: line === null ? null : activationEnergyOf(line),
    initialRateActivationEnergy: null,
    lnA: line === null || !kKnown ? null : lnPreExponentialOf(line),
    adsorption: null,
  };
}

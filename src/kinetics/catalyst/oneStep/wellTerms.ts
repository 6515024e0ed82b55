import type { ReadingMode } from '../../fitting/problem';
import type { OneStepLaw } from './oneStepLaw';

/** A well's readings with what its temperature and loading make of the shared constants. */
export interface OneStepWell {
  mode: ReadingMode;
  /** s since the curve's origin, not negative. */
  timesS: readonly number[];
  /** Base unit. */
  values: readonly number[];
  /** Variance of a reading, base unit squared, above 0. */
  variance: number;
  /** Scaled distance of 1/T from the centre; 0 at the centre. */
  x: number;
  /** ln of the factor that brings k to the shared loading. */
  lnFactor: number;
  /** Product per reactant for growth, else 1. */
  perReactant: number;
  /** ln C0 where it is known or constants are relative to it; null where it is fitted. */
  lnC: number | null;
  /** Where the search for ln of the amplitude starts. */
  lnAmplitude: number;
}

/** Sums of one well over (ln constants…, ln amplitude): the normal matrix and its right side. */
export interface WellTerms {
  chi2: number;
  /** Of ln constants by ln constants. */
  shared: number[][];
  /** Of ln constants by ln amplitude. */
  cross: number[];
  /** Of ln amplitude; 0 where the readings do not hold it. */
  own: number;
  sharedRight: number[];
  ownRight: number;
}

/** ln of the well's own constants: shared (level, slope) pairs at its temperature and loading. */
export function ownConstants(shared: readonly number[], well: OneStepWell): number[] {
  const constants: number[] = [];
  for (let j = 0; 2 * j < shared.length; j += 1) {
    const lnConstant = shared[2 * j]! + shared[2 * j + 1]! * well.x;
    // With the loading only k scales.
    constants.push(j === 0 ? lnConstant - well.lnFactor : lnConstant);
  }
  return constants;
}

/** Weighted sums of a well's readings about its curve, with the analytic Jacobian. */
export function wellTerms(
  law: OneStepLaw,
  well: OneStepWell,
  shared: readonly number[],
  lnAmplitude: number,
): WellTerms {
  const { constants: c } = law;
  const { mode, timesS, values, perReactant } = well;
  const at = law.curve(ownConstants(shared, well), well.lnC ?? lnAmplitude);
  const terms: WellTerms = {
    chi2: 0,
    shared: Array.from({ length: c }, () => new Array<number>(c).fill(0)),
    cross: new Array<number>(c).fill(0),
    own: 0,
    sharedRight: new Array<number>(c).fill(0),
    ownRight: 0,
  };
  const free = mode !== 'fraction';
  const size = free ? perReactant * Math.exp(lnAmplitude) : 1;
  const sign = mode === 'decay' ? 1 : -1;
  const weight = 1 / well.variance;
  for (let i = 0; i < timesS.length; i += 1) {
    const { g, byConstant, byLnC } = at(timesS[i]!);
    const f = size * (mode === 'decay' ? g : 1 - g);
    const r = values[i]! - f;
    const byOwn = free ? f + (well.lnC === null ? sign * size * byLnC : 0) : 0;
    terms.chi2 += weight * r * r;
    terms.own += weight * byOwn * byOwn;
    terms.ownRight += weight * byOwn * r;
    for (let a = 0; a < c; a += 1) {
      const da = sign * size * byConstant[a]!;
      terms.cross[a]! += weight * da * byOwn;
      terms.sharedRight[a]! += weight * da * r;
      for (let b = 0; b <= a; b += 1) {
        terms.shared[a]![b]! += weight * da * sign * size * byConstant[b]!;
      }
    }
  }
  for (let a = 0; a < c; a += 1) {
    for (let b = 0; b < a; b += 1) terms.shared[b]![a] = terms.shared[a]![b]!;
  }
  // A product that grows in a straight line does not show where it will end.
  const scale = weight * size * size * timesS.length;
  if (!(terms.own > 1e-12 * scale)) {
    terms.own = 0;
    terms.ownRight = 0;
    terms.cross.fill(0);
  }
  return terms;
}

import { timeFromConstant, type LnConstant } from '../catalyst/rateAtReference';
import type { RateLaw } from '../rateLaws/rateLaw';
import type { Estimate } from '../types';
import type { BlankConstant } from './blankModel';

/** Intervals of Simpson's rule. */
const INTERVALS = 200;
/** Step in ln k for the slope of the time. */
const STEP = 1e-4;

/**
 * Time from a concentration to conversion X while the catalyst and what goes on without it work
 * together: t = ∫ dC/(k Cⁿ + k_b C^m).
 *
 * @param concentration base unit; null is enough where both are first order
 */
export function timeBesideBlank(
  own: LnConstant | null,
  law: RateLaw,
  blank: BlankConstant,
  concentration: number | null,
  conversion: number,
): Estimate | null {
  if (own === null) return null;
  const c = concentration ?? (law.order === 1 && blank.order === 1 ? 1 : null);
  if (c === null) return null;
  const lnTime = (lnK: number, blankK: number) =>
    Math.log(integral(Math.exp(lnK), law.order, blankK, blank.order, c, conversion));
  const middle = lnTime(own.lnK, blank.k);
  const byK = (lnTime(own.lnK + STEP, blank.k) - middle) / STEP;
  const byBlank = lnTime(own.lnK, blank.k + blank.se) - middle;
  const se = own.se === null ? null : Math.hypot(byK * own.se, byBlank);
  return timeFromConstant({ ...own, lnK: 0, se }, middle);
}

/** Simpson's rule over ln C. */
function integral(
  k: number,
  order: number,
  blankK: number,
  blankOrder: number,
  c: number,
  conversion: number,
): number {
  const width = -Math.log1p(-conversion) / INTERVALS;
  let sum = 0;
  for (let i = 0; i <= INTERVALS; i += 1) {
    const at = c * Math.exp(-i * width);
    const weight = i === 0 || i === INTERVALS ? 1 : i % 2 === 1 ? 4 : 2;
    sum += (weight * at) / (k * at ** order + blankK * at ** blankOrder);
  }
  return (sum * width) / 3;
}

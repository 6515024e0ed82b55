import type { Estimate } from '../kinetics/types';

/** 97.5 % quantile of the standard normal distribution. */
const z975 = 1.959963984540054;

/** Standard deviation of ln x that a 95 % interval stands for; null without a usable interval. */
function logSpread(estimate: Estimate): number | null {
  const { low, high } = estimate;
  if (low === null || high === null || low <= 0 || high <= low) return null;
  return Math.log(high / low) / (2 * z975);
}

/**
 * Which of several rates cannot be told from the highest one: the 95 % interval of ln(x/best) holds
 * 0. The rates are taken as independent and log-normal; errors that two candidates share, such as
 * that of a plate's temperature, are not taken off yet, so that a tie is said rather too often than
 * too seldom.
 *
 * @param estimates rates with their 95 % intervals, any one unit; null for candidates without one
 * @returns true for the best and for those tied with it, aligned with `estimates`
 */
export function tiedWithBest(estimates: readonly (Estimate | null)[]): boolean[] {
  const ranked = estimates.map((estimate) =>
    estimate !== null && estimate.value > 0
      ? { ln: Math.log(estimate.value), spread: logSpread(estimate) }
      : null,
  );
  const best = ranked.reduce((top, one) => (one && (!top || one.ln > top.ln) ? one : top), null);
  if (!best) return estimates.map(() => false);
  return ranked.map((one) => {
    if (!one) return false;
    if (one === best) return true;
    if (one.spread === null || best.spread === null) return false;
    return best.ln - one.ln <= z975 * Math.hypot(one.spread, best.spread);
  });
}

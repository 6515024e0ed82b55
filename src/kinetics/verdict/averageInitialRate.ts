import { estimate } from '../statistics/estimate';
import { akaikeWeights } from '../statistics/goodnessOfFit';
import type { Estimate } from '../types';

/** One law's initial rate with the information criterion of its fit. */
export interface RateOfLaw {
  value: number;
  se: number | null;
  criterion: number;
}

/**
 * Initial rate averaged over the laws by their Akaike weights, with the unconditional standard
 * error Σ w √(se² + (r − r̄)²) (Burnham & Anderson 2002, eq. 4.9). Laws without a standard error
 * are left out where others have one.
 *
 * @returns null when there is no law
 */
export function averageInitialRate(rates: readonly RateOfLaw[], dof: number): Estimate | null {
  const certain = rates.filter((rate) => rate.se !== null);
  const used = certain.length > 0 ? certain : rates;
  if (used.length === 0) return null;
  const weights = akaikeWeights(used.map((rate) => rate.criterion));
  const mean = used.reduce((sum, rate, i) => sum + weights[i]! * rate.value, 0);
  const se = used.reduce(
    (sum, rate, i) => sum + weights[i]! * Math.hypot(rate.se ?? NaN, rate.value - mean),
    0,
  );
  return estimate(mean, Number.isFinite(se) ? se : null, dof);
}

import type { Estimate } from '../types';
import { intervalFactor } from './tDistribution';

/** The value where it is a finite number, else null. */
export function finiteOrNull(value: number | null): number | null {
  return value !== null && Number.isFinite(value) ? value : null;
}

/**
 * A value with its 95 % t interval, value ± t se; interval null where se or degrees of freedom are
 * missing.
 *
 * @returns null when the value itself is not finite
 */
export function estimate(value: number | null, se: number | null, dof: number): Estimate | null {
  if (value === null || !Number.isFinite(value)) return null;
  const error = finiteOrNull(se);
  if (error === null || !(dof > 0)) return { value, se: error, low: null, high: null };
  const half = intervalFactor(dof) * error;
  return { value, se: error, low: finiteOrNull(value - half), high: finiteOrNull(value + half) };
}

/**
 * A positive value with its 95 % interval taken on the logarithm: value · exp(± t se(ln)). The
 * limits stay positive and are not symmetric. `se` is value · se(ln).
 */
export function logEstimate(
  lnValue: number | null,
  lnSe: number | null,
  dof: number,
): Estimate | null {
  if (lnValue === null) return null;
  const value = finiteOrNull(Math.exp(lnValue));
  if (value === null || value === 0) return null;
  const error = finiteOrNull(lnSe);
  if (error === null || !(dof > 0)) return { value, se: null, low: null, high: null };
  const half = intervalFactor(dof) * error;
  return {
    value,
    se: finiteOrNull(value * error),
    low: finiteOrNull(Math.exp(lnValue - half)),
    high: finiteOrNull(Math.exp(lnValue + half)),
  };
}

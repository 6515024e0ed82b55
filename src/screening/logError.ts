import { intervalFactor } from '../kinetics/statistics/tDistribution';
import type { Estimate } from '../kinetics/types';

/** 97.5 % quantile of the standard normal distribution. */
const Z975 = 1.959963984540054;
/** Above so many degrees of freedom Student's t is taken for the normal distribution. */
const MANY = 200;

/** The error of ln x: its standard error and the degrees of freedom of its t distribution. */
export interface LogError {
  /** Of ln x, 0 or above. */
  se: number;
  /** Above 0; `Infinity` for a normal error. */
  dof: number;
}

/**
 * The error of ln x that an estimate's 95 % interval stands for, ln x ± t se. Where the estimate
 * has no standard error of its own the interval is taken for a normal one.
 *
 * @returns null without a usable interval
 */
export function logErrorOf({ value, se, low, high }: Estimate): LogError | null {
  if (!(value > 0) || low === null || high === null || low <= 0 || high < low) return null;
  const half = Math.log(high / low) / 2;
  const own = se === null ? 0 : se / value;
  if (!(own > 0)) return { se: half / Z975, dof: Infinity };
  // The factor falls as the degrees of freedom rise; both came from the same table.
  const factor = half / own;
  for (let dof = 1; dof <= MANY; dof += 1) {
    if (intervalFactor(dof) <= factor * (1 + 1e-9)) return { se: own, dof };
  }
  return { se: own, dof: Infinity };
}

const shapes = new Map<number, number>();

/**
 * Turns a standard normal draw into one of Student's t: t² = ν (exp(c z²/ν) − 1), the inverse of
 * the normal approximation of D. L. Wallace (1959), with c set so that the 95 % interval is exact.
 * Elsewhere it is an approximation: the ends of the 80 % interval come
 * out 9 % short for ν = 1, 2 % for ν = 2 and 1 % for ν = 3, those of the 99 % interval 27, 5 and
 * 2 % long.
 *
 * @param dof ν, above 0; `Infinity` returns z
 */
export function studentDraw(z: number, dof: number): number {
  if (dof > MANY) return z;
  let shape = shapes.get(dof);
  if (shape === undefined) {
    shape = Math.log1p(intervalFactor(dof) ** 2 / dof) / Z975 ** 2;
    if (shapes.size < 1000) shapes.set(dof, shape);
  }
  return Math.sign(z) * Math.sqrt(dof * Math.expm1(shape * z * z));
}

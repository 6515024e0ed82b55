import { studentTQuantile } from '../statistics/tDistribution';
import { leveragesOfLaw, residualsOfLaw, type FittedLaw } from './fittedLaw';

/** Chance that a well without outliers has any reading pointed out (Bonferroni over readings). */
const OUTLIER_LEVEL = 0.002;
const ROUNDING = 1e-13;

const limits = new Map<string, number>();

/** The studentised residual that stands out of `n`; remembered, because a plate asks for few. */
function outlierLimit(n: number, dof: number): number {
  const key = `${n} ${dof}`;
  let limit = limits.get(key);
  if (limit === undefined) {
    limit = studentTQuantile(OUTLIER_LEVEL / (2 * n), dof);
    if (limits.size < 1000) limits.set(key, limit);
  }
  return limit;
}

/**
 * Points out readings whose externally studentised residual is beyond chance (Cook & Weisberg
 * 1982). Nothing is dropped.
 *
 * @param unit size of the readings
 * @param indices index of each reading in the series as given
 * @returns indices into the series as given, ascending
 */
export function findOutliers(
  fitted: FittedLaw,
  unit: number,
  indices: readonly number[],
): number[] {
  const dof = fitted.fit.dof - 1;
  const leverages = dof < 1 ? null : leveragesOfLaw(fitted);
  if (leverages === null) return [];
  const limit = outlierLimit(leverages.length, dof);
  const found: number[] = [];
  residualsOfLaw(fitted).forEach((residual, i) => {
    const free = 1 - leverages[i]!;
    if (free < 1e-9 || Math.abs(residual) < ROUNDING * unit) return;
    const without = Math.max(fitted.fit.rss - (residual * residual) / free, 0) / dof;
    const t = without > 0 ? Math.abs(residual) / Math.sqrt(without * free) : Infinity;
    if (t > limit) found.push(indices[i]!);
  });
  return found.sort((a, b) => a - b);
}

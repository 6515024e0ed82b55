import { studentTUpperTail } from '../statistics/tDistribution';
import { leveragesOf, residualsOf, type RelativeFit } from '../fitting/fitLaw';

/** Chance that a well without outliers has any reading pointed out (Bonferroni over readings). */
const OUTLIER_LEVEL = 0.002;
const ROUNDING = 1e-13;

/**
 * Points out readings whose externally studentised residual is beyond chance (Cook & Weisberg
 * 1982). Nothing is dropped.
 *
 * @param indices index of each reading in the series as given
 * @returns indices into the series as given, ascending
 */
export function findOutliers(fit: RelativeFit, indices: readonly number[]): number[] {
  const dof = fit.dof - 1;
  const leverages = leveragesOf(fit);
  if (dof < 1 || leverages === null) return [];
  const n = leverages.length;
  const found: number[] = [];
  residualsOf(fit).forEach((residual, i) => {
    const free = 1 - leverages[i]!;
    if (free < 1e-9 || Math.abs(residual) < ROUNDING * fit.problem.valueScale) return;
    const without = Math.max(fit.rss - (residual * residual) / free, 0) / dof;
    const t = without > 0 ? Math.abs(residual) / Math.sqrt(without * free) : Infinity;
    if (2 * n * studentTUpperTail(t, dof) < OUTLIER_LEVEL) found.push(indices[i]!);
  });
  return found.sort((a, b) => a - b);
}

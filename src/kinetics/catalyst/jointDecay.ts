import type { AnalysedWell } from '../analyseWell';
import { DECAY_LEVEL } from '../verdict/decayTest';

/** The slopes of a dead catalyst's wells fall together this seldom. */
const JOINT_LEVEL = 0.01;

/**
 * Whether wells without a reaction would look otherwise than these. Each dead well alone is kept as
 * such in 98 of 100 cases, but one of eight would be lost in every seventh catalyst. So either one
 * well must stand out of all of them (Bonferroni), or their slopes must fall together (Fisher 1932).
 *
 * @param wells all wells of a catalyst, or all blanks; those without a test do not count
 */
export function anyDecay(wells: readonly AnalysedWell[]): boolean {
  const tests = wells.flatMap(({ decay }) => (decay === null ? [] : [decay]));
  if (tests.some(({ p }) => p * tests.length < DECAY_LEVEL)) return true;
  return tests.length > 1 && fisherTail(tests.map(({ trendTail }) => trendTail)) < JOINT_LEVEL;
}

/** Upper tail of χ² with 2m degrees of freedom at −2 Σ ln p: e^(−x) Σ xʲ/j!, x = −Σ ln p. */
function fisherTail(tails: readonly number[]): number {
  const x = -tails.reduce((sum, tail) => sum + Math.log(Math.max(tail, 1e-300)), 0);
  let [term, sum] = [1, 1];
  for (let j = 1; j < tails.length; j += 1) {
    term *= x / j;
    sum += term;
  }
  return Math.exp(-x) * sum;
}

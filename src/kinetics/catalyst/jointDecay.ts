import type { AnalysedWell } from '../analyseWell';
import { fisherCombined } from '../statistics/fisherCombined';
import { DECAY_LEVEL } from '../verdict/decayTest';

/**
 * The slopes of a dead catalyst's wells fall together this seldom. With the test for a single well
 * that stands out, a dead catalyst of several wells is taken for a reacting one in 3 to 5 of 100
 * cases (simulated in tests/unit/kinetics/catalyst/jointDecay.test.ts).
 */
const JOINT_LEVEL = 0.03;

/**
 * Whether wells without a reaction would look otherwise than these. Each dead well alone is kept as
 * such in 98 of 100 cases, but one of eight would be lost in every seventh catalyst. So either one
 * well must stand out of all of them (Bonferroni; Dunn 1961), or their slopes must fall together
 * (Fisher 1932).
 *
 * @param wells all wells of a catalyst, or all blanks; those without a test do not count
 */
export function anyDecay(wells: readonly AnalysedWell[]): boolean {
  const tests = wells.flatMap(({ decay }) => (decay === null ? [] : [decay]));
  if (tests.some(({ p }) => p * tests.length < DECAY_LEVEL)) return true;
  return tests.length > 1 && fisherCombined(tests.map(({ trendTail }) => trendTail)) < JOINT_LEVEL;
}

import { runsTest } from '../statistics/runsTest';
import type { LackOfFit } from '../types';

/** One-sided level of too few runs: about one false alarm in a screen of 960 wells. */
const LACK_OF_FIT_LEVEL = 0.001;

/**
 * Judges whether residuals stay on one side for too long to be chance.
 *
 * @param residuals in time order
 */
export function testLackOfFit(residuals: readonly number[]): LackOfFit {
  const test = runsTest(residuals);
  return {
    runsP: test?.twoSided ?? null,
    significant: test !== null && test.lower < LACK_OF_FIT_LEVEL,
  };
}

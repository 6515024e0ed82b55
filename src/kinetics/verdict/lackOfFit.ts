import { runsTest } from '../statistics/runsTest';
import type { LackOfFit } from '../types';

/** One-sided level of too few runs: about one false alarm in a screen of 960 wells. */
const LACK_OF_FIT_LEVEL = 0.001;
const ROUNDING = 1e-13;

/**
 * Judges whether residuals stay on one side for too long to be chance.
 *
 * @param residuals in time order
 * @param unit size of the readings: residuals that are only rounding beside it have no sign
 */
export function testLackOfFit(residuals: readonly number[], unit: number): LackOfFit {
  const test = runsTest(
    residuals.map((residual) => (Math.abs(residual) < ROUNDING * unit ? 0 : residual)),
  );
  return {
    runsP: test?.twoSided ?? null,
    significant: test !== null && test.lower < LACK_OF_FIT_LEVEL,
  };
}

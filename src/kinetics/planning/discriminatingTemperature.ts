import { GAS_CONSTANT } from '../constants';
import type { ArrheniusLine } from '../types';

/** Lowest and highest temperature that may be run, K. */
export type TemperatureRange = readonly [lowestK: number, highestK: number];

/**
 * The temperature at which a reaction is a given number of times as fast:
 * 1/T' = 1/T − (R/Ea) ln f, so that a run of the same length reaches the conversion that would need
 * f times the time.
 *
 * @param line of k or of initial rates; their slope is what counts
 * @param temperatureK of the well, K
 * @param faster f, above 0
 * @returns K; null outside the range or where the line does not rise with temperature
 */
export function discriminatingTemperature(
  line: Pick<ArrheniusLine, 'activationEnergy'> | null,
  temperatureK: number,
  faster: number,
  [lowestK, highestK]: TemperatureRange,
): number | null {
  if (line === null || !(line.activationEnergy > 0)) return null;
  const inverse = 1 / temperatureK - (GAS_CONSTANT / line.activationEnergy) * Math.log(faster);
  const wanted = 1 / inverse;
  return inverse > 0 && wanted >= lowestK && wanted <= highestK ? wanted : null;
}

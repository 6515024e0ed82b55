import { shareOf, temperatureRamp } from '../screening/ramps';

/**
 * Colours of temperatures, the coldest to the hottest of those given: what a candidate's wells and
 * its Arrhenius plot share.
 *
 * @param temperaturesK K
 * @returns a temperature in K to `#rrggbb`
 */
export function temperatureTints(
  temperaturesK: readonly number[],
): (temperatureK: number) => string {
  const range = [Math.min(...temperaturesK), Math.max(...temperaturesK)] as const;
  return (temperatureK) => temperatureRamp(shareOf(temperatureK, range, 'linear'));
}

import { SAME_TEMPERATURE_K } from '../catalyst/temperatures';
import { studentTQuantile } from '../statistics/tDistribution';
import { DECAY_LEVEL } from '../verdict/decayTest';
import type { TemperatureRange } from './discriminatingTemperature';
import type { SamplingLimits } from './samplingTimes';
import type { PlannedWell } from './plannedWell';
import type { Proposal } from './proposal';

/** How many times longer a dead well is run. */
const LONGER = 4;
/** Chance that a rate at the limit of detection is missed. */
const MISSED = 0.1;

/**
 * Where a reaction would show, for wells in which none did: the hottest well run longer, or a
 * hotter one.
 *
 * The standard error of a straight line's slope falls as the duration grows, readings and noise
 * alike; the limit of detection is (t₁ + t₂) se after Currie, Anal. Chem. 1968, 40, 586, with the
 * level of the engine's test for decay and a chance of 10 % to miss it.
 *
 * @returns empty where no well has readings that give a rate
 */
export function detectReaction(
  wells: readonly PlannedWell[],
  [, highestK]: TemperatureRange,
  { longestRunS }: SamplingLimits,
): Proposal[] {
  const dead = wells
    .filter(({ analysis }) => analysis.verdict === 'no-reaction')
    .sort((a, b) => b.analysis.temperatureK - a.analysis.temperatureK);
  for (const { analysis, timesS } of dead) {
    const { initialRate: rate, pointsUsed, id: seriesId, temperatureK, dimension } = analysis;
    const firstS = timesS[0] ?? 0;
    const spanS = (timesS[timesS.length - 1] ?? 0) - firstS;
    if (rate?.se == null || rate.high === null || !(rate.se > 0) || !(spanS > 0)) continue;
    const longest = Math.max(longestRunS ?? Infinity, firstS + spanS);
    const lastS = Math.min(firstS + LONGER * spanS, longest);
    const longer = (lastS - firstS) / spanS;
    const dof = Math.max(pointsUsed - 2, 1);
    // Two tests share the engine's level, so that each has half of it.
    const quantiles = studentTQuantile(DECAY_LEVEL / 2, dof) + studentTQuantile(MISSED, dof);
    return [
      {
        code: 'detect-reaction',
        seriesId,
        temperatureK,
        dimension,
        rateLimit: Math.max(rate.high, 0),
        detectableNow: quantiles * rate.se,
        lastS,
        detectableRate: (quantiles * rate.se) / longer,
        hotterK: highestK - temperatureK > SAME_TEMPERATURE_K ? highestK : null,
      },
    ];
  }
  return [];
}

import { isExpectedToSettle } from './expectedSelection';
import type { ExpectedCurve } from './plannedWell';
import { evenTimes, mostReadings, type SamplingLimits } from './samplingTimes';

/** Durations tried, as multiples of the present one. */
const LONGER = Array.from({ length: 22 }, (_, i) => 1.2 ** (i + 1));
const SHORTER = Array.from({ length: 16 }, (_, i) => 1.25 ** -(i + 1));
const MORE_READINGS = [1.5, 2, 3, 4, 6, 8];
const LESS_NOISE = [0.7, 0.5, 0.35, 0.25];

/** Beyond this conversion under every law nothing is left to tell them by. */
const HIGHEST_CONVERSION = 0.995;

/** A well as it was run, with the curves of the laws that compete for it. */
export interface PresentDesign {
  curves: readonly ExpectedCurve[];
  readings: number;
  firstS: number;
  lastS: number;
}

/** The least change of a design that is expected to settle the order. */
export interface FoundDesign {
  by: 'repeat' | 'time' | 'readings' | 'noise' | 'none';
  lastS: number;
  readings: number;
  noiseShare: number | null;
  readingsAtPresentDuration: number | null;
}

/**
 * Searches for the design that settles the order whichever curve is true: the same again, another
 * duration, more readings, less noise, in this order.
 */
export function searchDesign(present: PresentDesign, limits: SamplingLimits): FoundDesign {
  const { curves, firstS } = present;
  const settles = (lastS: number, readings: number, noise = 1) => {
    const timesS = evenTimes(firstS, lastS, readings, limits.shortestIntervalS);
    return curves.every((curve) =>
      isExpectedToSettle({ ...curve, residualSd: curve.residualSd * noise }, timesS),
    );
  };
  const answer = (by: FoundDesign['by'], given: Partial<FoundDesign>): FoundDesign => ({
    by,
    lastS: present.lastS,
    readings: present.readings,
    noiseShare: null,
    readingsAtPresentDuration: null,
    ...given,
  });
  const durations = possibleDurations(present, limits);
  const more = MORE_READINGS.map((factor) => Math.ceil(factor * present.readings));
  const fit = (lastS: number, readings: number) =>
    readings <= mostReadings(firstS, lastS, limits.shortestIntervalS);

  if (settles(present.lastS, present.readings)) return answer('repeat', {});
  for (const lastS of durations) {
    if (!settles(lastS, present.readings)) continue;
    const same = more.find((n) => fit(present.lastS, n) && settles(present.lastS, n)) ?? null;
    return answer('time', { lastS, readingsAtPresentDuration: same });
  }
  for (const readings of more) {
    const lastS = [present.lastS, ...durations].find(
      (s) => fit(s, readings) && settles(s, readings),
    );
    if (lastS !== undefined) return answer('readings', { lastS, readings });
  }
  for (const noiseShare of LESS_NOISE) {
    const lastS = [present.lastS, ...durations].find((s) =>
      settles(s, present.readings, noiseShare),
    );
    if (lastS !== undefined) return answer('noise', { lastS, noiseShare });
  }
  return answer('none', {});
}

/** Last times worth trying, the smallest change first; longer before shorter. */
function possibleDurations(
  { curves, firstS, lastS }: PresentDesign,
  { longestRunS, shortestIntervalS }: SamplingLimits,
): number[] {
  const spanS = lastS - firstS;
  const useful = Math.max(
    ...curves.map(
      ({ law, kRel, originS }) =>
        originS + (law.order === 0 ? 2 : law.reach(HIGHEST_CONVERSION)) / kRel,
    ),
  );
  const longest = Math.min(useful, longestRunS ?? Infinity);
  const longer = LONGER.map((factor) => firstS + factor * spanS).filter((s) => s <= longest);
  const shorter = SHORTER.map((factor) => firstS + factor * spanS).filter(
    (s) => s - firstS >= 4 * shortestIntervalS,
  );
  return [...longer, ...shorter];
}

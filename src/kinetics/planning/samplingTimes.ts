/** What the instrument and the day allow. */
export interface SamplingLimits {
  /** s between two readings of one well, at least 0. */
  shortestIntervalS: number;
  /** s, the longest run; null for no limit. */
  longestRunS: number | null;
}

/** How far a gap may fall short of the shortest interval by rounding. */
const ROUNDING = 1e-9;

/** The most readings that fit between two times, one at each end. */
export function mostReadings(firstS: number, lastS: number, shortestIntervalS: number): number {
  return shortestIntervalS > 0
    ? Math.floor((lastS - firstS) / shortestIntervalS + ROUNDING) + 1
    : Infinity;
}

/**
 * Equally spaced sampling times, no closer than the shortest interval; fewer than asked for where
 * they do not fit.
 *
 * Exact optimal designs repeat a few times; a robot cannot read a well twice at once, and equal
 * spacing keeps readings for the test of the law itself.
 *
 * @param readings at least 2
 * @param shortestIntervalS s, at least 0
 * @returns s, ascending, from `firstS` to `lastS`
 */
export function evenTimes(
  firstS: number,
  lastS: number,
  readings: number,
  shortestIntervalS: number,
): number[] {
  const count = Math.max(Math.min(readings, mostReadings(firstS, lastS, shortestIntervalS)), 2);
  const step = (lastS - firstS) / (count - 1);
  return Array.from({ length: count }, (_, i) => (i === count - 1 ? lastS : firstS + i * step));
}

/**
 * Sampling times gathered around given ones, as a D-optimal design asks, in equal shares and no
 * closer than the shortest interval.
 *
 * @param centresS s, ascending, where readings tell most
 * @param earliestS no reading before
 * @param latestS no reading after; the run is made longer where the readings do not fit
 */
export function gatheredTimes(
  centresS: readonly number[],
  readings: number,
  earliestS: number,
  latestS: number,
  shortestIntervalS: number,
): number[] {
  const chosen: number[] = [];
  centresS.forEach((centre, i) => {
    const share = Math.floor(readings / centresS.length) + (i < readings % centresS.length ? 1 : 0);
    const span = (share - 1) * shortestIntervalS;
    const start = Math.max(Math.min(centre - span / 2, latestS - span), earliestS);
    for (let j = 0; j < share; j += 1) {
      const wanted = start + j * shortestIntervalS;
      const previous = chosen[chosen.length - 1];
      chosen.push(previous === undefined ? wanted : Math.max(wanted, previous + shortestIntervalS));
    }
  });
  return chosen;
}

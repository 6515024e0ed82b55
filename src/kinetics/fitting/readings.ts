import type { DecaySeries, ReadingDimension } from '../types';
import { MODE } from './problem';

/** s; times closer than this are one time: the squares of shorter spans are 0 in a double. */
const SAME_TIME_S = 1e-100;
/** s; the squares of later times are infinite in a double: no clock shows them. */
const LONGEST_S = 1e100;

/** The usable readings of a well, sorted by time. */
export interface Readings {
  /** s, ascending. */
  times: number[];
  /** The reading's base unit. */
  values: number[];
  /** Index of each reading in the series as given. */
  indices: number[];
  excluded: number;
  unsorted: boolean;
  /** Product and conversion begin at time 0: all times up to 0 are one. */
  distinctTimes: number;
}

/**
 * Collects the readings that can be fitted and sorts them by time; equal times keep their order.
 *
 * @throws RangeError when times and values differ in length
 */
export function collectReadings(series: DecaySeries): Readings {
  const { timesS, values } = series;
  if (timesS.length !== values.length) {
    throw new RangeError(
      `times and values of series "${series.id}" must have one length, got ${timesS.length} and ${values.length}`,
    );
  }
  const usable: number[] = [];
  let unsorted = false;
  let latest = -Infinity;
  timesS.forEach((time, i) => {
    if (time < latest) unsorted = true;
    latest = Math.max(latest, time);
    if (Math.abs(time) <= LONGEST_S && Number.isFinite(values[i] ?? NaN)) usable.push(i);
  });
  const indices = usable.sort((a, b) => timesS[a]! - timesS[b]! || a - b);
  const times = indices.map((i) => timesS[i]!);
  return {
    times,
    values: indices.map((i) => values[i]!),
    indices,
    excluded: timesS.length - indices.length,
    unsorted,
    distinctTimes: countDistinct(times, MODE[series.kind] === 'decay' ? -Infinity : 0),
  };
}

function countDistinct(ascending: readonly number[], begin: number): number {
  let [count, last] = [0, -Infinity];
  for (const time of ascending) {
    const since = Math.max(time, begin);
    if (since - last <= SAME_TIME_S) continue;
    count += 1;
    last = since;
  }
  return count;
}

/**
 * The dimension in which C, k and rates of a well are given: that of its readings, except for
 * conversion readings, which become concentrations once the initial concentration is known.
 */
export function resultDimension(series: DecaySeries): ReadingDimension {
  if (series.kind !== 'conversion') return series.dimension;
  if (series.initialConcentration === null) return 'ratio';
  return series.dimension === 'ratio' ? 'concentration' : series.dimension;
}

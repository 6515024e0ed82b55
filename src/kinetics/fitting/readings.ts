import type { DecaySeries, ReadingDimension } from '../types';

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
    if (Number.isFinite(time) && Number.isFinite(values[i] ?? NaN)) usable.push(i);
  });
  const indices = usable.sort((a, b) => timesS[a]! - timesS[b]! || a - b);
  const times = indices.map((i) => timesS[i]!);
  return {
    times,
    values: indices.map((i) => values[i]!),
    indices,
    excluded: timesS.length - indices.length,
    unsorted,
    distinctTimes: times.filter((time, i) => i === 0 || time !== times[i - 1]).length,
  };
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

import type { SeriesAnalysis } from '../kinetics/types';

interface Readings {
  id: string;
  timesS: readonly number[];
  values: readonly (number | null)[];
}

/**
 * Chooses the decay that tells most about a catalyst and thins it for a small drawing.
 *
 * The best-followed well is the one whose conversion is nearest to 0.85: far enough to show the
 * shape, not so far that most of it lies on the floor.
 *
 * @param wells engine answers of the catalyst's wells
 * @param readingsOf readings of a well; times in s, values in the base unit
 * @param points at most this many pairs, at least 2
 * @returns pairs of time in s and reading over its largest magnitude, in order of time; empty when
 *   no well can be drawn
 */
export function thinDecay(
  wells: readonly SeriesAnalysis[],
  readingsOf: (wellId: string) => Omit<Readings, 'id'> | null,
  points: number,
): [number, number][] {
  const drawable = wells.filter((well) => well.conversion !== null);
  const best = drawable.sort(
    (a, b) => Math.abs((a.conversion ?? 0) - 0.85) - Math.abs((b.conversion ?? 0) - 0.85),
  )[0];
  const readings = best && readingsOf(best.id);
  if (!readings) return [];
  const pairs = readings.timesS
    .map((time, index): [number, number | null] => [time, readings.values[index] ?? null])
    .filter((pair): pair is [number, number] => pair[1] !== null)
    .sort((a, b) => a[0] - b[0]);
  const largest = pairs.reduce((most, [, value]) => Math.max(most, Math.abs(value)), 0);
  if (largest === 0) return [];
  const step = Math.max(1, (pairs.length - 1) / (points - 1));
  const kept = new Set(
    Array.from({ length: Math.min(points, pairs.length) }, (_, index) => Math.round(index * step)),
  );
  return pairs
    .filter((_, index) => kept.has(index))
    .map(([time, value]) => [time, Number((value / largest).toPrecision(4))]);
}

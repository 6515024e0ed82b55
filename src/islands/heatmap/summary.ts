import type { Heatmap, HeatmapCell, HeatmapRow } from '../../contracts/leaderboard';
import { formatKelvinAsCelsius } from '../numbers';
import { metricNames, type MetricScale } from './metrics';

/** A value with its unit, as it is read out; the word of the verdict stands in `verdictWord`. */
export function cellValue(cell: HeatmapCell, scale: MetricScale): string | null {
  const value = scale.valueOf(cell);
  if (value === null) return null;
  if (scale.unit === '') return scale.format(value);
  const times = scale.unit.startsWith('10') ? ' ×' : '';
  return `${scale.format(value)}${times} ${scale.unit}`;
}

/** One sentence or two for those who do not see the colours: highest, lowest, missing. */
export function heatmapSummary(
  rows: readonly HeatmapRow[],
  temperaturesK: Heatmap['temperaturesK'],
  scale: MetricScale,
): string {
  const places = rows.flatMap((row) => row.cells.map((cell) => ({ row, cell })));
  const missing = places.filter(({ cell }) => cell === null).length;
  const measured = `${rows.length} candidates at ${temperaturesK.length} temperatures`;
  const gaps = missing === 0 ? '' : ` ${missing} of ${places.length} places were not measured.`;
  const valued = places
    .flatMap(({ row, cell }) => {
      const value = cell && scale.valueOf(cell);
      return value === null || cell === null ? [] : [{ row, cell, value }];
    })
    .sort((a, b) => a.value - b.value);
  const [lowest, highest] = [valued[0], valued.at(-1)];
  if (!lowest || !highest) return `${measured}.${gaps}`;
  const say = ({ row, cell }: { row: HeatmapRow; cell: HeatmapCell }) =>
    `${row.code} at ${formatKelvinAsCelsius(cell.temperatureK)} (${cellValue(cell, scale)})`;
  return `${metricNames[scale.id]} of ${measured}: highest ${say(highest)}, lowest ${say(lowest)}.${gaps}`;
}

import type { HeatmapRow } from '../../contracts/leaderboard';
import { verdicts } from '../leaderboard/address';
import type { HeatmapLook } from './address';
import type { MetricScale } from './metrics';

/** °C of a set temperature, as it stands in the address. */
export function celsiusOf(temperatureK: number): number {
  return Number((temperatureK - 273.15).toFixed(2));
}

/** The rows in the order asked for; those without a value stay last whichever way. */
export function sortHeatmapRows(
  rows: readonly HeatmapRow[],
  temperaturesK: readonly number[],
  { sort, direction }: Pick<HeatmapLook, 'sort' | 'direction'>,
  scale: Pick<MetricScale, 'id' | 'valueOf'>,
): HeatmapRow[] {
  const byCode = [...rows].sort((a, b) => a.code.localeCompare(b.code, 'en', { numeric: true }));
  const column = temperaturesK.findIndex((temperatureK) => celsiusOf(temperatureK) === sort);
  if (column < 0) return direction === 'asc' ? byCode : byCode.reverse();
  const valueOf = (row: HeatmapRow): number | null => {
    const cell = row.cells[column];
    if (!cell) return null;
    return scale.id === 'verdict' ? -verdicts.indexOf(cell.verdict) : scale.valueOf(cell);
  };
  const sign = direction === 'asc' ? 1 : -1;
  return byCode.sort((a, b) => {
    const [one, other] = [valueOf(a), valueOf(b)];
    if (one === null || other === null) return Number(one === null) - Number(other === null);
    return sign * (one - other);
  });
}

import type { CustomSeriesOption, LineSeriesOption, ScatterSeriesOption } from 'echarts/charts';
import type { ChartTheme } from './chartTheme';

/** Marks that tell replicates apart without colour. */
export const replicateSymbols = ['circle', 'rect', 'triangle', 'diamond', 'roundRect'] as const;

/** A cross, for a reading that does not count. */
export const crossPath = 'path://M-1,-1L1,1M-1,1L1,-1';

export interface Band {
  x: readonly number[];
  low: readonly number[];
  high: readonly number[];
}

/** The rows of a band's series: x, the lower and the upper edge, however they were handed in. */
export function bandRows(band: Band): [x: number, low: number, high: number][] {
  return band.x.map((x, index) => {
    const [a, b] = [band.low[index]!, band.high[index]!];
    return [x, Math.min(a, b), Math.max(a, b)];
  });
}

/** A tint between two edges. */
export function bandSeries(id: string, band: Band, theme: ChartTheme): CustomSeriesOption {
  const rows = bandRows(band);
  return {
    id,
    type: 'custom',
    silent: true,
    clip: true,
    z: 1,
    data: rows,
    encode: { x: 0, y: [1, 2] },
    renderItem: (params, api) => {
      // One polygon for all rows, drawn with the first of them.
      if (params.dataIndex !== 0) return null;
      const above = rows.map(([x, , high]) => api.coord([x, high]));
      const below = rows.map(([x, low]) => api.coord([x, low])).reverse();
      return {
        type: 'polygon',
        shape: { points: [...above, ...below] },
        style: { fill: theme.accent, opacity: 0.16 },
      };
    },
  };
}

/** Whiskers with short caps, from rows of x, low, high. */
export function whiskerSeries(
  id: string,
  rows: readonly { x: number; low: number; high: number; colour: string }[],
): CustomSeriesOption {
  return {
    id,
    type: 'custom',
    silent: true,
    clip: true,
    z: 3,
    data: rows.map(({ x, low, high }) => [x, low, high]),
    encode: { x: 0, y: [1, 2] },
    renderItem: (params, api) => {
      const row = rows[params.dataIndex];
      if (!row) return null;
      const [x = 0, top = 0] = api.coord([row.x, row.high]);
      const [, bottom = 0] = api.coord([row.x, row.low]);
      const stroke = { stroke: row.colour, lineWidth: 1.2, fill: 'none' };
      const line = (x1: number, y1: number, x2: number, y2: number) => ({
        type: 'line' as const,
        shape: { x1, y1, x2, y2 },
        style: stroke,
      });
      return {
        type: 'group',
        children: [
          line(x, top, x, bottom),
          line(x - 3, top, x + 3, top),
          line(x - 3, bottom, x + 3, bottom),
        ],
      };
    },
  };
}

/** A drawn curve; dashed and thin when it is a rival. */
export function curveSeries(
  id: string,
  points: [number, number][],
  look: { colour: string; width: number; dashed: boolean; z?: number },
): LineSeriesOption {
  return {
    id,
    type: 'line',
    data: points,
    showSymbol: false,
    silent: true,
    clip: true,
    z: look.z ?? 2,
    lineStyle: {
      color: look.colour,
      width: look.width,
      type: look.dashed ? [5, 4] : 'solid',
      cap: 'round',
    },
    emphasis: { disabled: true },
  };
}

/** How large to draw a reading so that many do not become a smear. */
export function readingSize(count: number): number {
  if (count > 200) return 4;
  if (count > 60) return 6;
  return 8;
}

interface PointRow {
  value: [number, number];
  /** What the tooltip says, lines apart. */
  note: string;
}

/** Readings as open circles. */
export function openCircles(
  id: string,
  rows: PointRow[],
  theme: ChartTheme,
  size = readingSize(rows.length),
): ScatterSeriesOption {
  return {
    id,
    type: 'scatter',
    symbol: 'circle',
    symbolSize: size,
    z: 4,
    data: rows,
    itemStyle: {
      color: theme.sheet,
      borderColor: theme.ink,
      borderWidth: size > 5 ? 1.4 : 1,
      opacity: 1,
    },
    tooltip: { formatter: noteOf },
    emphasis: { itemStyle: { color: theme.ink } },
  };
}

/** Readings that do not count, as crosses. */
export function crosses(id: string, rows: PointRow[], theme: ChartTheme): ScatterSeriesOption {
  return {
    id,
    type: 'scatter',
    symbol: crossPath,
    symbolSize: 8,
    z: 4,
    clip: false,
    data: rows,
    itemStyle: { color: 'none', borderColor: theme.refusal, borderWidth: 1.6 },
    tooltip: { formatter: noteOf },
  };
}

/** The tooltip of a point is the note that it carries. */
export function noteOf(params: unknown): string {
  const point = (params as { data?: { note?: unknown } }).data;
  return typeof point?.note === 'string' ? point.note : '';
}

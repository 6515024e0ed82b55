import { bottomAxis, gridWithin, leftAxis, paintedTooltip, planAxis, type AxisPlan } from './axes';
import type { ChartOption, ChartSeries } from './chartOption';
import type { ChartFrame, ChartTheme } from './chartTheme';
import { bandSeries, curveSeries, replicateSymbols, whiskerSeries } from './layers';
import { extent } from './niceScale';
import { noteOf } from './layers';
import { plotNumber } from './plotNumber';

export interface ArrheniusPlotPoint {
  /** 1000/T, K⁻¹. */
  x: number;
  /** ln of k or of the initial rate. */
  y: number;
  se: number;
  temperatureK: number;
  /** 1-based; null when the workbook numbers none. */
  replicate: number | null;
  /** From the temperature ramp. */
  colour: string;
  wellId: string;
  /** Plate and position. */
  well: string;
}

export interface ArrheniusPlot {
  points: readonly ArrheniusPlotPoint[];
  line: {
    x: readonly number[];
    y: readonly number[];
    low: readonly number[] | null;
    high: readonly number[] | null;
  };
  /** Such as `ln (k / s⁻¹)`. */
  yName: string;
  selectedWellId: string | null;
}

/** Whiskers reach this many standard errors either way. */
export const whiskerReach = 2;

/** Whole degrees when the plate was set to whole degrees. */
export function celsius(temperatureK: number): string {
  return `${plotNumber(Number((temperatureK - 273.15).toFixed(1)))} °C`;
}

/** Set temperatures that stand apart on the axis, so that their labels do not run together. */
export function temperatureTicks(points: readonly ArrheniusPlotPoint[], least: number): number[] {
  const places = [...new Set(points.map(({ x }) => x))].sort((a, b) => a - b);
  const kept: number[] = [];
  for (const x of places) {
    const last = kept.at(-1);
    if (last === undefined || x - last >= least) kept.push(x);
  }
  return kept;
}

/** ln k against 1000/T with whiskers, the fitted line and its band; °C is written along the top. */
export function buildArrheniusOption(
  plot: ArrheniusPlot,
  theme: ChartTheme,
  frame: ChartFrame,
): ChartOption {
  const { points, line } = plot;
  const [xLow, xHigh] = extent([...points.map(({ x }) => x), ...line.x]) ?? [2, 4];
  const [yLow, yHigh] = extent([
    ...points.flatMap(({ y, se }) => [y - whiskerReach * se, y + whiskerReach * se]),
    ...line.y,
    ...(line.low ?? []),
    ...(line.high ?? []),
  ]) ?? [0, 1];
  const xMargin = (xHigh - xLow || 0.1) * 0.05;
  const yMargin = (yHigh - yLow || 1) * 0.05;
  const narrow = frame.width < 480;
  const xPlan = planAxis('1000/T, K⁻¹', xLow - xMargin, xHigh + xMargin, narrow ? 3 : 6);
  const yPlan = planAxis(plot.yName, yLow - yMargin, yHigh + yMargin, 5);
  const plotWidth = Math.max(1, frame.width - 72);
  const ticks = temperatureTicks(points, ((xPlan.max - xPlan.min) * 52) / plotWidth);

  const series: ChartSeries[] = [];
  if (line.low && line.high) {
    series.push(bandSeries('band', { x: line.x, low: line.low, high: line.high }, theme));
  }
  series.push(
    curveSeries(
      'line',
      line.x.map((x, index) => [x, line.y[index]!]),
      {
        colour: theme.accent,
        width: 2,
        dashed: false,
      },
    ),
    whiskerSeries(
      'whiskers',
      points.map(({ x, y, se }) => ({
        x,
        low: y - whiskerReach * se,
        high: y + whiskerReach * se,
        colour: theme.ink,
      })),
    ),
    {
      id: 'points',
      type: 'scatter',
      z: 4,
      tooltip: { formatter: noteOf },
      data: points.map((point) => ({
        value: [point.x, point.y],
        name: point.wellId,
        symbol: replicateSymbols[((point.replicate ?? 1) - 1) % replicateSymbols.length]!,
        symbolSize: point.wellId === plot.selectedWellId ? 13 : 9,
        itemStyle: {
          color: point.colour,
          borderColor: theme.ink,
          borderWidth: point.wellId === plot.selectedWellId ? 2.4 : 1,
        },
        note: [
          `${point.well}, ${celsius(point.temperatureK)}`,
          `${plot.yName} = ${plotNumber(point.y)} ± ${plotNumber(point.se, 2)}`,
          ...(point.replicate === null ? [] : [`replicate ${point.replicate}`]),
        ].join('\n'),
      })),
    },
  );
  return {
    animation: false,
    grid: gridWithin({ top: 62, right: 20 }),
    xAxis: [bottomAxis(xPlan, { theme }), topAxis({ ...xPlan, name: '', ticks }, theme)],
    yAxis: { ...leftAxis(yPlan, { theme }), nameGap: 36 },
    tooltip: paintedTooltip(theme),
    series,
  };
}

function topAxis(plan: AxisPlan, theme: ChartTheme) {
  const axis = bottomAxis(plan, { theme, format: (x) => celsius(1000 / x) });
  return { ...axis, position: 'top' as const };
}

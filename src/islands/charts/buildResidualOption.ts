import { bottomAxis, gridWithin, leftAxis, paintedTooltip, planAxis } from './axes';
import type { ChartOption } from './chartOption';
import type { ChartFrame, ChartTheme } from './chartTheme';
import { withUnit, type DisplayUnit } from './displayUnits';
import { curveSeries, openCircles } from './layers';
import { extent, niceScale } from './niceScale';
import { plotNumber } from './plotNumber';

export interface ResidualPoint {
  timeS: number;
  /** Reading minus curve, base unit. */
  residual: number;
  /** Pointed out by the engine. */
  outlier: boolean;
  place: string;
}

export interface ResidualPlot {
  points: readonly ResidualPoint[];
  /** Base unit; null when there are too few readings. */
  residualSd: number | null;
  timeUnit: DisplayUnit;
  readingUnit: DisplayUnit;
}

/** Residuals against time about a zero line, with guides one standard deviation either side. */
export function buildResidualOption(
  plot: ResidualPlot,
  theme: ChartTheme,
  frame: ChartFrame,
): ChartOption {
  const { points, timeUnit } = plot;
  // Residuals are about a hundredth of the readings, so they take a unit of their own size.
  const unit = plot.readingUnit;
  const sd = plot.residualSd === null ? null : plot.residualSd * unit.factor;
  const [low, high] = extent(points.map(({ residual }) => residual * unit.factor)) ?? [-1, 1];
  const reach = Math.max(Math.abs(low), Math.abs(high), (sd ?? 0) * 1.2) || 1;
  const { interval } = niceScale(-reach, reach, 4);
  const end = Math.ceil(reach / interval - 1e-9) * interval;
  const [firstS, lastS] = extent(points.map(({ timeS }) => timeS)) ?? [0, 1];
  const startS = Math.min(firstS, 0);
  const narrow = frame.width < 480;
  const xPlan = planAxis(
    withUnit('Time', timeUnit.unit),
    startS * timeUnit.factor,
    (lastS + (lastS - startS || 1) * 0.015) * timeUnit.factor,
    narrow ? 4 : 8,
  );
  const yPlan = planAxis(withUnit('Reading − curve', unit.unit), -end, end, 4);
  const across = (y: number): [number, number][] => [
    [xPlan.min, y],
    [xPlan.max, y],
  ];
  const rows = points.map(({ timeS, residual, outlier, place }) => ({
    value: [timeS * timeUnit.factor, residual * unit.factor] as [number, number],
    note: [
      `${plotNumber(timeS * timeUnit.factor)} ${timeUnit.unit}`,
      `${plotNumber(residual * unit.factor, 3)} ${unit.unit}${outlier ? ', stands out' : ''}`,
      place,
    ].join('\n'),
    ...(outlier ? { itemStyle: { borderColor: theme.warning, borderWidth: 2 } } : {}),
  }));
  const guide = { colour: theme.quiet, width: 1, dashed: true };
  return {
    animation: false,
    grid: gridWithin({ right: narrow ? 74 : 104 }),
    xAxis: bottomAxis(xPlan, { theme }),
    yAxis: leftAxis(yPlan, { theme }),
    tooltip: paintedTooltip(theme),
    series: [
      curveSeries('zero', across(0), { colour: theme.quiet, width: 1, dashed: false }),
      ...(sd === null
        ? []
        : [
            guideWithName('sd-high', across(sd), '+ s.d.', theme, guide),
            guideWithName('sd-low', across(-sd), '− s.d.', theme, guide),
          ]),
      openCircles('residuals', rows, theme),
    ],
  };
}

function guideWithName(
  id: string,
  points: [number, number][],
  name: string,
  theme: ChartTheme,
  look: Parameters<typeof curveSeries>[2],
) {
  return {
    ...curveSeries(id, points, look),
    endLabel: {
      show: true,
      formatter: name,
      color: theme.quiet,
      fontSize: 12,
      fontFamily: theme.fontFamily,
      distance: 6,
    },
  };
}

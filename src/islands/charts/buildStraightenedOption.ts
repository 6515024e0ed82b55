import { bottomAxis, gridWithin, leftAxis, paintedTooltip, planAxis } from './axes';
import type { ChartOption } from './chartOption';
import type { ChartFrame, ChartTheme } from './chartTheme';
import type { WellPlot } from './decayChart';
import { curveSeries, openCircles } from './layers';
import { extent } from './niceScale';
import { plotNumber } from './plotNumber';

export type StraightLaw = 'zero' | 'first' | 'second';

/** The coordinate that runs straight in time under each law. */
export const straightenings: Record<
  StraightLaw,
  { title: string; axisName: (unit: string) => string; transform: (c: number) => number }
> = {
  zero: {
    title: 'Straight if zero order',
    axisName: (unit) => (unit === '' ? 'C' : `C, ${unit}`),
    transform: (c) => c,
  },
  first: {
    title: 'Straight if first order',
    axisName: (unit) => (unit === '' ? 'ln C' : `ln (C / ${unit})`),
    transform: (c) => (c > 0 ? Math.log(c) : NaN),
  },
  second: {
    title: 'Straight if second order',
    axisName: (unit) => (unit === '' ? '1/C' : `1/C, (${unit})⁻¹`),
    transform: (c) => (c > 0 ? 1 / c : NaN),
  },
};

/**
 * One straightened plot, for the eye only: the fit itself is made on the readings as measured.
 * Readings at or below zero have no place on it and are left out.
 */
export function buildStraightenedOption(
  plot: WellPlot,
  law: StraightLaw,
  theme: ChartTheme,
  frame: ChartFrame,
): ChartOption {
  const { timeUnit, readingUnit, curves } = plot;
  const { axisName, transform } = straightenings[law];
  const point = (timeS: number, value: number): [number, number] => [
    timeS * timeUnit.factor,
    transform(value * readingUnit.factor),
  ];
  const used = plot.readings.flatMap(({ timeS, value, excluded, place }) =>
    value === null || excluded ? [] : [{ value: point(timeS, value), place }],
  );
  const rows = used
    .filter(({ value }) => Number.isFinite(value[1]))
    .map(({ value, place }) => ({
      value,
      note: `${plotNumber(value[0])} ${timeUnit.unit}\n${plotNumber(value[1])}\n${place}`,
    }));
  const [low, high] = extent(rows.map(({ value }) => value[1])) ?? [0, 1];
  const margin = (high - low || 1) * 0.06;
  const lastS = Math.max(0, ...plot.readings.map(({ timeS }) => timeS)) || 1;
  const xPlan = planAxis(
    `Time, ${timeUnit.unit}`,
    0,
    lastS * 1.02 * timeUnit.factor,
    frame.width < 260 ? 3 : 4,
  );
  const yPlan = planAxis(axisName(readingUnit.unit), low - margin, high + margin, 4);
  const drawn = curves.laws.find((curve) => curve.law === law);
  const own = law === curves.shownLaw && curves.asserted;
  const line = (drawn?.values ?? [])
    .map((value, index) => point(curves.timesS[index]!, value))
    .filter(([, y]) => Number.isFinite(y));
  return {
    animation: false,
    grid: gridWithin({ right: 12, left: 52 }),
    xAxis: bottomAxis(xPlan, { theme }),
    yAxis: leftAxis(yPlan, { theme }),
    tooltip: paintedTooltip(theme),
    series: [
      curveSeries('line', line, {
        colour: own ? theme.accent : theme.quiet,
        width: own ? 2 : 1,
        dashed: !own,
      }),
      openCircles('readings', rows, theme, rows.length > 40 ? 4 : 6),
    ],
  };
}

import { bottomAxis, gridWithin, leftAxis, paintedTooltip, planAxis } from './axes';
import type { ChartOption, ChartSeries } from './chartOption';
import type { ChartFrame, ChartTheme } from './chartTheme';
import type { WellPlot } from './decayChart';
import { withUnit } from './displayUnits';
import { bandSeries, crosses, curveSeries, openCircles } from './layers';
import { lawLabelSeries } from './lawLabels';
import { extent } from './niceScale';
import { plotNumber } from './plotNumber';

/** Another well at the same temperature, drawn faintly behind. */
export interface OverlaidWell {
  label: string;
  symbol: string;
  timesS: readonly number[];
  values: readonly (number | null)[];
}

const top = 34;
const bottom = 48;

/** Ends of both axes in display units: zero is always on the paper. */
function ranges(plot: WellPlot, overlay: readonly OverlaidWell[]) {
  const { readings, curves, timeUnit, readingUnit } = plot;
  const shown = curves.laws.find(({ law }) => law === curves.shownLaw);
  const [low, high] = extent([
    0,
    ...readings.map(({ value }) => value),
    ...(shown?.values ?? []),
    ...(curves.band?.high ?? []),
    ...overlay.flatMap(({ values }) => values),
  ]) ?? [0, 1];
  const [firstS, lastS] = extent([
    ...readings.map(({ timeS }) => timeS),
    ...overlay.flatMap(({ timesS }) => timesS),
  ]) ?? [0, 1];
  const span = lastS - Math.min(firstS, 0) || 1;
  return {
    x: [Math.min(firstS, 0) * timeUnit.factor, (lastS + span * 0.015) * timeUnit.factor] as const,
    y: [low * 1.06 * readingUnit.factor, (high || 1) * 1.06 * readingUnit.factor] as const,
  };
}

/**
 * Readings against time with the fitted curve, its band, and the rival laws named at their ends.
 * Excluded readings stay, crossed; those without a number are crossed on the time axis.
 */
export function buildDecayCurveOption(
  plot: WellPlot,
  theme: ChartTheme,
  frame: ChartFrame,
  overlay: readonly OverlaidWell[] = [],
): ChartOption {
  const { readings, curves, timeUnit, readingUnit } = plot;
  const { x, y } = ranges(plot, overlay);
  const narrow = frame.width < 480;
  const xPlan = planAxis(withUnit('Time', timeUnit.unit), ...x, narrow ? 4 : 8);
  const yPlan = planAxis(withUnit(plot.quantity, readingUnit.unit), ...y, 5);
  const toPoint = (timeS: number, value: number): [number, number] => [
    timeS * timeUnit.factor,
    value * readingUnit.factor,
  ];
  const rows = readings.map(({ timeS, value, excluded, place }) => ({
    excluded: excluded || value === null,
    value: toPoint(timeS, value ?? yPlan.min / readingUnit.factor),
    note: [
      `${plotNumber(timeS * timeUnit.factor)} ${timeUnit.unit}`,
      value === null
        ? 'no number'
        : `${plotNumber(value * readingUnit.factor)} ${readingUnit.unit}${excluded ? ', excluded' : ''}`,
      place,
    ].join('\n'),
  }));

  const series: ChartSeries[] = [];
  if (curves.band) {
    const { low, high } = curves.band;
    series.push(
      bandSeries(
        'band',
        {
          x: curves.timesS.map((timeS) => timeS * timeUnit.factor),
          low: low.map((value) => value * readingUnit.factor),
          high: high.map((value) => value * readingUnit.factor),
        },
        theme,
      ),
    );
  }
  for (const { law, values } of curves.laws) {
    const own = law === curves.shownLaw && curves.asserted;
    series.push(
      curveSeries(
        `law-${law}`,
        curves.timesS.map((timeS, index) => toPoint(timeS, values[index]!)),
        {
          colour: own ? theme.accent : theme.quiet,
          width: own ? 2 : 1,
          dashed: !own,
          z: own ? 3 : 2,
        },
      ),
    );
  }
  for (const [index, { label, symbol, timesS, values }] of overlay.entries()) {
    series.push({
      id: `overlay-${index}`,
      type: 'scatter',
      symbol,
      symbolSize: 5,
      z: 2,
      itemStyle: { color: theme.quiet, opacity: 0.55 },
      tooltip: { formatter: label },
      data: timesS.flatMap((timeS, at) => {
        const value = values[at];
        return value === null || value === undefined ? [] : [toPoint(timeS, value)];
      }),
    });
  }
  series.push(
    openCircles(
      'readings',
      rows.filter(({ excluded }) => !excluded),
      theme,
    ),
    crosses(
      'excluded',
      rows.filter(({ excluded }) => excluded),
      theme,
    ),
    lawLabelSeries({ plot, theme, xPlan, yPlan, plotHeight: frame.height - top - bottom }),
  );
  return {
    animation: false,
    grid: gridWithin({ top, bottom, right: narrow ? 74 : 104 }),
    xAxis: bottomAxis(xPlan, { theme }),
    yAxis: leftAxis(yPlan, { theme }),
    tooltip: paintedTooltip(theme),
    series,
  };
}

import type { ScatterSeriesOption } from 'echarts/charts';
import type { AxisPlan } from './axes';
import type { ChartTheme } from './chartTheme';
import type { WellPlot } from './decayChart';
import { spreadLabels } from './spreadLabels';

const gapPx = 17;

/** The name of each law beside the end of its curve, moved apart where curves end together. */
export function lawLabelSeries(input: {
  plot: WellPlot;
  theme: ChartTheme;
  xPlan: AxisPlan;
  yPlan: AxisPlan;
  /** px. */
  plotHeight: number;
}): ScatterSeriesOption {
  const { plot, theme, xPlan, yPlan, plotHeight } = input;
  const { curves, readingUnit } = plot;
  const perPx = (yPlan.max - yPlan.min) / plotHeight;
  const ends = curves.laws.map(({ values }) => (values.at(-1) ?? 0) * readingUnit.factor);
  const places = spreadLabels(ends, gapPx * perPx, yPlan.min, yPlan.max);
  return {
    id: 'law-labels',
    type: 'scatter',
    symbolSize: 0,
    silent: true,
    clip: false,
    z: 5,
    data: curves.laws.map(({ law, label }, index) => {
      const own = law === curves.shownLaw && curves.asserted;
      return {
        name: law,
        value: [xPlan.max, places[index]!],
        label: {
          show: true,
          position: 'right' as const,
          distance: 6,
          formatter: label,
          color: own ? theme.ink : theme.quiet,
          fontWeight: own ? 700 : 400,
          fontSize: 12,
          fontFamily: theme.fontFamily,
        },
      };
    }),
  };
}

import type { WellPlot } from '@/islands/charts/decayChart';
import type { ChartTheme } from '@/islands/charts/chartTheme';

export const theme: ChartTheme = {
  sheet: '#fdfcf9',
  ink: '#222222',
  quiet: '#666666',
  rule: '#dddddd',
  accent: '#117777',
  warning: '#aa7711',
  refusal: '#aa3311',
  fontFamily: 'sans-serif',
};

export const frame = { width: 800, height: 340 };

/** Four readings of 10 mmol/L in 20 min; one excluded, one without a number. */
export function wellPlot(change: Partial<WellPlot> = {}): WellPlot {
  return {
    readings: [
      { timeS: 0, value: 0.01, excluded: false, place: 'Readings, D2' },
      { timeS: 600, value: 0.004, excluded: true, place: 'Readings, D3' },
      { timeS: 900, value: null, excluded: false, place: 'Readings, D4' },
      { timeS: 1200, value: 0.005, excluded: false, place: 'Readings, D5' },
    ],
    curves: {
      timesS: [0, 600, 1200],
      laws: [
        { law: 'zero', label: 'zero', values: [0.01, 0.0075, 0.005] },
        { law: 'first', label: 'first', values: [0.01, 0.00707, 0.005] },
      ],
      // The edges are handed in crossed over at the second time.
      band: { low: [0.0098, 0.0073, 0.0047], high: [0.0102, 0.0069, 0.0053] },
      shownLaw: 'first',
      asserted: true,
    },
    quantity: 'Bromate',
    timeUnit: { unit: 'min', factor: 1 / 60 },
    readingUnit: { unit: 'mmol/L', factor: 1000 },
    ...change,
  };
}

export interface DrawnSeries {
  id: string;
  type: string;
  data: unknown[];
  [key: string]: unknown;
}

/** One series of an option by its id. */
export function seriesOf(option: { series?: unknown }, id: string): DrawnSeries {
  const found = (option.series as DrawnSeries[]).find((series) => series.id === id);
  if (!found) throw new Error(`no series ${id}`);
  return found;
}

export interface DrawnAxis {
  name: string;
  min: number;
  max: number;
  axisTick: { customValues: number[] };
  axisLabel: { customValues: number[]; formatter: (value: number) => string };
}

export const axisOf = (axis: unknown) => axis as DrawnAxis;
export const valuesOf = (series: DrawnSeries) =>
  (series.data as { value: [number, number] }[]).map(({ value }) => value);

import type { DisplayUnit } from './displayUnits';

/** One reading as the charts take it, in s and the base unit. */
export interface PlotReading {
  timeS: number;
  /** Null when the file has no number there, or it was excluded and its value is not at hand. */
  value: number | null;
  excluded: boolean;
  /** Where it stands in the workbook, such as `Readings!D7`. */
  place: string;
}

export interface PlotCurves {
  timesS: readonly number[];
  laws: readonly { law: string; label: string; values: readonly number[] }[];
  band: { low: readonly number[]; high: readonly number[] } | null;
  /** The law drawn as the well's own curve. */
  shownLaw: string | null;
  /** False when the data do not decide: then no curve is drawn as the truth. */
  asserted: boolean;
}

/** What the charts of one well share, so that their axes and units agree. */
export interface WellPlot {
  readings: readonly PlotReading[];
  curves: PlotCurves;
  /** Name of what was read, without unit. */
  quantity: string;
  timeUnit: DisplayUnit;
  readingUnit: DisplayUnit;
}

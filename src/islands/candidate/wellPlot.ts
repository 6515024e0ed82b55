import type { CandidateWell } from '../../contracts/candidate';
import type { ResidualPlot, ResidualPoint } from '../charts/buildResidualOption';
import type { WellPlot } from '../charts/decayChart';
import { readingName, readingUnitFor, timeUnitFor } from '../charts/displayUnits';
import { interpolate } from '../charts/interpolate';
import { extent } from '../charts/niceScale';
import { freeOrderOf, isAsserted, lawLabel } from './lawWords';
import { cellOf } from './sourceCells';

const largest = (values: readonly (number | null)[]) => {
  const [low, high] = extent(values) ?? [0, 1];
  return Math.max(Math.abs(low), Math.abs(high));
};

/** What the charts of one well need, in units that fit its size and length. */
export function wellPlotOf(well: CandidateWell, reactant: string): WellPlot {
  const { analysis, curves } = well;
  const order = freeOrderOf(analysis);
  return {
    readings: well.timesS.map((timeS, index) => ({
      timeS,
      value: well.values[index] ?? null,
      excluded: false,
      place: cellOf(well.source, index),
    })),
    curves: {
      timesS: curves.timesS,
      laws: curves.laws.map(({ law, values }) => ({ law, values, label: lawLabel(law, order) })),
      band: curves.band,
      shownLaw: analysis.shownLaw,
      asserted: isAsserted(analysis),
    },
    quantity: readingName(analysis.kind, reactant),
    timeUnit: timeUnitFor(Math.max(0, ...well.timesS)),
    readingUnit: readingUnitFor(analysis.dimension, largest(well.values)),
  };
}

/** Reading minus shown curve, at each reading that counts; empty when no curve is shown. */
export function residualsOf(well: CandidateWell): ResidualPoint[] {
  const { analysis, curves } = well;
  const shown = curves.laws.find(({ law }) => law === analysis.shownLaw);
  if (!shown) return [];
  return well.timesS.flatMap((timeS, index) => {
    const value = well.values[index] ?? null;
    const curve = interpolate(curves.timesS, shown.values, timeS);
    if (value === null || curve === null) return [];
    return [
      {
        timeS,
        residual: value - curve,
        outlier: analysis.outliers.includes(index),
        place: cellOf(well.source, index),
      },
    ];
  });
}

/** What the residual chart needs, in a unit of the residuals' own size. */
export function residualPlotOf(well: CandidateWell): ResidualPlot {
  const points = residualsOf(well);
  const { analysis } = well;
  return {
    points,
    residualSd: analysis.residualSd,
    timeUnit: timeUnitFor(Math.max(0, ...well.timesS)),
    readingUnit: readingUnitFor(
      analysis.dimension,
      largest(points.map(({ residual }) => residual)),
    ),
  };
}

/** The decay in one sentence, for those who do not see the chart. */
export function describeDecay(well: CandidateWell, plot: WellPlot): string {
  const { timeUnit, readingUnit, readings, curves } = plot;
  const numbers = readings.flatMap(({ value }) => (value === null ? [] : [value]));
  const show = (value: number | undefined) =>
    value === undefined
      ? 'nothing'
      : `${(value * readingUnit.factor).toPrecision(3)} ${readingUnit.unit}`;
  const minutes = (Math.max(0, ...well.timesS) * timeUnit.factor).toPrecision(3);
  const law =
    curves.shownLaw === null
      ? 'No curve is drawn.'
      : `The ${curves.asserted ? 'fitted' : 'likeliest'} curve is ${lawLabel(curves.shownLaw)}.`;
  return (
    `${plot.quantity} against time, well ${well.position} of ${well.plate}: ${numbers.length} ` +
    `readings from ${show(numbers[0])} to ${show(numbers.at(-1))} in ${minutes} ${timeUnit.unit}. ` +
    `${law} The readings stand in the table below.`
  );
}

/**
 * Coefficient of determination of the shown curve; null without a curve or spread. Kept to this
 * page: it is near 1 for every law that falls, and decides nothing.
 */
export function determination(well: CandidateWell): number | null {
  const residuals = residualsOf(well).map(({ residual }) => residual);
  const values = well.values.filter((value): value is number => value !== null);
  if (residuals.length === 0 || residuals.length !== values.length) return null;
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  const total = values.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  const left = residuals.reduce((sum, residual) => sum + residual ** 2, 0);
  return total > 0 ? 1 - left / total : null;
}

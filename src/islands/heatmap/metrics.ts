import type { HeatmapCell, HeatmapRow } from '../../contracts/leaderboard';
import type { RateLawName, ReadingDimension } from '../../kinetics/types';
import { superscript } from '../../kinetics/significantFigures';
import { amountRamp, rateRamp, shareOf, type Ramp } from '../../screening/ramps';
import { printedUnit } from '../candidate/figures';
import { extent } from '../charts/niceScale';
import { prefixedRateUnit } from '../leaderboard/measures';
import { formatPercent, threeFigures } from '../numbers';

/** What the heatmap's cells can show. */
export const metricIds = ['rate', 'k', 'conversion', 'verdict', 'residual', 'misfit'] as const;
export type MetricId = (typeof metricIds)[number];

export const metricNames: Record<MetricId, string> = {
  rate: 'Initial rate',
  k: 'Rate constant k',
  conversion: 'Conversion',
  verdict: 'Verdict',
  residual: 'Residual s.d.',
  misfit: 'Lack of fit',
};

/** What one cell stands for, since it may hold several wells. */
export const metricNotes: Record<MetricId, string> = {
  rate: 'Geometric mean of the wells of a cell, each at its own loading and its first reading.',
  k: 'Geometric mean of the wells of a cell, brought to the reference loading.',
  conversion: 'Mean of the wells of a cell at their last readings.',
  verdict: 'Undetermined where the wells of a cell disagree.',
  residual: 'Root mean square of the wells of a cell, as a share of the initial concentration.',
  misfit: 'Wells in which the best law still leaves a trend, as a share of those in the cell.',
};

/** Everything that is needed to draw and read one metric. */
export interface MetricScale {
  id: MetricId;
  unit: string;
  /** In the unit shown; null where there is nothing to place, and for verdicts. */
  domain: readonly [number, number] | null;
  scale: 'linear' | 'log';
  ramp: Ramp;
  /** In the unit shown; null when the cell has none. */
  valueOf: (cell: HeatmapCell) => number | null;
  format: (value: number) => string;
}

/** The laws that give a k here, in the order of their names' use. */
export function lawsWithK(rows: readonly HeatmapRow[]): RateLawName[] {
  const known: RateLawName[] = ['zero', 'first', 'second', 'saturating', 'order'];
  return known.filter((law) =>
    rows.some((row) => row.law === law && row.cells.some((cell) => cell && cell.k !== null)),
  );
}

/** The rows that a metric compares: for k only those of one law, since units differ. */
export function comparedRows(
  rows: readonly HeatmapRow[],
  id: MetricId,
  law: RateLawName | null,
): HeatmapRow[] {
  return rows.filter((row) => id !== 'k' || row.law === law);
}

const share = (value: number) => formatPercent(value);
const wholePercent = (value: number) => `${Math.round(value * 100)} %`;

/**
 * Scale, unit and colours of a metric.
 *
 * @param rows the compared rows
 */
export function metricScale(
  id: MetricId,
  rows: readonly HeatmapRow[],
  dimension: ReadingDimension,
): MetricScale {
  const cells = rows.flatMap((row) => row.cells.filter((cell) => cell !== null));
  const over = (valueOf: MetricScale['valueOf']) => extent(cells.map(valueOf));
  switch (id) {
    case 'rate': {
      const largest = over((cell) => cell.initialRate)?.[1] ?? 1;
      const { unit, factor } = prefixedRateUnit(dimension, largest);
      const valueOf = positive((cell) => cell.initialRate, factor);
      const domain = over(valueOf);
      return { id, unit, domain, scale: 'log', ramp: rateRamp, valueOf, format: threeFigures };
    }
    case 'k': {
      const largest = over((cell) => cell.k)?.[1] ?? 1;
      const power = largest >= 0.1 && largest < 1e3 ? 0 : Math.floor(Math.log10(largest));
      const own = printedUnit(cells.find((cell) => cell.kUnit !== null)?.kUnit ?? '');
      const unit = power === 0 ? own : `10${superscript(power)} ${own}`;
      const valueOf = positive((cell) => cell.k, 10 ** -power);
      const domain = over(valueOf);
      return { id, unit, domain, scale: 'log', ramp: rateRamp, valueOf, format: threeFigures };
    }
    case 'conversion': {
      const valueOf = (cell: HeatmapCell) => cell.conversion;
      const base = { id, unit: '', domain: [0, 1] as const, scale: 'linear' as const };
      return { ...base, ramp: rateRamp, valueOf, format: share };
    }
    case 'residual': {
      const valueOf = (cell: HeatmapCell) => cell.relativeResidualSd;
      const domain = [0, over(valueOf)?.[1] ?? 0.01] as const;
      return {
        id,
        unit: 'of C₀',
        domain,
        scale: 'linear',
        ramp: amountRamp,
        valueOf,
        format: share,
      };
    }
    case 'misfit': {
      const valueOf = (cell: HeatmapCell) => cell.wellsWithLackOfFit / cell.wells;
      const base = { id, unit: 'of the wells', domain: [0, 1] as const, scale: 'linear' as const };
      return { ...base, ramp: amountRamp, valueOf, format: wholePercent };
    }
    case 'verdict': {
      const base = { id, unit: '', domain: null, scale: 'linear' as const, ramp: amountRamp };
      return { ...base, valueOf: () => null, format: String };
    }
  }
}

/** A well without a reaction has no rate to compare: what is left is the scatter's sign and size. */
function positive(
  valueOf: (cell: HeatmapCell) => number | null,
  factor: number,
): MetricScale['valueOf'] {
  return (cell) => {
    const value = cell.verdict === 'no-reaction' ? null : valueOf(cell);
    return value !== null && value > 0 ? value * factor : null;
  };
}

/** The colour of a value; null where the metric has none, and where there is nothing to point at. */
export function tintOf({ id, domain, scale, ramp }: MetricScale, value: number): string | null {
  if (id === 'misfit' && value === 0) return null;
  return domain && ramp(shareOf(value, domain, scale));
}

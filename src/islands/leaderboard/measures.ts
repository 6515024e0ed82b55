import type { CampaignSummary, LeaderboardRow } from '../../contracts/leaderboard';
import type { Estimate } from '../../kinetics/types';
import { formatPercent } from '../numbers';

/** The measured quantities of the leaderboard that are drawn on a shared axis. */
export const measureIds = ['rate', 'perGram', 'turnover', 'time', 'k', 'ea'] as const;
export type MeasureId = (typeof measureIds)[number];

/** One measured quantity: where its figure is found and how it is drawn, said and ranked. */
export interface Measure {
  id: MeasureId;
  label: string;
  scale: 'log' | 'linear';
  /** Which end is wanted; null where neither is better. */
  better: 'high' | 'low' | null;
  estimateOf: (row: LeaderboardRow) => Estimate | null;
  /** True where the figure of an undetermined order is a bracket between laws. */
  mayBracket: boolean;
}

export const measures: Record<MeasureId, Measure> = {
  rate: {
    id: 'rate',
    label: 'Rate',
    scale: 'log',
    better: 'high',
    estimateOf: (row) => row.rateRef,
    mayBracket: true,
  },
  perGram: {
    id: 'perGram',
    label: 'Rate per gram',
    scale: 'log',
    better: 'high',
    estimateOf: (row) => row.rateRefPerMass,
    mayBracket: true,
  },
  turnover: {
    id: 'turnover',
    label: 'Turnover frequency',
    scale: 'log',
    better: 'high',
    estimateOf: (row) => row.turnoverFrequency,
    mayBracket: true,
  },
  time: {
    id: 'time',
    label: 'Time to target',
    scale: 'log',
    better: 'low',
    estimateOf: (row) => row.timeToTarget,
    mayBracket: true,
  },
  k: {
    id: 'k',
    label: 'Rate constant k',
    scale: 'log',
    better: 'high',
    estimateOf: (row) => (row.kUnit === null ? null : row.kRef),
    mayBracket: false,
  },
  ea: {
    id: 'ea',
    label: 'Activation energy',
    scale: 'linear',
    better: null,
    estimateOf: (row) => row.activationEnergy,
    mayBracket: false,
  },
};

/** True when the row's figure of this measure is a bracket and no 95 % interval. */
export function isBracket(row: LeaderboardRow, { mayBracket }: Pick<Measure, 'mayBracket'>) {
  return mayBracket && row.bracket;
}

/** A unit with typographic signs and what a base-unit figure is multiplied with to get there. */
export interface MeasureUnit {
  unit: string;
  factor: number;
}

const prefixes = [
  { prefix: '', factor: 1 },
  { prefix: 'm', factor: 1e3 },
  { prefix: 'µ', factor: 1e6 },
  { prefix: 'n', factor: 1e9 },
  { prefix: 'p', factor: 1e12 },
];

function prefixed(unit: string, toUnit: number, largest: number): MeasureUnit {
  const fits = prefixes.find(({ factor }) => largest * toUnit * factor >= 1) ?? prefixes[0]!;
  return { unit: `${fits.prefix}${unit}`, factor: toUnit * fits.factor };
}

/** The unit of a rate whose largest figure is given in base units. */
export function prefixedRateUnit(
  dimension: CampaignSummary['dimension'],
  largest: number,
): MeasureUnit {
  switch (dimension) {
    case 'concentration':
      return prefixed('mol L⁻¹ s⁻¹', 1, largest);
    case 'pressure':
      return largest >= 1e3 ? { unit: 'kPa s⁻¹', factor: 1e-3 } : { unit: 'Pa s⁻¹', factor: 1 };
    case 'ratio':
      return largest >= 0.1 ? { unit: 's⁻¹', factor: 1 } : { unit: 'h⁻¹', factor: 3600 };
  }
}

function timeUnit(middle: number): MeasureUnit {
  if (middle >= 259_200) return { unit: 'd', factor: 1 / 86_400 };
  if (middle >= 10_800) return { unit: 'h', factor: 1 / 3600 };
  return middle >= 180 ? { unit: 'min', factor: 1 / 60 } : { unit: 's', factor: 1 };
}

/** The one unit of a whole column. k has none of its own: its unit changes with the order. */
export function unitOf(
  id: Exclude<MeasureId, 'k'>,
  dimension: CampaignSummary['dimension'],
  rows: readonly LeaderboardRow[],
): MeasureUnit {
  const values = rows
    .map((row) => measures[id].estimateOf(row)?.value ?? null)
    .filter((value): value is number => value !== null && value > 0)
    .sort((a, b) => a - b);
  const largest = values.at(-1) ?? 1;
  switch (id) {
    case 'rate':
      return prefixedRateUnit(dimension, largest);
    case 'perGram':
      return prefixed('mol g⁻¹ s⁻¹', 1e-3, largest);
    case 'turnover':
      return largest >= 0.1 ? { unit: 's⁻¹', factor: 1 } : { unit: 'h⁻¹', factor: 3600 };
    case 'time':
      return timeUnit(values[Math.floor(values.length / 2)] ?? 60);
    case 'ea':
      return { unit: 'kJ/mol', factor: 1e-3 };
  }
}

/** The measure's name in a header of this campaign. */
export function labelIn(id: MeasureId, { targetConversion }: CampaignSummary): string {
  return id === 'time' ? `Time to ${formatPercent(targetConversion)}` : measures[id].label;
}

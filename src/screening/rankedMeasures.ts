import type { CatalystAnalysis } from '../kinetics/types';
import type { Ranking } from './ranks';

/** How many candidates a campaign takes on unless it says otherwise: the first three. */
export const FIRST_CANDIDATES = 3;

/** What candidates are ranked by. */
export type RankedMeasure = 'rate' | 'perGram' | 'turnover' | 'time' | 'k';

/** A candidate's place by each measure; null where it is not ranked. */
export type Rankings = Record<RankedMeasure, Ranking | null>;

/** Rows whose k may be ranked together: one order and one unit; null without a k. */
export function kGroupOf(
  row: Pick<CatalystAnalysis, 'verdict' | 'order' | 'kUnit'>,
): string | null {
  return row.kUnit === null ? null : `${row.order ?? row.verdict}|${row.kUnit}`;
}

import type { ScreenWellRow } from '../../contracts/screens';
import type { Verdict } from '../../kinetics/types';
import { verdictWord } from '../../screening/decayMarks';

/** The word of a well's verdict, or that it has none yet. */
export function wellVerdictWord(verdict: string | null): string {
  return verdict === null ? 'not analysed' : verdictWord(verdict as Verdict);
}

export interface WellFilter {
  /** Empty: every verdict. */
  verdict: string;
  /** Found in plate, position or catalyst, in any case. */
  search: string;
}

/** The wells that pass a filter, in their order. */
export function filterWells(wells: readonly ScreenWellRow[], filter: WellFilter): ScreenWellRow[] {
  const wanted = filter.search.trim().toLowerCase();
  return wells.filter(
    ({ verdict, plate, position, catalyst }) =>
      (filter.verdict === '' || (verdict ?? 'not analysed') === filter.verdict) &&
      (wanted === '' || `${plate} ${position} ${catalyst ?? ''}`.toLowerCase().includes(wanted)),
  );
}

/** How many wells have each verdict, the most frequent first. */
export function countVerdicts(wells: readonly ScreenWellRow[]): [verdict: string, count: number][] {
  const counts = new Map<string, number>();
  for (const { verdict } of wells) {
    const key = verdict ?? 'not analysed';
    counts.set(key, (counts.get(key) ?? 0) + 1);
  }
  return [...counts].sort(([a, m], [b, n]) => n - m || a.localeCompare(b, 'en'));
}

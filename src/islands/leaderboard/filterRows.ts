import type { LeaderboardRow } from '../../contracts/leaderboard';
import type { LeaderboardLook } from './address';

type Filter = Pick<LeaderboardLook, 'search' | 'verdicts' | 'states' | 'tags'>;

/** Whether a row stays: every word of the search in it, and one of the chosen ones of each kind. */
export function keepsRow(row: LeaderboardRow, filter: Filter): boolean {
  const { verdicts, states, tags } = filter;
  if (verdicts.length > 0 && !verdicts.includes(row.verdict)) return false;
  if (states.length > 0 && !states.includes(row.decision.state)) return false;
  if (tags.length > 0 && !tags.some((tag) => row.tags.includes(tag))) return false;
  const words = filter.search.toLowerCase().split(/\s+/).filter(Boolean);
  if (words.length === 0) return true;
  const text = [row.code, row.composition, row.support, ...row.tags].join(' ').toLowerCase();
  return words.every((word) => text.includes(word));
}

/** How many rows have each value, in the order of `known`; those without any are left out. */
export function countOf<T extends string>(
  rows: readonly LeaderboardRow[],
  known: readonly T[],
  valuesOf: (row: LeaderboardRow) => readonly T[],
): { value: T; count: number }[] {
  const counts = new Map<T, number>();
  for (const row of rows) {
    for (const value of valuesOf(row)) counts.set(value, (counts.get(value) ?? 0) + 1);
  }
  return known.flatMap((value) => {
    const count = counts.get(value);
    return count === undefined ? [] : [{ value, count }];
  });
}

/** All tags in use, in alphabetical order. */
export function tagsOf(rows: readonly LeaderboardRow[]): string[] {
  return [...new Set(rows.flatMap((row) => row.tags))].sort((a, b) => a.localeCompare(b));
}

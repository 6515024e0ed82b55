import type { LeaderboardLook } from './address';
import type { LeaderboardColumn } from './columns';

/** What a screen reader hears after a change of sort or filter. */
export function announcement(
  look: LeaderboardLook,
  columns: readonly Pick<LeaderboardColumn, 'id' | 'header'>[],
  shown: number,
  all: number,
): string {
  const header = columns.find(({ id }) => id === look.sort)?.header ?? look.sort;
  const way = look.direction === 'asc' ? 'lowest first' : 'highest first';
  const grouped = look.sort === 'k' ? ', within each order' : '';
  const count = shown === all ? `${all} candidates` : `${shown} of ${all} candidates`;
  return `Sorted by ${header.toLowerCase()}${grouped}, ${way}. ${count}.`;
}

import type { Rank } from './arrange';

/** px. */
export const rankWidth = 40;

/** The place in the ranking; tied places share a mark and are not told apart. */
export function RankMark({ rank }: { rank: Rank | null }) {
  if (!rank) return null;
  return rank.tied ? (
    <span className="text-accent font-semibold">
      <span aria-hidden="true">= 1</span>
      <span className="sr-only">tied with the best</span>
    </span>
  ) : (
    <span className="text-quiet">{rank.place}</span>
  );
}

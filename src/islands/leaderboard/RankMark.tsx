import { FIRST_CANDIDATES } from '../../screening/rankedMeasures';
import { formatPercent } from '../numbers';
import type { Rank } from './arrange';

/** px. */
export const rankWidth = 60;

/** The rank interval, where it is more than the place itself. */
export function rankSpan({ low, high }: Pick<Rank, 'low' | 'high'>): string {
  return low === null || high === null || low === high ? '' : `(${low}–${high})`;
}

/** What a rank says, in a sentence. */
export function rankSentence({ place, low, high, tied, chanceAmongFirst }: Rank): string {
  if (low === null || high === null || chanceAmongFirst === null) {
    return `Rank ${place}; its figure has no interval, so the rank has none.`;
  }
  const span =
    low === high
      ? `Rank ${place} in at least 95 % of cases.`
      : `Rank ${place}; between ${low} and ${high} in 95 % of cases.`;
  const tie = tied ? ' Cannot be told from the best.' : '';
  return `${span}${tie} Chance to be among the first ${FIRST_CANDIDATES}: ${formatPercent(chanceAmongFirst)}.`;
}

/** The place in the ranking; tied places share a mark and are not told apart. */
export function RankMark({ rank }: { rank: Rank | null }) {
  if (!rank) return null;
  const span = rankSpan(rank);
  return (
    <span title={rankSentence(rank)} className="block leading-[18px]">
      {rank.tied ? (
        <span className="text-accent font-semibold">
          <span aria-hidden="true">= 1</span>
          <span className="sr-only">tied with the best</span>
        </span>
      ) : (
        <span className="text-quiet">{rank.place}</span>
      )}
      {span && <span className="text-quiet block text-[12.5px] whitespace-nowrap">{span}</span>}
    </span>
  );
}

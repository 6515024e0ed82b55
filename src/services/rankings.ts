import { rankLeaderboard, type RankedResult } from '../screening/rankLeaderboard';
import type { Rankings } from '../screening/rankedMeasures';

/** Campaigns whose ranks are kept. */
const MOST_KEPT = 50;

const kept = new Map<string, { of: string; rankings: Map<string, Rankings> }>();

/**
 * Ranks of a campaign, drawn anew only when what they follow from has changed: finished results
 * never change, and the draws are seeded.
 *
 * @param of names the analyses, in order, that the results come from
 * @returns by catalyst id
 */
export function rankingsOf(
  campaignId: string,
  of: readonly string[],
  temperatureK: number,
  results: readonly (RankedResult & { catalystId: string })[],
): Map<string, Rankings> {
  const key = [temperatureK, results.length, ...of].join(' ');
  const known = kept.get(campaignId);
  if (known?.of === key) return known.rankings;
  const ranked = rankLeaderboard(results, temperatureK);
  const rankings = new Map(results.map(({ catalystId }, i) => [catalystId, ranked[i]!]));
  kept.delete(campaignId);
  kept.set(campaignId, { of: key, rankings });
  const [oldest] = kept.keys();
  if (kept.size > MOST_KEPT && oldest !== undefined) kept.delete(oldest);
  return rankings;
}

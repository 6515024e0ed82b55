import type { Viewer } from '../auth/viewer';
import type { Leaderboard, LeaderboardRow } from '../contracts/leaderboard';
import type { Database } from '../db/client';
import { listCandidateStates, listTags } from '../db/repositories/candidates';
import { explainCatalyst, explainWarning } from '../kinetics';
import type { CatalystAnalysis } from '../kinetics/types';
import { requireCampaign, summariseCampaign } from './campaigns';
import { loadCurrentAnalyses, loadCurrentResults, type CurrentResult } from './currentAnalyses';
import { rankingsOf } from './rankings';
import { readCatalystAnalysis } from './storedResults';

type Unplaced = Omit<LeaderboardRow, 'ranks' | 'tags' | 'decision'>;

function rowOf({ row, otherScreens }: CurrentResult, result: CatalystAnalysis): Unplaced {
  return {
    catalystId: row.catalystId,
    code: row.code,
    composition: row.composition,
    support: row.support,
    verdict: result.verdict,
    order: result.order,
    basis: result.basis,
    kRef: result.kRef,
    kUnit: result.kUnit,
    activationEnergy: result.activationEnergy,
    rateRef: result.rateRef,
    rateRefPerMass: result.rateRefPerMass,
    turnoverFrequency: result.turnoverFrequency,
    timeToTarget: result.timeToTarget,
    bracket: result.bracket,
    conversion: result.conversion,
    relativeResidualSd: result.relativeResidualSd,
    wellsWithLackOfFit: result.wellsWithLackOfFit,
    wells: result.wells,
    temperatures: result.temperatures,
    warnings: result.warnings.map((code) => ({ code, sentence: explainWarning(code) })),
    explanation: explainCatalyst(result),
    screenId: row.screenId,
    screenName: row.screenName,
    analysisId: row.analysisId,
    otherScreens,
    sparkline: JSON.parse(row.sparkline) as [number, number][],
  };
}

/**
 * The candidates of a campaign, each from the newest finished analysis that holds it.
 *
 * @throws Problem 404 when the viewer is not in the campaign's group.
 */
export async function viewLeaderboard(
  db: Database,
  viewer: Viewer,
  campaignId: string,
): Promise<Leaderboard> {
  const campaign = await requireCampaign(db, viewer, campaignId);
  const { groupId } = campaign;
  const current = await loadCurrentAnalyses(db, groupId, campaignId);
  const results = await loadCurrentResults(db, groupId, current);
  const [states, tags] = await Promise.all([
    listCandidateStates(db, groupId, campaignId),
    listTags(db, groupId, [...results.keys()]),
  ]);
  const candidates = [...results.values()].map((current) => ({
    current,
    result: readCatalystAnalysis(current.row.result),
  }));
  const ranks = rankingsOf(
    campaignId,
    current.finished.map((row) => row.analysis.id),
    campaign.referenceTemperatureK,
    candidates.map(({ current: { row }, result }) => ({
      ...result,
      catalystId: row.catalystId,
      screenId: row.screenId,
    })),
  );
  return {
    campaign: summariseCampaign(campaign),
    rows: candidates.map(({ current, result }) => ({
      ...rowOf(current, result),
      ranks: ranks.get(current.row.catalystId)!,
      tags: tags.get(current.row.catalystId) ?? [],
      decision: states.get(current.row.catalystId) ?? { state: 'open', version: 0 },
    })),
    pendingScreens: current.pending,
  };
}

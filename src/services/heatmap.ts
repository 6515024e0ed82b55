import type { Viewer } from '../auth/viewer';
import type { Heatmap } from '../contracts/leaderboard';
import type { Database } from '../db/client';
import { listSetTemperatures, listWellFits } from '../db/repositories/analyses';
import { lawOfOrder } from '../kinetics';
import { heatmapCells, type HeatmapWell } from '../screening/heatmap';
import { requireCampaign, summariseCampaign } from './campaigns';
import { loadCurrentAnalyses, loadCurrentResults } from './currentAnalyses';
import { readCatalystAnalysis, readSeriesAnalysis } from './storedResults';

/** Wells of one analysis by catalyst, each with the temperature its plate was set to. */
async function wellsByCatalyst(
  db: Database,
  groupId: string,
  analysisId: string,
): Promise<Map<string, HeatmapWell[]>> {
  const [fits, temperatures] = await Promise.all([
    listWellFits(db, groupId, analysisId),
    listSetTemperatures(db, groupId, analysisId),
  ]);
  const wells = new Map<string, HeatmapWell[]>();
  for (const fit of fits) {
    const analysis = readSeriesAnalysis(fit.result);
    const setTemperatureK = temperatures.get(fit.wellId) ?? analysis.temperatureK;
    if (fit.catalystId === null) continue;
    const own = wells.get(fit.catalystId) ?? [];
    own.push({ setTemperatureK, analysis });
    wells.set(fit.catalystId, own);
  }
  return wells;
}

/**
 * Catalyst against temperature, each catalyst from its current analysis.
 *
 * @throws Problem 404 when the viewer is not in the campaign's group.
 */
export async function viewHeatmap(
  db: Database,
  viewer: Viewer,
  campaignId: string,
): Promise<Heatmap> {
  const campaign = await requireCampaign(db, viewer, campaignId);
  const { groupId } = campaign;
  const current = await loadCurrentAnalyses(db, groupId, campaignId);
  const results = [...(await loadCurrentResults(db, groupId, current)).values()];
  const wellsOf = new Map<string, Map<string, HeatmapWell[]>>();
  for (const { analysis } of current.finished) {
    wellsOf.set(analysis.id, await wellsByCatalyst(db, groupId, analysis.id));
  }
  const rows = results.map(({ row }) => ({
    row,
    result: readCatalystAnalysis(row.result),
    wells: wellsOf.get(row.analysisId)?.get(row.catalystId) ?? [],
  }));
  const temperaturesK = [
    ...new Set(rows.flatMap(({ wells }) => wells.map((well) => well.setTemperatureK))),
  ].sort((a, b) => a - b);
  return {
    campaign: summariseCampaign(campaign),
    temperaturesK,
    rows: rows
      .map(({ row, result, wells }) => {
        const law = result.order === null ? null : lawOfOrder(result.order);
        return {
          catalystId: row.catalystId,
          code: row.code,
          verdict: result.verdict,
          law,
          cells: heatmapCells(
            wells,
            temperaturesK,
            law,
            result.kUnit,
            campaign.referenceLoadingGPerL,
          ),
        };
      })
      .sort((a, b) => a.code.localeCompare(b.code, 'en', { numeric: true })),
  };
}

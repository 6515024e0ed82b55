import { can } from '../auth/permissions';
import { membershipIn, type Viewer } from '../auth/viewer';
import type { CandidateView, CandidateWell, CatalystCard } from '../contracts/candidate';
import type { Database } from '../db/client';
import { listAnalyses, listWellFits } from '../db/repositories/analyses';
import { listTags } from '../db/repositories/candidates';
import { findCampaign, type CatalystRow } from '../db/repositories/campaigns';
import { listWells, type WellWithNames } from '../db/repositories/screens';
import { problems } from '../errors';
import {
  explainCatalyst,
  explainProposal,
  explainSeries,
  explainWarning,
  proposals,
} from '../kinetics';
import type { CatalystAnalysis, SeriesAnalysis } from '../kinetics/types';
import { drawnArrhenius, drawnCurves } from '../screening/drawing';
import { summariseCampaign } from './campaigns';
import { loadDecision, requireCatalyst } from './candidates';
import { loadCurrentAnalyses, loadCurrentResults, type CurrentResult } from './currentAnalyses';
import { unpackFloats, unpackIntegers } from './readingsCodec';
import { readCatalystAnalysis, readSeriesAnalysis } from './storedResults';

const inWords = (codes: SeriesAnalysis['warnings']) =>
  codes.map((code) => ({ code, sentence: explainWarning(code) }));

function cardOf(row: CatalystRow): CatalystCard {
  return {
    id: row.id,
    code: row.code,
    composition: row.composition,
    support: row.support,
    metalLoadingPercent: row.metalLoadingPercent,
    lot: row.lot,
    siteDensityMolPerKg: row.siteDensityMolPerKg,
    surfaceAreaM2PerG: row.surfaceAreaM2PerG,
    particleSizeUm: row.particleSizeUm,
    hazards: row.hazards,
  };
}

function wellView({ well, plateName }: WellWithNames, analysis: SeriesAnalysis): CandidateWell {
  const timesS = unpackFloats(well.timesS).map((time) => time ?? 0);
  const values = unpackFloats(well.readings);
  return {
    wellId: well.id,
    plate: plateName,
    position: well.position,
    role: well.role,
    temperatureK: well.temperatureK,
    replicate: well.replicate,
    massG: well.massG,
    volumeL: well.volumeL,
    timesS,
    values,
    source: {
      sheet: well.readingSheet,
      column: well.readingColumn,
      rows: unpackIntegers(well.readingRows),
    },
    analysis,
    curves: drawnCurves(analysis, timesS, values),
    warnings: inWords(analysis.warnings),
    explanation: explainSeries(analysis),
  };
}

async function loadWells(
  db: Database,
  groupId: string,
  { row }: CurrentResult,
): Promise<CandidateWell[]> {
  const [wells, fits] = await Promise.all([
    listWells(db, groupId, row.screenId, row.catalystId),
    listWellFits(db, groupId, row.analysisId, row.catalystId),
  ]);
  const fitOf = new Map(fits.map((fit) => [fit.wellId, fit.result]));
  return wells.flatMap((well) => {
    const fit = fitOf.get(well.well.id);
    return fit ? [wellView(well, readSeriesAnalysis(fit))] : [];
  });
}

/** What to run next, planned on the readings that count. */
function nextRuns(result: CatalystAnalysis, wells: readonly CandidateWell[]) {
  const planned = wells.map(({ analysis, timesS, values }) => ({
    analysis,
    timesS: timesS.filter((_, index) => values[index] !== null).sort((a, b) => a - b),
  }));
  return proposals(result, planned).map((proposal) => ({
    code: proposal.code,
    sentence: explainProposal(proposal),
  }));
}

/** The candidates before and after this one, by code. */
function neighbours(results: CurrentResult[], catalystId: string) {
  const ordered = results
    .map(({ row }) => ({ id: row.catalystId, code: row.code }))
    .sort((a, b) => a.code.localeCompare(b.code, 'en', { numeric: true }));
  const place = ordered.findIndex((one) => one.id === catalystId);
  return { previous: ordered[place - 1] ?? null, next: ordered[place + 1] ?? null };
}

/**
 * Everything about one candidate: its wells with readings and fits, its activation energy, its
 * decisions.
 *
 * @throws Problem 404 when the viewer is not in its group, or no finished analysis holds it.
 */
export async function viewCandidate(
  db: Database,
  viewer: Viewer,
  catalystId: string,
): Promise<CandidateView> {
  const catalyst = await requireCatalyst(db, viewer, catalystId);
  const { groupId, campaignId } = catalyst;
  const role = membershipIn(viewer, groupId)?.role;
  const campaign = await findCampaign(db, [groupId], campaignId);
  const current = await loadCurrentAnalyses(db, groupId, campaignId);
  const results = await loadCurrentResults(db, groupId, current);
  const own = results.get(catalystId);
  const screen = current.screens.find((row) => row.screen.id === own?.row.screenId);
  if (!campaign || !own || !screen || !role) throw problems.notFound();

  const result = readCatalystAnalysis(own.row.result);
  const [wells, analyses, decision, tags] = await Promise.all([
    loadWells(db, groupId, own),
    listAnalyses(db, groupId, [own.row.screenId]),
    loadDecision(db, groupId, catalystId),
    listTags(db, groupId, [catalystId]),
  ]);
  const run = analyses.find((one) => one.analysis.id === own.row.analysisId);
  return {
    campaign: summariseCampaign(campaign),
    catalyst: cardOf(catalyst),
    screen: { id: own.row.screenId, name: own.row.screenName, fileName: screen.screen.fileName },
    analysis: {
      id: own.row.analysisId,
      engine: run?.analysis.engine ?? '',
      finishedAt: run?.analysis.finishedAt?.toISOString() ?? '',
      requestedBy: run?.requestedByName ?? '',
    },
    result,
    warnings: inWords(result.warnings),
    explanation: explainCatalyst(result),
    proposals: nextRuns(result, wells),
    wells,
    arrhenius: drawnArrhenius(result),
    decision,
    tags: tags.get(catalystId) ?? [],
    ...neighbours([...results.values()], catalystId),
    may: { tag: can(role, 'tag'), nominate: can(role, 'nominate'), decide: can(role, 'decide') },
  };
}

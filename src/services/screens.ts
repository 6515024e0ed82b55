import { can } from '../auth/permissions';
import { groupIdsOf, membershipIn, type Viewer } from '../auth/viewer';
import type { AnalysisSummary, ScreenSummary, ScreenView } from '../contracts/screens';
import type { Database, Executor } from '../db/client';
import { listAnalyses, listWellVerdicts, type AnalysisListRow } from '../db/repositories/analyses';
import {
  countPlates,
  findOriginal,
  findScreen,
  listScreens,
  listWells,
  type ScreenListRow,
} from '../db/repositories/screens';
import { problems } from '../errors';
import type { WorkbookIssue } from '../workbooks/types';

export function summariseAnalysis({ analysis, requestedByName }: AnalysisListRow): AnalysisSummary {
  return {
    id: analysis.id,
    screenId: analysis.screenId,
    status: analysis.status,
    done: analysis.done,
    total: analysis.total,
    engine: analysis.engine,
    requestedBy: requestedByName,
    requestedAt: analysis.requestedAt.toISOString(),
    finishedAt: analysis.finishedAt?.toISOString() ?? null,
    failure: analysis.failure,
  };
}

function summariseScreen(
  { screen, uploadedByName }: ScreenListRow,
  plates: number,
  latest: AnalysisListRow | undefined,
): ScreenSummary {
  return {
    id: screen.id,
    campaignId: screen.campaignId,
    name: screen.name,
    fileName: screen.fileName,
    sha256: screen.sha256,
    size: screen.size,
    plates,
    wells: screen.wellCount,
    readings: screen.readingCount,
    uploadedBy: uploadedByName,
    uploadedAt: screen.uploadedAt.toISOString(),
    latestAnalysis: latest ? summariseAnalysis(latest) : null,
  };
}

async function withCounts(
  db: Executor,
  groupId: string,
  rows: ScreenListRow[],
): Promise<ScreenSummary[]> {
  const ids = rows.map((row) => row.screen.id);
  const [plates, analyses] = await Promise.all([
    countPlates(db, groupId, ids),
    listAnalyses(db, groupId, ids),
  ]);
  return rows.map((row) =>
    summariseScreen(
      row,
      plates.get(row.screen.id) ?? 0,
      analyses.find((one) => one.analysis.screenId === row.screen.id),
    ),
  );
}

/** A campaign's screens, newest first. */
export async function listScreenSummaries(
  db: Database,
  groupId: string,
  campaignId: string,
): Promise<ScreenSummary[]> {
  return withCounts(db, groupId, await listScreens(db, groupId, campaignId));
}

/** @throws Problem 404 when the group has no such screen. */
export async function loadScreenSummary(
  db: Executor,
  groupId: string,
  screenId: string,
): Promise<ScreenSummary> {
  const row = await findScreen(db, [groupId], screenId);
  const [summary] = row ? await withCounts(db, groupId, [row]) : [];
  if (!summary) throw problems.notFound();
  return summary;
}

/** The row of a screen that the viewer may see. @throws Problem 404 otherwise. */
export async function requireScreen(db: Executor, viewer: Viewer, screenId: string) {
  const row = await findScreen(db, groupIdsOf(viewer), screenId);
  if (!row) throw problems.notFound();
  return row.screen;
}

/** What the screen page shows: the upload, its cautions, its analyses, and each well's verdict. */
export async function viewScreen(
  db: Database,
  viewer: Viewer,
  screenId: string,
): Promise<ScreenView> {
  const screen = await requireScreen(db, viewer, screenId);
  const groupId = screen.groupId;
  const [summary, analyses, wells] = await Promise.all([
    loadScreenSummary(db, groupId, screenId),
    listAnalyses(db, groupId, [screenId]),
    listWells(db, groupId, screenId),
  ]);
  const finished = analyses.find((one) => one.analysis.status === 'done');
  const verdicts = finished
    ? await listWellVerdicts(db, groupId, finished.analysis.id)
    : new Map<string, { verdict: string; conversion: number | null }>();
  const role = membershipIn(viewer, groupId)?.role;
  return {
    screen: summary,
    cautions: JSON.parse(screen.cautions) as WorkbookIssue[],
    analyses: analyses.map(summariseAnalysis),
    wells: wells.map(({ well, plateName, catalystCode }) => ({
      wellId: well.id,
      plate: plateName,
      position: well.position,
      catalyst: catalystCode,
      // Bare supports have a card too, but no page: only these are candidates.
      catalystId: well.role === 'sample' || well.role === 'benchmark' ? well.catalystId : null,
      role: well.role,
      temperatureK: well.measuredTemperatureK ?? well.temperatureK,
      readings: well.readingCount,
      verdict: verdicts.get(well.id)?.verdict ?? null,
      conversion: verdicts.get(well.id)?.conversion ?? null,
    })),
    may: { analyse: role !== undefined && can(role, 'analyse') },
  };
}

/** The uploaded file, byte for byte. */
export async function downloadOriginal(
  db: Database,
  viewer: Viewer,
  screenId: string,
): Promise<{ fileName: string; bytes: Buffer }> {
  const screen = await requireScreen(db, viewer, screenId);
  const bytes = await findOriginal(db, screen.groupId, screenId);
  if (!bytes) throw problems.notFound();
  return { fileName: screen.fileName, bytes };
}

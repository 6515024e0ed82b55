import type { Database } from '../db/client';
import {
  listAnalyses,
  listCatalystResults,
  type AnalysisListRow,
  type CatalystResultRow,
} from '../db/repositories/analyses';
import { listScreens, type ScreenListRow } from '../db/repositories/screens';

/** A campaign's screens with the newest finished analysis of each. */
export interface CurrentAnalyses {
  screens: ScreenListRow[];
  finished: AnalysisListRow[];
  /** Screens without a finished analysis, with the run under way if there is one. */
  pending: { id: string; name: string; analysisId: string | null }[];
}

export async function loadCurrentAnalyses(
  db: Database,
  groupId: string,
  campaignId: string,
): Promise<CurrentAnalyses> {
  const screens = await listScreens(db, groupId, campaignId);
  const analyses = await listAnalyses(
    db,
    groupId,
    screens.map((row) => row.screen.id),
  );
  const finished: AnalysisListRow[] = [];
  const pending: CurrentAnalyses['pending'] = [];
  for (const { screen } of screens) {
    const own = analyses.filter((row) => row.analysis.screenId === screen.id);
    const done = own.find((row) => row.analysis.status === 'done');
    if (done) finished.push(done);
    else
      pending.push({ id: screen.id, name: screen.name, analysisId: own[0]?.analysis.id ?? null });
  }
  return { screens, finished, pending };
}

/** A catalyst's result in the newest screen that holds it, and how many older ones do too. */
export interface CurrentResult {
  row: CatalystResultRow;
  otherScreens: number;
}

/** Results by catalyst id; where several screens hold a catalyst the newest upload counts. */
export async function loadCurrentResults(
  db: Database,
  groupId: string,
  current: CurrentAnalyses,
): Promise<Map<string, CurrentResult>> {
  const rows = await listCatalystResults(
    db,
    groupId,
    current.finished.map((row) => row.analysis.id),
  );
  const ageOf = new Map(current.screens.map((row, index) => [row.screen.id, index]));
  const newestFirst = rows.sort(
    (a, b) => (ageOf.get(a.screenId) ?? 0) - (ageOf.get(b.screenId) ?? 0),
  );
  const results = new Map<string, CurrentResult>();
  for (const row of newestFirst) {
    const known = results.get(row.catalystId);
    if (known) known.otherScreens += 1;
    else results.set(row.catalystId, { row, otherScreens: 0 });
  }
  return results;
}

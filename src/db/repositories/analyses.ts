import { and, asc, desc, eq, inArray, sql } from 'drizzle-orm';
import type { Executor } from '../client';
import { analyses, catalystResults, catalysts, screens, users, wellFits, wells } from '../schema';

export type AnalysisRow = typeof analyses.$inferSelect;
export interface AnalysisListRow {
  analysis: AnalysisRow;
  requestedByName: string;
}
export type WellFitInsert = typeof wellFits.$inferInsert;
export type CatalystResultInsert = typeof catalystResults.$inferInsert;

const withRequester = { analysis: analyses, requestedByName: users.name };

export async function insertAnalysis(
  db: Executor,
  row: typeof analyses.$inferInsert,
): Promise<void> {
  await db.insert(analyses).values(row);
}

/** The analysis, if it belongs to one of `groupIds`. */
export async function findAnalysis(
  db: Executor,
  groupIds: string[],
  analysisId: string,
): Promise<AnalysisListRow | null> {
  if (groupIds.length === 0) return null;
  const [row] = await db
    .select(withRequester)
    .from(analyses)
    .innerJoin(users, eq(users.id, analyses.requestedBy))
    .where(and(inArray(analyses.groupId, groupIds), eq(analyses.id, analysisId)))
    .limit(1);
  return row ?? null;
}

/** Newest first. */
export async function listAnalyses(
  db: Executor,
  groupId: string,
  screenIds: string[],
): Promise<AnalysisListRow[]> {
  if (screenIds.length === 0) return [];
  return db
    .select(withRequester)
    .from(analyses)
    .innerJoin(users, eq(users.id, analyses.requestedBy))
    .where(and(eq(analyses.groupId, groupId), inArray(analyses.screenId, screenIds)))
    .orderBy(desc(analyses.requestedAt), desc(analyses.id));
}

/** Runs that were queued or running when the server stopped, oldest first. */
export async function listUnfinishedAnalyses(db: Executor): Promise<AnalysisRow[]> {
  return db
    .select()
    .from(analyses)
    .where(inArray(analyses.status, ['queued', 'running']))
    .orderBy(asc(analyses.requestedAt));
}

export async function updateAnalysis(
  db: Executor,
  groupId: string,
  analysisId: string,
  change: Partial<Pick<AnalysisRow, 'status' | 'done' | 'finishedAt' | 'failure'>>,
): Promise<void> {
  await db
    .update(analyses)
    .set(change)
    .where(and(eq(analyses.groupId, groupId), eq(analyses.id, analysisId)));
}

export async function insertWellFits(db: Executor, rows: WellFitInsert[]): Promise<void> {
  for (let from = 0; from < rows.length; from += 400) {
    await db.insert(wellFits).values(rows.slice(from, from + 400));
  }
}

export async function insertCatalystResults(
  db: Executor,
  rows: CatalystResultInsert[],
): Promise<void> {
  for (let from = 0; from < rows.length; from += 400) {
    await db.insert(catalystResults).values(rows.slice(from, from + 400));
  }
}

export async function listWellFits(
  db: Executor,
  groupId: string,
  analysisId: string,
  catalystId?: string,
): Promise<{ wellId: string; catalystId: string | null; result: string }[]> {
  return db
    .select({ wellId: wellFits.wellId, catalystId: wells.catalystId, result: wellFits.result })
    .from(wellFits)
    .innerJoin(wells, eq(wells.id, wellFits.wellId))
    .where(
      and(
        eq(wellFits.groupId, groupId),
        eq(wellFits.analysisId, analysisId),
        catalystId === undefined ? undefined : eq(wells.catalystId, catalystId),
      ),
    )
    .orderBy(asc(wells.ordinal));
}

/** Verdict and conversion of each well, without the whole fit. */
export async function listWellVerdicts(
  db: Executor,
  groupId: string,
  analysisId: string,
): Promise<Map<string, { verdict: string; conversion: number | null }>> {
  const rows = await db
    .select({
      wellId: wellFits.wellId,
      verdict: wellFits.verdict,
      conversion: sql<string | null>`json_value(${wellFits.result}, '$.conversion')`,
    })
    .from(wellFits)
    .where(and(eq(wellFits.groupId, groupId), eq(wellFits.analysisId, analysisId)));
  return new Map(
    rows.map((row) => [
      row.wellId,
      { verdict: row.verdict, conversion: row.conversion === null ? null : Number(row.conversion) },
    ]),
  );
}

export interface CatalystResultRow {
  catalystId: string;
  code: string;
  composition: string | null;
  support: string | null;
  analysisId: string;
  screenId: string;
  screenName: string;
  result: string;
  sparkline: string;
}

/** The catalysts' results of several analyses, with the names a leaderboard shows. */
export async function listCatalystResults(
  db: Executor,
  groupId: string,
  analysisIds: string[],
): Promise<CatalystResultRow[]> {
  if (analysisIds.length === 0) return [];
  return db
    .select({
      catalystId: catalysts.id,
      code: catalysts.code,
      composition: catalysts.composition,
      support: catalysts.support,
      analysisId: catalystResults.analysisId,
      screenId: screens.id,
      screenName: screens.name,
      result: catalystResults.result,
      sparkline: catalystResults.sparkline,
    })
    .from(catalystResults)
    .innerJoin(catalysts, eq(catalysts.id, catalystResults.catalystId))
    .innerJoin(analyses, eq(analyses.id, catalystResults.analysisId))
    .innerJoin(screens, eq(screens.id, analyses.screenId))
    .where(
      and(eq(catalystResults.groupId, groupId), inArray(catalystResults.analysisId, analysisIds)),
    )
    .orderBy(asc(catalysts.code));
}

/** The temperature that each analysed well's plate was set to, K, by well id. */
export async function listSetTemperatures(
  db: Executor,
  groupId: string,
  analysisId: string,
): Promise<Map<string, number>> {
  const rows = await db
    .select({ wellId: wells.id, temperatureK: wells.temperatureK })
    .from(wells)
    .innerJoin(wellFits, eq(wellFits.wellId, wells.id))
    .where(and(eq(wellFits.groupId, groupId), eq(wellFits.analysisId, analysisId)));
  return new Map(rows.map((row) => [row.wellId, row.temperatureK]));
}

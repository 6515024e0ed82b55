import { and, asc, count, desc, eq, inArray } from 'drizzle-orm';
import type { Executor } from '../client';
import { campaigns, catalysts, originals, plates, screens, users, wells } from '../schema';

export type ScreenRow = typeof screens.$inferSelect;
export type WellRow = typeof wells.$inferSelect;
export type WellInsert = typeof wells.$inferInsert;

export interface ScreenListRow {
  screen: ScreenRow;
  uploadedByName: string;
}

/** A well with the names of its plate and catalyst. */
export interface WellWithNames {
  well: WellRow;
  plateName: string;
  catalystCode: string | null;
  siteDensityMolPerKg: number | null;
}

const screenWithUploader = { screen: screens, uploadedByName: users.name };

export async function listScreens(
  db: Executor,
  groupId: string,
  campaignId: string,
): Promise<ScreenListRow[]> {
  return db
    .select(screenWithUploader)
    .from(screens)
    .innerJoin(users, eq(users.id, screens.uploadedBy))
    .where(and(eq(screens.groupId, groupId), eq(screens.campaignId, campaignId)))
    .orderBy(desc(screens.uploadedAt), asc(screens.name));
}

/** The screen, if it belongs to one of `groupIds`. */
export async function findScreen(
  db: Executor,
  groupIds: string[],
  screenId: string,
): Promise<ScreenListRow | null> {
  if (groupIds.length === 0) return null;
  const [row] = await db
    .select(screenWithUploader)
    .from(screens)
    .innerJoin(users, eq(users.id, screens.uploadedBy))
    .where(and(inArray(screens.groupId, groupIds), eq(screens.id, screenId)))
    .limit(1);
  return row ?? null;
}

export async function findScreenBySha256(
  db: Executor,
  groupId: string,
  campaignId: string,
  sha256: string,
): Promise<ScreenListRow | null> {
  const [row] = await db
    .select(screenWithUploader)
    .from(screens)
    .innerJoin(users, eq(users.id, screens.uploadedBy))
    .where(
      and(
        eq(screens.groupId, groupId),
        eq(screens.campaignId, campaignId),
        eq(screens.sha256, sha256),
      ),
    )
    .limit(1);
  return row ?? null;
}

/**
 * Holds the campaign's row until the transaction ends, so that two imports into one campaign take
 * turns.
 */
export async function lockCampaign(
  db: Executor,
  groupId: string,
  campaignId: string,
): Promise<void> {
  await db
    .select({ id: campaigns.id })
    .from(campaigns)
    .where(and(eq(campaigns.groupId, groupId), eq(campaigns.id, campaignId)))
    .for('update');
}

export async function insertScreen(
  db: Executor,
  screen: typeof screens.$inferInsert,
  original: Buffer,
): Promise<void> {
  await db.insert(screens).values(screen);
  await db
    .insert(originals)
    .values({ screenId: screen.id, groupId: screen.groupId, bytes: original });
}

export async function insertPlates(
  db: Executor,
  rows: (typeof plates.$inferInsert)[],
): Promise<void> {
  if (rows.length > 0) await db.insert(plates).values(rows);
}

/** Inserts wells some hundred at a time, to stay under the server's packet limit. */
export async function insertWells(db: Executor, rows: WellInsert[]): Promise<void> {
  for (let from = 0; from < rows.length; from += 200) {
    await db.insert(wells).values(rows.slice(from, from + 200));
  }
}

export async function findOriginal(
  db: Executor,
  groupId: string,
  screenId: string,
): Promise<Buffer | null> {
  const [row] = await db
    .select({ bytes: originals.bytes })
    .from(originals)
    .where(and(eq(originals.groupId, groupId), eq(originals.screenId, screenId)))
    .limit(1);
  return row?.bytes ?? null;
}

export async function countPlates(
  db: Executor,
  groupId: string,
  screenIds: string[],
): Promise<Map<string, number>> {
  if (screenIds.length === 0) return new Map();
  const rows = await db
    .select({ screenId: plates.screenId, plates: count() })
    .from(plates)
    .where(and(eq(plates.groupId, groupId), inArray(plates.screenId, screenIds)))
    .groupBy(plates.screenId);
  return new Map(rows.map((row) => [row.screenId, row.plates]));
}

/** All wells of a screen in the file's order; with a catalyst, only its wells. */
export async function listWells(
  db: Executor,
  groupId: string,
  screenId: string,
  catalystId?: string,
): Promise<WellWithNames[]> {
  return db
    .select({
      well: wells,
      plateName: plates.name,
      catalystCode: catalysts.code,
      siteDensityMolPerKg: catalysts.siteDensityMolPerKg,
    })
    .from(wells)
    .innerJoin(plates, eq(plates.id, wells.plateId))
    .leftJoin(catalysts, eq(catalysts.id, wells.catalystId))
    .where(
      and(
        eq(wells.groupId, groupId),
        eq(wells.screenId, screenId),
        catalystId === undefined ? undefined : eq(wells.catalystId, catalystId),
      ),
    )
    .orderBy(asc(wells.ordinal));
}

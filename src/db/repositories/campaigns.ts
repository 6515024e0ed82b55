import { and, asc, eq, inArray } from 'drizzle-orm';
import type { Executor } from '../client';
import { campaigns, catalysts } from '../schema';

export type CampaignRow = typeof campaigns.$inferSelect;
export type CatalystRow = typeof catalysts.$inferSelect;

export async function listCampaigns(db: Executor, groupId: string): Promise<CampaignRow[]> {
  return db
    .select()
    .from(campaigns)
    .where(eq(campaigns.groupId, groupId))
    .orderBy(asc(campaigns.createdAt), asc(campaigns.name));
}

/** The campaign, if it belongs to one of `groupIds`. */
export async function findCampaign(
  db: Executor,
  groupIds: string[],
  campaignId: string,
): Promise<CampaignRow | null> {
  if (groupIds.length === 0) return null;
  const [row] = await db
    .select()
    .from(campaigns)
    .where(and(inArray(campaigns.groupId, groupIds), eq(campaigns.id, campaignId)))
    .limit(1);
  return row ?? null;
}

export async function insertCampaign(
  db: Executor,
  row: typeof campaigns.$inferInsert,
): Promise<void> {
  await db.insert(campaigns).values(row);
}

export async function listCatalysts(
  db: Executor,
  groupId: string,
  campaignId: string,
): Promise<CatalystRow[]> {
  return db
    .select()
    .from(catalysts)
    .where(and(eq(catalysts.groupId, groupId), eq(catalysts.campaignId, campaignId)))
    .orderBy(asc(catalysts.code));
}

/** The catalyst, if it belongs to one of `groupIds`. */
export async function findCatalyst(
  db: Executor,
  groupIds: string[],
  catalystId: string,
): Promise<CatalystRow | null> {
  if (groupIds.length === 0) return null;
  const [row] = await db
    .select()
    .from(catalysts)
    .where(and(inArray(catalysts.groupId, groupIds), eq(catalysts.id, catalystId)))
    .limit(1);
  return row ?? null;
}

export async function insertCatalysts(
  db: Executor,
  rows: (typeof catalysts.$inferInsert)[],
): Promise<void> {
  if (rows.length > 0) await db.insert(catalysts).values(rows);
}

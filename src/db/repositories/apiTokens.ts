import { and, eq, gt, isNull } from 'drizzle-orm';
import type { Executor } from '../client';
import { apiTokens } from '../schema';

export interface LiveToken {
  id: string;
  groupId: string;
  userId: string;
  lastUsedAt: Date | null;
}

export async function insertApiToken(
  db: Executor,
  row: typeof apiTokens.$inferInsert,
): Promise<void> {
  await db.insert(apiTokens).values(row);
}

/** The token with this SHA-256, unless it was revoked or has run out. */
export async function findLiveToken(
  db: Executor,
  tokenSha256: string,
  now: Date,
): Promise<LiveToken | null> {
  const [row] = await db
    .select({
      id: apiTokens.id,
      groupId: apiTokens.groupId,
      userId: apiTokens.userId,
      lastUsedAt: apiTokens.lastUsedAt,
    })
    .from(apiTokens)
    .where(
      and(
        eq(apiTokens.tokenSha256, tokenSha256),
        isNull(apiTokens.revokedAt),
        gt(apiTokens.expiresAt, now),
      ),
    )
    .limit(1);
  return row ?? null;
}

export async function touchApiToken(db: Executor, id: string, now: Date): Promise<void> {
  await db.update(apiTokens).set({ lastUsedAt: now }).where(eq(apiTokens.id, id));
}

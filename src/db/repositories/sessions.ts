import { and, eq, gt, lt } from 'drizzle-orm';
import type { Executor } from '../client';
import { sessions } from '../schema';

export interface LiveSession {
  id: string;
  userId: string;
  lastSeenAt: Date;
}

export async function insertSession(
  db: Executor,
  row: typeof sessions.$inferInsert,
): Promise<void> {
  await db.insert(sessions).values(row);
}

/** The session, if it has neither ended nor lain idle since `idleSince`. */
export async function findLiveSession(
  db: Executor,
  id: string,
  now: Date,
  idleSince: Date,
): Promise<LiveSession | null> {
  const [row] = await db
    .select({ id: sessions.id, userId: sessions.userId, lastSeenAt: sessions.lastSeenAt })
    .from(sessions)
    .where(
      and(eq(sessions.id, id), gt(sessions.expiresAt, now), gt(sessions.lastSeenAt, idleSince)),
    )
    .limit(1);
  return row ?? null;
}

export async function touchSession(db: Executor, id: string, now: Date): Promise<void> {
  await db.update(sessions).set({ lastSeenAt: now }).where(eq(sessions.id, id));
}

export async function deleteSession(db: Executor, id: string): Promise<void> {
  await db.delete(sessions).where(eq(sessions.id, id));
}

export async function deleteEndedSessions(db: Executor, now: Date): Promise<void> {
  await db.delete(sessions).where(lt(sessions.expiresAt, now));
}

import { and, count, eq, gt, lt } from 'drizzle-orm';
import type { Executor } from '../client';
import { signInFailures } from '../schema';

export async function countFailures(db: Executor, subject: string, since: Date): Promise<number> {
  const [row] = await db
    .select({ failures: count() })
    .from(signInFailures)
    .where(and(eq(signInFailures.subject, subject), gt(signInFailures.failedAt, since)));
  return row?.failures ?? 0;
}

export async function insertFailures(db: Executor, subjects: string[], at: Date): Promise<void> {
  await db.insert(signInFailures).values(subjects.map((subject) => ({ subject, failedAt: at })));
}

export async function deleteFailuresBefore(db: Executor, before: Date): Promise<void> {
  await db.delete(signInFailures).where(lt(signInFailures.failedAt, before));
}

export async function clearFailures(db: Executor, subject: string): Promise<void> {
  await db.delete(signInFailures).where(eq(signInFailures.subject, subject));
}

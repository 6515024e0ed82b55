import { randomUUID } from 'node:crypto';
import type { Executor } from '../client';
import { auditEvents } from '../schema';

export interface AuditEntry {
  groupId: string;
  userId: string;
  /** Dotted, such as `screen.import`. */
  action: string;
  objectId: string;
  detail: Record<string, unknown>;
  at: Date;
}

/** Writes what was done; called in the transaction that does it. */
export async function insertAuditEvent(db: Executor, entry: AuditEntry): Promise<void> {
  await db
    .insert(auditEvents)
    .values({ ...entry, id: randomUUID(), detail: JSON.stringify(entry.detail).slice(0, 4000) });
}

import { and, eq } from 'drizzle-orm';
import type { Role } from '../../auth/roles';
import type { Executor } from '../client';
import { groups, memberships, users } from '../schema';

export type UserRow = typeof users.$inferSelect;

export interface MembershipRow {
  groupId: string;
  groupName: string;
  role: Role;
}

export async function findUserByEmail(db: Executor, email: string): Promise<UserRow | null> {
  const [row] = await db.select().from(users).where(eq(users.email, email)).limit(1);
  return row ?? null;
}

export async function findUser(db: Executor, userId: string): Promise<UserRow | null> {
  const [row] = await db.select().from(users).where(eq(users.id, userId)).limit(1);
  return row ?? null;
}

/** The groups a person is in, by name, with the role held there at this moment. */
export async function listMemberships(db: Executor, userId: string): Promise<MembershipRow[]> {
  return db
    .select({ groupId: groups.id, groupName: groups.name, role: memberships.role })
    .from(memberships)
    .innerJoin(groups, eq(groups.id, memberships.groupId))
    .where(eq(memberships.userId, userId))
    .orderBy(groups.name);
}

export async function insertUser(db: Executor, row: typeof users.$inferInsert): Promise<void> {
  await db.insert(users).values(row);
}

export async function findGroupByName(db: Executor, name: string): Promise<{ id: string } | null> {
  const [row] = await db
    .select({ id: groups.id })
    .from(groups)
    .where(eq(groups.name, name))
    .limit(1);
  return row ?? null;
}

export async function insertGroup(db: Executor, row: typeof groups.$inferInsert): Promise<void> {
  await db.insert(groups).values(row);
}

export async function insertMembership(
  db: Executor,
  row: typeof memberships.$inferInsert,
): Promise<void> {
  await db.insert(memberships).values(row);
}

export async function updateRole(
  db: Executor,
  groupId: string,
  userId: string,
  role: Role,
): Promise<void> {
  await db
    .update(memberships)
    .set({ role })
    .where(and(eq(memberships.groupId, groupId), eq(memberships.userId, userId)));
}

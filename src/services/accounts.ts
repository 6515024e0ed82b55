import { randomBytes, randomUUID } from 'node:crypto';
import { hashPassword } from '../auth/passwords';
import type { Role } from '../auth/roles';
import { newToken, tokenSha256 } from '../auth/tokens';
import type { Database, Executor } from '../db/client';
import { insertApiToken } from '../db/repositories/apiTokens';
import {
  findGroupByName,
  findUserByEmail,
  insertGroup,
  insertMembership,
  insertUser,
  listMemberships,
} from '../db/repositories/people';

const dayMs = 24 * 60 * 60 * 1000;

/** The group of this name, made when there is none. */
export async function ensureGroup(db: Executor, name: string, now: Date): Promise<string> {
  const known = await findGroupByName(db, name);
  if (known) return known.id;
  const id = randomUUID();
  await insertGroup(db, { id, name, createdAt: now });
  return id;
}

/** Adds a person with a password and a role in one group. @returns the person's id */
export async function addPerson(
  db: Executor,
  person: { email: string; name: string; password: string; groupId: string; role: Role },
  now: Date,
): Promise<string> {
  const id = randomUUID();
  await insertUser(db, {
    id,
    email: person.email.trim().toLowerCase(),
    name: person.name,
    passwordHash: await hashPassword(person.password),
    createdAt: now,
  });
  await insertMembership(db, {
    groupId: person.groupId,
    userId: id,
    role: person.role,
    createdAt: now,
  });
  return id;
}

/**
 * Makes the admin of a group, and the group where there is none.
 *
 * @returns the new password
 * @throws Error when the address is known already
 */
export async function addAdmin(
  db: Database,
  admin: { email: string; name: string; group: string },
  now: Date,
): Promise<string> {
  const email = admin.email.trim().toLowerCase();
  if (await findUserByEmail(db, email)) throw new Error(`${email} can sign in already.`);
  const password = randomBytes(15).toString('base64url');
  await db.transaction(async (tx) => {
    const groupId = await ensureGroup(tx, admin.group, now);
    await addPerson(tx, { ...admin, email, password, groupId, role: 'admin' }, now);
  });
  return password;
}

/**
 * Makes a token for scripts, good for one group.
 *
 * @returns the token; it is not stored and cannot be shown again
 * @throws Error when the person is unknown, or the group is not clear
 */
export async function issueApiToken(
  db: Database,
  request: { email: string; group: string | undefined; name: string; days: number },
  now: Date,
): Promise<string> {
  const user = await findUserByEmail(db, request.email.trim().toLowerCase());
  if (!user) throw new Error(`Nobody signs in as ${request.email}.`);
  const memberships = await listMemberships(db, user.id);
  const fitting = memberships.filter(
    (one) => request.group === undefined || one.groupName === request.group,
  );
  const [membership] = fitting;
  if (!membership || fitting.length > 1) {
    const names = memberships.map((one) => `“${one.groupName}”`).join(', ');
    throw new Error(`Name the group with --group. ${request.email} is in: ${names || 'none'}.`);
  }
  const token = newToken();
  await insertApiToken(db, {
    id: randomUUID(),
    groupId: membership.groupId,
    userId: user.id,
    name: request.name,
    tokenSha256: tokenSha256(token),
    createdAt: now,
    expiresAt: new Date(now.getTime() + request.days * dayMs),
  });
  return token;
}

import { bearerToken, tokenSha256 } from '../auth/tokens';
import type { Viewer } from '../auth/viewer';
import type { Database } from '../db/client';
import { findLiveToken, touchApiToken } from '../db/repositories/apiTokens';
import { findUser, listMemberships } from '../db/repositories/people';
import { problems } from '../errors';

const touchEveryMs = 60_000;

/** The person with their groups and roles as they are now. */
export async function loadViewer(
  db: Database,
  userId: string,
  via: Viewer['via'],
): Promise<Viewer | null> {
  const user = await findUser(db, userId);
  if (!user) return null;
  const memberships = await listMemberships(db, userId);
  return { userId, name: user.name, email: user.email, memberships, via };
}

/**
 * The person behind a Bearer token, seeing only the token's group.
 *
 * @returns null when the request carries no token.
 * @throws Problem 401 when it carries one that is not good.
 */
export async function viewerOfToken(
  db: Database,
  headers: Headers,
  now: Date,
): Promise<Viewer | null> {
  if (!headers.has('authorization')) return null;
  const token = bearerToken(headers);
  const live = token === null ? null : await findLiveToken(db, tokenSha256(token), now);
  const viewer = live && (await loadViewer(db, live.userId, 'token'));
  if (!live || !viewer) throw problems.badToken();
  if (!live.lastUsedAt || now.getTime() - live.lastUsedAt.getTime() > touchEveryMs) {
    await touchApiToken(db, live.id, now);
  }
  const memberships = viewer.memberships.filter((one) => one.groupId === live.groupId);
  if (memberships.length === 0) throw problems.badToken();
  return { ...viewer, memberships };
}

import { createHash, randomUUID } from 'node:crypto';
import { passwordFits } from '../auth/passwords';
import type { Database } from '../db/client';
import { findUserByEmail } from '../db/repositories/people';
import {
  deleteEndedSessions,
  findLiveSession,
  insertSession,
  touchSession,
} from '../db/repositories/sessions';
import {
  clearFailures,
  countFailures,
  deleteFailuresBefore,
  insertFailures,
} from '../db/repositories/signInFailures';

const minuteMs = 60_000;
/** A sign-in ends after this long, whatever is done with it. */
export const sessionMs = 12 * 60 * minuteMs;
/** A sign-in ends after lying idle this long. */
const idleMs = 2 * 60 * minuteMs;
const touchEveryMs = minuteMs;

/** Failed attempts in a quarter of an hour before an account or an address has to wait. */
export const throttle = { windowMs: 15 * minuteMs, perAccount: 5, perAddress: 30 };

export type SignInOutcome =
  | { ok: true; userId: string; name: string; email: string }
  | { ok: false; reason: 'wrong' | 'wait' };

const subjectOf = (kind: 'account' | 'address', value: string) =>
  `${kind}:${createHash('sha256').update(value).digest('hex')}`;

/**
 * Checks an e-mail address and a password. Unknown addresses take as long as wrong passwords, and
 * an account under throttle refuses the right password too.
 */
export async function signIn(
  db: Database,
  credentials: { email: string; password: string; address: string },
  now: Date,
): Promise<SignInOutcome> {
  const email = credentials.email.trim().toLowerCase();
  const account = subjectOf('account', email);
  const address = subjectOf('address', credentials.address);
  const since = new Date(now.getTime() - throttle.windowMs);
  const [byAccount, byAddress] = await Promise.all([
    countFailures(db, account, since),
    countFailures(db, address, since),
  ]);
  if (byAccount >= throttle.perAccount || byAddress >= throttle.perAddress) {
    return { ok: false, reason: 'wait' };
  }
  const user = await findUserByEmail(db, email);
  const fits = await passwordFits(user?.passwordHash ?? null, credentials.password);
  if (!user || !fits) {
    await deleteFailuresBefore(db, since);
    await insertFailures(db, [account, address], now);
    return { ok: false, reason: 'wrong' };
  }
  await clearFailures(db, account);
  return { ok: true, userId: user.id, name: user.name, email: user.email };
}

/** Opens a session row for a person; its id goes into the signed cookie. */
export async function openSession(db: Database, userId: string, now: Date): Promise<string> {
  const id = randomUUID();
  await deleteEndedSessions(db, now);
  await insertSession(db, {
    id,
    userId,
    createdAt: now,
    lastSeenAt: now,
    expiresAt: new Date(now.getTime() + sessionMs),
  });
  return id;
}

/** The person of a session that is still good; null when it was ended, ran out or lay idle. */
export async function userOfSession(
  db: Database,
  sessionId: string,
  now: Date,
): Promise<string | null> {
  const session = await findLiveSession(db, sessionId, now, new Date(now.getTime() - idleMs));
  if (!session) return null;
  if (now.getTime() - session.lastSeenAt.getTime() > touchEveryMs) {
    await touchSession(db, sessionId, now);
  }
  return session.userId;
}

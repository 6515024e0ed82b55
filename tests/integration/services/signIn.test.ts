import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { DatabaseHandle } from '@/db/client';
import { updateRole } from '@/db/repositories/people';
import { deleteSession } from '@/db/repositories/sessions';
import { issueApiToken } from '@/services/accounts';
import { loadViewer, viewerOfToken } from '@/services/identify';
import { openSession, sessionMs, signIn, throttle, userOfSession } from '@/services/signIn';
import type { Services } from '@/services/services';
import { addToGroup, makeGroup, openTestServices, password } from '../../fixtures/groups';

let services: Services;
let database: DatabaseHandle;

beforeAll(() => {
  ({ services, database } = openTestServices());
});
afterAll(() => database.close());

const minute = 60_000;
const bearer = (token: string) => new Headers({ authorization: `Bearer ${token}` });

describe('signing in', () => {
  it('takes the address in any case and the password as it is', async () => {
    const { viewers } = await makeGroup(services);
    const email = viewers.lead.email.toUpperCase();
    const at = (secret: string) =>
      signIn(services.db, { email, password: secret, address: '192.0.2.1' }, new Date());
    expect(await at(password)).toMatchObject({ ok: true, userId: viewers.lead.userId });
    expect(await at(password.toUpperCase())).toEqual({ ok: false, reason: 'wrong' });
  });

  it('makes an account wait after five failures, the right password included', async () => {
    const { viewers } = await makeGroup(services);
    const now = new Date();
    const attempt = (secret: string, at = now) =>
      signIn(
        services.db,
        { email: viewers.viewer.email, password: secret, address: '192.0.2.2' },
        at,
      );
    for (let failed = 0; failed < throttle.perAccount; failed += 1) {
      expect(await attempt('wrong')).toEqual({ ok: false, reason: 'wrong' });
    }
    expect(await attempt(password)).toEqual({ ok: false, reason: 'wait' });
    const later = new Date(now.getTime() + throttle.windowMs + 1000);
    expect(await attempt(password, later)).toMatchObject({ ok: true });
  });

  it('counts failures of one address over many accounts', async () => {
    const now = new Date();
    const attempt = (email: string) =>
      signIn(services.db, { email, password: 'wrong', address: '192.0.2.3' }, now);
    for (let failed = 0; failed < throttle.perAddress; failed += 1) {
      expect(await attempt(`nobody-${failed}@lab.example`)).toEqual({ ok: false, reason: 'wrong' });
    }
    expect(await attempt('somebody@lab.example')).toEqual({ ok: false, reason: 'wait' });
  }, 60_000);
});

describe('a session', () => {
  it('ends when its row is gone, after twelve hours, and after two idle ones', async () => {
    const { viewers } = await makeGroup(services);
    const { userId } = viewers.analyst;
    const start = new Date();
    const after = (ms: number) => new Date(start.getTime() + ms);
    const sid = await openSession(services.db, userId, start);
    expect(await userOfSession(services.db, sid, after(119 * minute))).toBe(userId);
    expect(await userOfSession(services.db, sid, after((119 + 121) * minute))).toBeNull();

    const busy = await openSession(services.db, userId, start);
    for (let time = 0; time < sessionMs; time += 60 * minute) {
      expect(await userOfSession(services.db, busy, after(time + 1))).toBe(userId);
    }
    expect(await userOfSession(services.db, busy, after(sessionMs))).toBeNull();

    const ended = await openSession(services.db, userId, start);
    await deleteSession(services.db, ended);
    expect(await userOfSession(services.db, ended, start)).toBeNull();
  });

  it('shows a demotion at the next request', async () => {
    const { groupId, viewers } = await makeGroup(services);
    const { userId } = viewers.lead;
    await updateRole(services.db, groupId, userId, 'viewer');
    expect((await loadViewer(services.db, userId, 'session'))?.memberships).toMatchObject([
      { groupId, role: 'viewer' },
    ]);
  });
});

describe('a token', () => {
  it('sees its own group only, even where the person is in two', async () => {
    const one = await makeGroup(services);
    const two = await makeGroup(services);
    const { userId, email, memberships } = one.viewers.analyst;
    await addToGroup(services, userId, two.groupId, 'lead');
    const request = { email, group: undefined, name: 'script', days: 1 };
    await expect(issueApiToken(services.db, request, new Date())).rejects.toThrow('--group');
    const group = memberships[0]?.groupName;
    const token = await issueApiToken(services.db, { ...request, group }, new Date());
    const viewer = await viewerOfToken(services.db, bearer(token), new Date());
    expect(viewer?.memberships.map((membership) => membership.groupId)).toEqual([one.groupId]);
    expect(viewer?.via).toBe('token');
  });

  it('is refused when unknown or past its date, and is no matter when there is none', async () => {
    const { viewers } = await makeGroup(services);
    const request = { email: viewers.viewer.email, group: undefined, name: 'script', days: 1 };
    const token = await issueApiToken(services.db, request, new Date());
    const inTwoDays = new Date(Date.now() + 2 * 24 * 60 * minute);
    await expect(viewerOfToken(services.db, bearer(token), inTwoDays)).rejects.toMatchObject({
      status: 401,
    });
    await expect(viewerOfToken(services.db, bearer(`${token}x`), new Date())).rejects.toMatchObject(
      { status: 401 },
    );
    expect(await viewerOfToken(services.db, new Headers(), new Date())).toBeNull();
  });
});

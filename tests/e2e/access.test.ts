import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, describe, expect, it } from 'vitest';
import { callerWith, demoAccount, signInAs, type Caller } from './client';

/** Who calls: nobody, each role of the group that owns the object, and another group's admin. */
const callers = ['anonymous', 'viewer', 'analyst', 'lead', 'admin', 'stranger'] as const;
type CallerName = (typeof callers)[number];

/** One route and method, the body it is called with, and the status for each caller. */
interface Row {
  route: string;
  method: string;
  body?: () => RequestInit;
  expected: Record<CallerName, number>;
}

const jsonBody = (value: unknown) => () => ({
  body: JSON.stringify(value),
  headers: { 'content-type': 'application/json' },
});

/** Everybody of the group may; a stranger finds nothing there. */
const read = (anonymous: number): Row['expected'] => ({
  anonymous,
  viewer: 200,
  analyst: 200,
  lead: 200,
  admin: 200,
  stranger: 404,
});
/** A write: refused below a role, and answered with `allowed` from there on. */
const write = (least: 'analyst' | 'lead', allowed: number): Row['expected'] => ({
  anonymous: 401,
  viewer: 403,
  analyst: least === 'analyst' ? allowed : 403,
  lead: allowed,
  admin: allowed,
  stranger: 404,
});
const everybody = (anonymous: number, status: number): Row['expected'] => ({
  anonymous,
  viewer: status,
  analyst: status,
  lead: status,
  admin: status,
  stranger: status,
});

const page = (route: string): Row => ({ route, method: 'GET', expected: read(302) });
const api = (route: string): Row => ({ route, method: 'GET', expected: read(401) });
const campaign = '/groups/[groupId]/campaigns/[campaignId]';

const uploadForm = () => {
  const body = new FormData();
  body.set('campaignId', ids.campaignId ?? '');
  body.set('file', new File(['not a workbook'], 'screen.xlsx'));
  return { body };
};

const rows: Row[] = [
  // Somebody in one group is sent on to it.
  { route: '/', method: 'GET', expected: everybody(302, 302) },
  { route: '/sign-in', method: 'GET', expected: everybody(200, 302) },
  { route: '/refused', method: 'GET', expected: everybody(404, 404) },
  { route: '/404', method: 'GET', expected: everybody(404, 404) },
  { route: '/500', method: 'GET', expected: everybody(500, 500) },
  page('/groups/[groupId]'),
  page(campaign),
  page(`${campaign}/heatmap`),
  page(`${campaign}/screens`),
  { route: `${campaign}/screens/new`, method: 'GET', expected: { ...read(302), viewer: 403 } },
  page(`${campaign}/screens/[screenId]`),
  page(`${campaign}/candidates/[catalystId]`),
  // A caller's own campaigns: a stranger gets those of the other group.
  { route: '/api/v1/campaigns', method: 'GET', expected: everybody(401, 200) },
  api('/api/v1/campaigns/[campaignId]/leaderboard'),
  api('/api/v1/campaigns/[campaignId]/heatmap'),
  api('/api/v1/campaigns/[campaignId]/screens'),
  api('/api/v1/candidates/[catalystId]'),
  api('/api/v1/screens/[screenId]'),
  api('/api/v1/screens/[screenId]/original'),
  api('/api/v1/screens/[screenId]/analyses'),
  api('/api/v1/analyses/[analysisId]'),
  api('/api/v1/analyses/[analysisId]/events'),
  {
    // It stores nothing and belongs to no group.
    route: '/api/v1/analyse',
    method: 'POST',
    body: jsonBody({ series: [] }),
    expected: everybody(401, 200),
  },
  {
    route: '/api/v1/campaigns',
    method: 'POST',
    body: () =>
      jsonBody({
        groupId: ids.groupId,
        // Taken already, so that a role that may define campaigns is seen without making one.
        name: ids.campaignName,
        reactant: 'nitrite',
        dimension: 'concentration',
        referenceTemperatureC: 60,
        referenceConcentration: 0.01,
        referenceLoadingGPerL: 2.5,
        targetConversion: 0.8,
      })(),
    expected: write('lead', 409),
  },
  {
    route: '/api/v1/screens',
    method: 'POST',
    body: uploadForm,
    expected: write('analyst', 422),
  },
  {
    route: '/api/v1/screens/[screenId]/analyses',
    method: 'POST',
    expected: write('analyst', 202),
  },
  {
    route: '/api/v1/candidates/[catalystId]/tags',
    method: 'PUT',
    body: jsonBody({ tags: [] }),
    expected: write('analyst', 200),
  },
  {
    // A version that never is: whoever may decide is told so.
    route: '/api/v1/candidates/[catalystId]/decisions',
    method: 'POST',
    body: jsonBody({ action: 'wait', reason: 'a test', version: 999 }),
    expected: write('lead', 409),
  },
];

const pagesFolder = join(import.meta.dirname, '../../src/pages');

/** Every route of src/pages with every method that it answers. */
function allRoutes(): string[] {
  return readdirSync(pagesFolder, { recursive: true, encoding: 'utf8' })
    .filter((file) => /\.(ts|astro)$/.test(file))
    .flatMap((file) => {
      const route = `/${file.replace(/\.(ts|astro)$/, '').replace(/(^|\/)index$/, '')}`;
      const path = route === '/' ? route : route.replace(/\/$/, '');
      if (file.endsWith('.astro')) return [`GET ${path}`];
      const source = readFileSync(join(pagesFolder, file), 'utf8');
      return [...source.matchAll(/^export const ([A-Z]+):/gm)].map(
        (match) => `${match[1]} ${path}`,
      );
    });
}

const ids: Record<string, string> = {};
const as = new Map<CallerName, Caller>();

beforeAll(async () => {
  as.set('anonymous', callerWith({}));
  for (const role of ['viewer', 'analyst', 'lead', 'admin'] as const) {
    const { email, password } = demoAccount('Marlbeck', role);
    as.set(role, await signInAs(email, password));
  }
  const stranger = demoAccount('Tarnside', 'admin');
  as.set('stranger', await signInAs(stranger.email, stranger.password));

  const ask = async (path: string): Promise<unknown> =>
    (await as.get('viewer')?.fetch(path))?.json();
  const { campaigns } = (await ask('/api/v1/campaigns')) as {
    campaigns: { id: string; groupId: string; name: string }[];
  };
  const [first] = campaigns;
  ids.groupId = first?.groupId ?? '';
  ids.campaignId = first?.id ?? '';
  ids.campaignName = first?.name ?? '';
  const board = (await ask(`/api/v1/campaigns/${ids.campaignId}/leaderboard`)) as {
    rows: { catalystId: string; screenId: string; analysisId: string }[];
  };
  Object.assign(ids, {
    catalystId: board.rows[0]?.catalystId,
    screenId: board.rows[0]?.screenId,
    analysisId: board.rows[0]?.analysisId,
  });
}, 60_000);

const withIds = (route: string, values: Record<string, string>) =>
  route.replace(/\[(\w+)\]/g, (_whole, name: string) => values[name] ?? '');

const call = (caller: CallerName, row: Row, values = ids) =>
  as.get(caller)?.fetch(withIds(row.route, values), { method: row.method, ...row.body?.() });

describe('who may do what', () => {
  it('is laid down for every route and method there is', () => {
    const laidDown = rows.map((row) => `${row.method} ${row.route}`);
    expect(laidDown.toSorted()).toEqual(allRoutes().toSorted());
  });

  it.each(rows)('$method $route', async (row) => {
    const seen: Record<string, number | undefined> = {};
    for (const caller of callers) {
      const response = await call(caller, row);
      seen[caller] = response?.status;
      await response?.body?.cancel();
    }
    expect(seen).toEqual(row.expected);
  });

  it('answers a stranger to the letter as if the object did not exist', async () => {
    const unknown = Object.fromEntries(
      Object.keys(ids).map((name) => [name, '00000000-0000-4000-8000-000000000000']),
    );
    const plain = (text: string | undefined) => text?.replace(/[0-9a-f]{8}-[0-9a-f-]{27}/g, 'id');
    for (const row of rows.filter((one) => one.expected.stranger === 404)) {
      const theirs = await call('stranger', row);
      const nothing = await call('stranger', row, unknown);
      expect(nothing?.status, row.route).toBe(404);
      expect(plain(await theirs?.text()), row.route).toBe(plain(await nothing?.text()));
    }
  });

  it('refuses a change that another site sends, sign-in and sign-out included', async () => {
    const lead = as.get('lead');
    const foreign = { origin: 'https://elsewhere.example' };
    const targets = [
      ...rows.filter((row) => row.method !== 'GET').map((row) => withIds(row.route, ids)),
      '/api/auth/signout',
      '/api/auth/callback/credentials',
    ];
    for (const path of targets) {
      const response = await lead?.fetch(path, { method: 'POST', headers: foreign, body: '{}' });
      expect(response?.status, path).toBe(403);
    }
  });
});

describe('a session', () => {
  it('is over for good once signed out: the old cookie opens nothing', async () => {
    const { email, password } = demoAccount('Tarnside', 'viewer');
    const caller = await signInAs(email, password);
    expect((await caller.fetch('/api/v1/campaigns')).status).toBe(200);
    await caller.fetch('/api/auth/signout', { method: 'POST', body: new URLSearchParams() });
    expect((await caller.fetch('/api/v1/campaigns')).status).toBe(401);
  });

  it('does not come of a tampered cookie, and that is no server error', async () => {
    const caller = callerWith({ cookie: 'authjs.session-token=eyJhbGciOiJub25lIn0..x.y.z' });
    expect((await caller.fetch('/api/v1/campaigns')).status).toBe(401);
    expect((await caller.fetch('/')).status).toBe(302);
  });
});

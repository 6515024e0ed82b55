import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { DatabaseHandle } from '@/db/client';
import { listCatalysts } from '@/db/repositories/campaigns';
import { analyseScreen } from '@/services/analyseScreen';
import { decideCandidate, loadDecision, tagCandidate } from '@/services/candidates';
import { importScreen } from '@/services/importScreen';
import { viewLeaderboard } from '@/services/leaderboard';
import type { Services } from '@/services/services';
import { makeGroup, openTestServices, smallWorkbook, type TestGroup } from '../../fixtures/groups';

let services: Services;
let database: DatabaseHandle;
let group: TestGroup;
let first: string;
let second: string;

beforeAll(async () => {
  ({ services, database } = openTestServices());
  group = await makeGroup(services);
  const { screen } = await importScreen(services, group.viewers.analyst, {
    campaignId: group.campaignId,
    name: 'A screen',
    fileName: 'screen.csv',
    bytes: smallWorkbook('D'),
  });
  await analyseScreen(services, group.viewers.analyst, screen.id);
  await services.runner.idle();
  const cards = await listCatalysts(services.db, group.groupId, group.campaignId);
  [first, second] = cards.map((card) => card.id) as [string, string];
});
afterAll(() => database.close());

describe('deciding on a candidate', () => {
  it('records who, why and on which analysis, and moves it on', async () => {
    const { analyst, lead } = group.viewers;
    await decideCandidate(services, analyst, first, {
      action: 'nominate',
      reason: 'Fastest at 60 °C',
      version: 0,
    });
    const decided = await decideCandidate(services, lead, first, {
      action: 'take-to-scale-up',
      reason: 'Clear of the rest',
      version: 1,
    });
    expect(decided).toMatchObject({ state: 'scale-up', version: 2 });
    expect(decided.history).toHaveLength(2);
    expect(decided.history[0]).toMatchObject({ by: lead.name, reason: 'Clear of the rest' });
    const board = await viewLeaderboard(services.db, lead, group.campaignId);
    const row = board.rows.find((one) => one.catalystId === first);
    expect(decided.history.map((one) => one.analysisId)).toEqual([
      row?.analysisId,
      row?.analysisId,
    ]);
    expect(row?.decision).toEqual({ state: 'scale-up', version: 2 });
  });

  it('lets one of two deciders through and tells the other who was faster', async () => {
    const { lead, admin } = group.viewers;
    const outcomes = await Promise.allSettled(
      [lead, admin].map((viewer) =>
        decideCandidate(services, viewer, second, {
          action: 'wait',
          reason: `says ${viewer.name}`,
          version: 0,
        }),
      ),
    );
    const lost = outcomes.filter((one) => one.status === 'rejected');
    expect(lost).toHaveLength(1);
    expect(lost[0]?.reason).toMatchObject({ status: 409, code: 'stale-version' });
    const { history, version } = await loadDecision(services.db, group.groupId, second);
    expect(history).toHaveLength(1);
    expect(version).toBe(1);
    expect((lost[0]?.reason as Error).message).toContain(history[0]?.by);
  });

  it('is refused an analyst beyond nominating, and a viewer altogether', async () => {
    const step = { reason: 'because', version: 99 };
    for (const action of ['take-to-scale-up', 'wait', 'set-aside', 'reopen'] as const) {
      await expect(
        decideCandidate(services, group.viewers.analyst, first, { action, ...step }),
      ).rejects.toMatchObject({ status: 403 });
    }
    await expect(
      decideCandidate(services, group.viewers.viewer, first, { action: 'nominate', ...step }),
    ).rejects.toMatchObject({ status: 403 });
    const other = await makeGroup(services);
    await expect(
      decideCandidate(services, other.viewers.admin, first, { action: 'reopen', ...step }),
    ).rejects.toMatchObject({ status: 404 });
  });

  it('tags: a set of labels that keeps letter case and drops doubles', async () => {
    const tags = ['cheap metal', 'Cheap metal', 'cheap metal'];
    expect(await tagCandidate(services, group.viewers.analyst, first, { tags })).toEqual(
      expect.arrayContaining(['Cheap metal', 'cheap metal']),
    );
    expect(await tagCandidate(services, group.viewers.analyst, first, { tags: [] })).toEqual([]);
  });
});

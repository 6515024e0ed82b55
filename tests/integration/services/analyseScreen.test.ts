import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import type { DatabaseHandle } from '@/db/client';
import { insertAnalysis } from '@/db/repositories/analyses';
import { ENGINE_VERSION } from '@/kinetics';
import { followAnalysis, viewAnalysis } from '@/services/analyses';
import { analyseScreen } from '@/services/analyseScreen';
import { AnalysisRunner } from '@/services/analysisRunner';
import { viewCandidate } from '@/services/candidateView';
import { viewHeatmap } from '@/services/heatmap';
import { importScreen } from '@/services/importScreen';
import { viewLeaderboard } from '@/services/leaderboard';
import { viewScreen } from '@/services/screens';
import type { Services } from '@/services/services';
import { makeGroup, openTestServices, smallWorkbook, type TestGroup } from '../../fixtures/groups';

let services: Services;
let database: DatabaseHandle;
let group: TestGroup;
let screenId: string;

beforeAll(async () => {
  ({ services, database } = openTestServices());
  group = await makeGroup(services);
  const answer = await importScreen(services, group.viewers.analyst, {
    campaignId: group.campaignId,
    name: 'A screen',
    fileName: 'screen.csv',
    bytes: smallWorkbook('A'),
  });
  screenId = answer.screen.id;
});
afterAll(() => database.close());

const load = (analysisId: string) => viewAnalysis(services.db, group.viewers.viewer, analysisId);

describe('a stored analysis', () => {
  it('finds the k and the activation energy that the readings were made with', async () => {
    const started = await analyseScreen(services, group.viewers.analyst, screenId);
    expect(started).toMatchObject({ status: 'queued', total: 8, engine: ENGINE_VERSION });
    await services.runner.idle();
    const { analysis, results } = await load(started.id);
    expect(analysis).toMatchObject({ status: 'done', done: 8 });
    expect(results?.series).toHaveLength(8);

    // k doubles from ln −0.6 at 50 °C to ln 0.6 at 70 °C around 0.05 min⁻¹; Ea = R·1.2/(1/T1 − 1/T2).
    const k60 =
      (0.05 / 60) * Math.exp(-0.6 + (1.2 * (1 / 323.15 - 1 / 333.15)) / (1 / 323.15 - 1 / 343.15));
    const ea = (8.31446261815324 * 1.2) / (1 / 323.15 - 1 / 343.15);
    const [first] = results?.catalysts ?? [];
    expect(first).toMatchObject({ catalyst: 'A-1', verdict: 'first', order: 1, basis: 'law' });
    expect((first?.kRef?.value ?? 0) / k60).toBeCloseTo(1, 2);
    expect((first?.activationEnergy?.value ?? 0) / (ea / 1000)).toBeCloseTo(1, 2);
    // Two temperatures: a line, but nothing to judge it by.
    expect(first?.activationEnergy).toMatchObject({ unit: 'kJ/mol', low: null, high: null });
    expect(first?.warnings).toContain('two-temperatures');
  });

  it('is not overwritten by a later one, and the leaderboard shows the later one', async () => {
    const one = await analyseScreen(services, group.viewers.analyst, screenId);
    await services.runner.idle();
    const before = await load(one.id);
    const two = await analyseScreen(services, group.viewers.lead, screenId);
    await services.runner.idle();
    expect(await load(one.id)).toEqual(before);
    const board = await viewLeaderboard(services.db, group.viewers.viewer, group.campaignId);
    expect(board.rows.map((row) => row.analysisId)).toEqual([two.id, two.id]);
    expect(board.rows.map((row) => row.code)).toEqual(['A-1', 'A-2']);
    const places = board.rows.map((row) => row.ranks.rate?.rank ?? 0);
    expect(places.sort()).toEqual([1, 2]);
    const [fastest] = [...board.rows].sort(
      (a, b) => (b.rateRef?.value ?? 0) - (a.rateRef?.value ?? 0),
    );
    expect(fastest?.ranks.rate).toMatchObject({ rank: 1, tiedWithBest: true });
    const view = await viewScreen(services.db, group.viewers.viewer, screenId);
    expect(view.analyses[0]?.id).toBe(two.id);
    expect(view.wells.every((well) => well.verdict === 'first')).toBe(true);
  });

  it('that a stopped server left running is taken up again, with the same outcome', async () => {
    const id = randomUUID();
    const { settings } = await insertLeftOver(id);
    const runner = new AnalysisRunner(services.db, services.pools, services.now);
    expect(await runner.resume()).toBeGreaterThanOrEqual(1);
    await runner.idle();
    const left = await load(id);
    expect(left.analysis).toMatchObject({ status: 'done', failure: null });
    const fresh = await analyseScreen(services, group.viewers.analyst, screenId);
    await services.runner.idle();
    expect(left.results).toEqual((await load(fresh.id)).results);
    expect(settings).toContain('333.15');
  });

  it('that breaks off says so, keeps nothing half, and leaves earlier ones in force', async () => {
    const quiet = vi.spyOn(console, 'error').mockImplementation(() => undefined);
    const id = randomUUID();
    await insertLeftOver(id);
    const pools = {
      ...services.pools,
      analyseScreen: () => Promise.reject(new Error('a thread was lost')),
    };
    const runner = new AnalysisRunner(services.db, pools, services.now);
    await runner.resume();
    await runner.idle();
    quiet.mockRestore();
    const { analysis, results } = await load(id);
    expect(analysis.status).toBe('failed');
    expect(analysis.failure).toContain('again');
    expect(results).toBeNull();
    const board = await viewLeaderboard(services.db, group.viewers.viewer, group.campaignId);
    expect(board.rows).toHaveLength(2);
    expect(board.rows.some((row) => row.analysisId === id)).toBe(false);
  });

  it('can be followed to its end', async () => {
    const started = await analyseScreen(services, group.viewers.analyst, screenId);
    const steps = await followAnalysis(
      services,
      group.viewers.viewer,
      started.id,
      new AbortController().signal,
    );
    const statuses: string[] = [];
    for await (const step of steps) statuses.push(step.status);
    expect(statuses.at(-1)).toBe('done');
    const other = await makeGroup(services);
    await expect(
      followAnalysis(services, other.viewers.admin, started.id, new AbortController().signal),
    ).rejects.toMatchObject({ status: 404 });
  });

  it('feeds the heatmap and the candidate’s page, down to the cells of the workbook', async () => {
    const { viewer } = group.viewers;
    const heatmap = await viewHeatmap(services.db, viewer, group.campaignId);
    expect(heatmap.temperaturesK).toEqual([323.15, 343.15]);
    expect(heatmap.rows.map((row) => row.cells.map((cell) => cell?.wells))).toEqual([
      [2, 2],
      [2, 2],
    ]);
    const board = await viewLeaderboard(services.db, viewer, group.campaignId);
    const page = await viewCandidate(services.db, viewer, board.rows[0]?.catalystId ?? '');
    expect(page.wells).toHaveLength(4);
    expect(page.next?.code).toBe('A-2');
    expect(page.may).toEqual({ tag: false, nominate: false, decide: false });
    const [well] = page.wells;
    expect(well?.source).toMatchObject({ column: 'I' });
    expect(well?.source.rows.slice(0, 2)).toEqual([2, 3]);
    const drawn = well?.curves.laws.map((curve) => curve.law).sort();
    expect(drawn).toEqual(['first', 'saturating', 'second', 'zero']);
    const band = well?.curves.band;
    expect(band?.low.every((low, index) => low <= (band.high[index] ?? 0))).toBe(true);
    expect(page.arrhenius?.points).toHaveLength(4);
  });
});

/** A run as a server that was killed leaves it. */
async function insertLeftOver(id: string) {
  const settings = JSON.stringify({
    temperatureK: 333.15,
    concentration: 0.01,
    loadingGPerL: 2.5,
    targetConversion: 0.8,
  });
  await insertAnalysis(services.db, {
    id,
    groupId: group.groupId,
    screenId,
    status: 'running',
    done: 3,
    total: 8,
    engine: ENGINE_VERSION,
    settings,
    inputSha256: 'f'.repeat(64),
    requestedBy: group.viewers.analyst.userId,
    requestedAt: new Date(),
  });
  return { settings };
}

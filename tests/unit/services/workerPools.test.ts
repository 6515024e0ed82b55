import { mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openWorkerPools, type WorkerPools } from '@/services/workerPools';
import { batchSeries } from '../../fixtures/batch';
import { decaySeries, seededNormal, times } from '../../fixtures/decaySeries';
import { buildWorkers } from '../../../src/cli/build.mjs';

const WELLS = 900;
const reference = {
  temperatureK: 333.15,
  concentration: 0.01,
  loadingGPerL: null,
  targetConversion: 0.8,
};

function decay(seed: number): number[] {
  const normal = seededNormal(seed);
  return times(24, 3600).map(
    (t) => 0.01 * (Math.exp((-t * (1 + (seed % 3))) / 2400) + 0.01 * normal()),
  );
}

const series = Array.from({ length: WELLS }, (_, i) =>
  decaySeries({
    id: `W${i}`,
    catalyst: `MB-${Math.floor(i / 8)}`,
    temperatureK: 313.15 + 10 * (i % 4),
    timesS: times(24, 3600),
    values: decay(i),
  }),
);

const body = () =>
  new TextEncoder().encode(
    JSON.stringify({
      series: series.map(({ id, catalyst, timesS, values }) => ({
        ...batchSeries(),
        id,
        catalyst,
        time: { values: timesS, unit: 's' },
        reading: { values, unit: 'mol/L' },
      })),
    }),
  );

describe('threads that share a screen', { timeout: 60_000 }, () => {
  let folder: string;
  let [alone, together]: WorkerPools[] = [];
  beforeAll(async () => {
    // Inside the checkout, where the bundles find their packages.
    mkdirSync('.data', { recursive: true });
    folder = mkdtempSync(join('.data', 'workers-'));
    await buildWorkers(folder);
    alone = openWorkerPools(join(folder, 'workers'), 1);
    together = openWorkerPools(join(folder, 'workers'), 3);
  }, 60_000);
  afterAll(async () => {
    await Promise.all([alone!.close(), together!.close()]);
    rmSync(folder, { recursive: true });
  });

  it('give the answer of one thread, and count to the end', async () => {
    const counts: number[] = [];
    const [one, many] = await Promise.all([
      alone!.analyseScreen({ series, reference }, () => undefined),
      together!.analyseScreen({ series, reference }, (done) => counts.push(done)),
    ]);
    expect(many).toEqual(one);
    expect(counts.at(-1)).toBe(WELLS);
    expect(counts).toEqual([...counts].sort((a, b) => a - b));
  });

  it('give the same bytes for a batch', async () => {
    const [one, many] = await Promise.all([
      alone!.answerBatch(body()),
      together!.answerBatch(body()),
    ]);
    expect(one.status).toBe(200);
    expect(Buffer.from(many.body).equals(Buffer.from(one.body))).toBe(true);
  });

  it('are free again after a batch that is refused', async () => {
    const large = JSON.stringify({ series: 'x'.repeat(400_000) });
    const answers = await Promise.all(
      Array.from({ length: 6 }, () => together!.answerBatch(new TextEncoder().encode(large))),
    );
    expect(answers.map(({ status }) => status)).toEqual(Array(6).fill(422));
    expect((await together!.answerBatch(body())).status).toBe(200);
  });
});

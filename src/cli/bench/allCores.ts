import { availableParallelism } from 'node:os';
import { join } from 'node:path';
import { monitorEventLoopDelay } from 'node:perf_hooks';
import { seriesOf } from '../../calibration/judgeWells';
import { openWorkerPools } from '../../services/workerPools';
import { benchSeries } from './benchSeries';
import { line, median } from './measure';

const CONDITIONS = {
  temperatureK: null,
  concentration: null,
  loadingGPerL: null,
  targetConversion: null,
};
const PAIRS = 5;
const LEAST_GAIN = 1.7;

/** All cores against one, on the same screen. */
export async function benchPool(folder: string): Promise<string[]> {
  const cores = availableParallelism();
  if (cores < 2) return ['One core only: nothing to share.'];
  const series = benchSeries(9600, 40).map(({ times, values }, i) => ({
    ...seriesOf({ timesS: times, values }),
    id: `${i}`,
    catalyst: `${i >> 3}`,
  }));
  const workers = join(folder, 'workers');
  const pools = [openWorkerPools(workers, 1), openWorkerPools(workers)] as const;
  const timed = async (pool: (typeof pools)[number]) => {
    const start = performance.now();
    await pool.analyseScreen({ series, reference: CONDITIONS }, () => undefined);
    return performance.now() - start;
  };
  for (const pool of pools) await timed(pool);
  const gains: number[] = [];
  for (let i = 0; i < PAIRS; i += 1) gains.push((await timed(pools[0])) / (await timed(pools[1])));
  await Promise.all(pools.map((pool) => pool.close()));
  const gain = median(gains);
  return [
    line(
      `9,600 series on ${cores} cores, faster than on one`,
      `${gain.toFixed(2)} ×`,
      `at least ${LEAST_GAIN} ×`,
      gain >= LEAST_GAIN,
    ),
  ];
}

const MEGABYTE = 2 ** 20;

/** The largest batch through the path of the server: memory, and how long the server is held up. */
export async function benchLargestBatch(folder: string): Promise<string[]> {
  const bytes = largestBatch();
  const pool = openWorkerPools(join(folder, 'workers'));
  const delay = monitorEventLoopDelay({ resolution: 5 });
  let most = 0;
  const watch = setInterval(() => {
    most = Math.max(most, process.memoryUsage.rss());
  }, 20);
  delay.enable();
  const start = performance.now();
  const answer = await pool.answerBatch(bytes);
  const seconds = (performance.now() - start) / 1000;
  await new Promise((resolve) => setTimeout(resolve, 50));
  delay.disable();
  clearInterval(watch);
  await pool.close();
  if (answer.status !== 200) throw new Error(`The batch was answered with ${answer.status}.`);
  const held = delay.max / 1e6;
  const memory = most / MEGABYTE;
  const size = (answer.body.byteLength / MEGABYTE).toFixed(0);
  return [
    `20,000 series × 100 readings answered in ${seconds.toFixed(1)} s, ${size} MiB`,
    line(
      '… memory of the whole process at most',
      `${memory.toFixed(0)} MiB`,
      'under 1024 MiB',
      memory < 1024,
    ),
    line(
      '… the event loop held up for at most',
      `${held.toFixed(0)} ms`,
      'at most 50 ms',
      held <= 50,
    ),
  ];
}

function largestBatch(): Uint8Array<ArrayBuffer> {
  const wells = benchSeries(400, 100);
  const series = Array.from({ length: 20_000 }, (_, i) => {
    const { times, values } = wells[i % wells.length]!;
    return JSON.stringify({
      id: `W${i}`,
      catalyst: `C${i >> 3}`,
      temperature: { value: 40 + 10 * (i % 4), unit: 'degC' },
      time: { values: times.map((t) => Number(t.toPrecision(7))), unit: 's' },
      reading: { values: values.map((c) => Number(c.toPrecision(6))), unit: 'mol/L' },
    });
  });
  return new TextEncoder().encode(`{"series":[${series.join(',')}]}`);
}

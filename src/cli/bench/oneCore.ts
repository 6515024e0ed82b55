import { execFileSync } from 'node:child_process';
import { join } from 'node:path';
import { benchSeries, type BenchSeries } from './benchSeries';
import { fitAll, prepare } from './engineFits';
import { floor, FLOOR_EXPONENTIALS } from './floor';
import { fitByPackage } from './levenbergFits';
import { line, median, timeOf } from './measure';
import type { Scipy } from './scipy';

const SERIES = 960;
const READINGS = 40;
const PAIRS = 15;
/** Passes before anything is timed. */
const WARM_UP = 80;
/** Series of one pair with a slow reference. */
const SLICE = 96;
/** The engine's pass over a slice is short: it is timed over so many. */
const PASSES = 20;

const WANTED = { 3: { scipy: 150, floor: 4 }, 4: { scipy: 60, floor: 7 } } as const;

/** Ratios of one core, warm and in a fresh process. */
export async function benchOneCore(folder: string, scipy: Scipy | null): Promise<string[]> {
  const all = benchSeries(SERIES, READINGS);
  const prepared = prepare(all);
  for (let i = 0; i < WARM_UP; i += 1) {
    fitAll(prepared, 3);
    fitAll(prepared, 4);
    floor(SERIES, 180);
  }
  const lines: string[] = [];
  for (const laws of [3, 4] as const) {
    const name = `${laws} laws`;
    const ofFloor = ratios(PAIRS, () => ({
      own: timeOf(() => fitAll(prepared, laws)),
      other: timeOf(() => floor(SERIES, FLOOR_EXPONENTIALS[laws])),
    }));
    const inverse = 1 / ofFloor;
    lines.push(
      line(
        `${name}, over the floor of ${FLOOR_EXPONENTIALS[laws]} exponentials a series`,
        `${inverse.toFixed(2)} ×`,
        `at most ${WANTED[laws].floor} ×`,
        inverse <= WANTED[laws].floor,
      ),
    );
    if (scipy !== null) lines.push(...(await againstScipy(folder, scipy, all, laws)));
    if (laws === 3) {
      const ratio = ratios(8, (i) => {
        const slice = sliceOf(all, i);
        return { own: engineTime(slice, laws), other: timeOf(() => fitByPackage(slice, laws)) };
      });
      lines.push(
        line(
          `${name}, faster than ml-levenberg-marquardt`,
          `${ratio.toFixed(0)} ×`,
          'at least 80 ×',
          ratio >= 80,
        ),
      );
    }
  }
  return lines;
}

async function againstScipy(folder: string, scipy: Scipy, all: BenchSeries[], laws: 3 | 4) {
  const pairs: number[] = [];
  let whole = 0;
  for (let i = 0; i < SERIES / SLICE; i += 1) {
    const slice = sliceOf(all, i);
    const other = await scipy.timeOf(slice, laws);
    whole += other;
    pairs.push(other / engineTime(slice, laws));
  }
  const warm = median(pairs);
  const fresh = median(
    Array.from({ length: 5 }, () => {
      const script = join(folder, 'freshProcess.mjs');
      return (
        whole / Number(execFileSync(process.execPath, [script, `${laws}`], { encoding: 'utf8' }))
      );
    }),
  );
  const wanted = WANTED[laws].scipy;
  return [
    line(
      `${laws} laws, faster than SciPy curve_fit`,
      `${warm.toFixed(0)} ×`,
      `at least ${wanted} ×`,
      warm >= wanted,
    ),
    line(
      `${laws} laws, the same in a fresh process`,
      `${fresh.toFixed(0)} ×`,
      'at least 10 ×',
      fresh >= 10,
    ),
  ];
}

const sliceOf = (all: readonly BenchSeries[], i: number) => all.slice(i * SLICE, (i + 1) * SLICE);

function engineTime(slice: readonly BenchSeries[], laws: 3 | 4): number {
  const prepared = prepare(slice);
  return (
    timeOf(() => {
      for (let i = 0; i < PASSES; i += 1) fitAll(prepared, laws);
    }) / PASSES
  );
}

function ratios(pairs: number, pair: (i: number) => { own: number; other: number }): number {
  return median(
    Array.from({ length: pairs }, (_, i) => {
      const { own, other } = pair(i);
      return other / own;
    }),
  );
}

import { describe, expect, it } from 'vitest';
import {
  analyseScreen,
  analyseWell,
  type DecaySeries,
  type PlannedWell,
  type ReadingKind,
} from '../../../../src/kinetics';
import {
  discriminatingTimes,
  lawsInPlay,
} from '../../../../src/kinetics/planning/discriminatingTimes';
import { decaySeries, seededNormal, times } from '../../../fixtures/decaySeries';

const forms = {
  zero: (u: number) => Math.max(1 - u, 0),
  first: (u: number) => Math.exp(-u),
  second: (u: number) => 1 / (1 + u),
};
type Law = keyof typeof forms;

/** A source of wells of one law, 1/kRel = 1 h, C0 = 10 mmol/L. */
function bench(law: Law, noise: number, seed: number, kind: ReadingKind = 'reactant') {
  const normal = seededNormal(seed);
  return (timesS: number[]): PlannedWell & { series: DecaySeries } => {
    const values = timesS.map((t) => {
      const g = forms[law](t / 3600);
      return 0.01 * ((kind === 'product' ? 1 - g : g) + noise * normal());
    });
    const series = decaySeries({ timesS, values, kind });
    return { series, analysis: analyseWell(series).analysis, timesS };
  };
}

const nowhere = {
  temperatureK: null,
  concentration: null,
  loadingGPerL: null,
  targetConversion: null,
};
const limits = { shortestIntervalS: 60, longestRunS: null };

describe('times that tell an order', () => {
  // The proposal knows the well only through its noisy fits, so its promise is checked over many.
  it.each([
    ['zero', 1500, 12, 'reactant'],
    ['first', 2400, 12, 'reactant'],
    ['first', 3600, 24, 'product'],
    ['second', 2400, 12, 'reactant'],
    ['second', 3600, 24, 'reactant'],
  ] as const)('settle most wells of %s order left open after %i s', (law, lastS, n, kind) => {
    const run = bench(law, 0.01, 17, kind);
    let [open, runs, settled] = [0, 0, 0];
    for (let i = 0; i < 60 && open < 15; i += 1) {
      const well = run(times(n, lastS));
      if (well.analysis.verdict !== 'undetermined') continue;
      const plan = discriminatingTimes(well, limits);
      if (plan === null || !['time', 'readings', 'repeat'].includes(plan.by)) continue;
      open += 1;
      for (let j = 0; j < 12; j += 1) {
        runs += 1;
        if (run(plan.timesS).analysis.verdict === law) settled += 1;
      }
    }
    expect(open).toBeGreaterThan(4);
    expect(settled / runs).toBeGreaterThan(0.7);
  });

  it('are longer than the run that left it open, with the readings as they were', () => {
    const plan = discriminatingTimes(bench('first', 0.005, 2)(times(12, 1500)), limits)!;
    expect(plan.by).toBe('time');
    expect(plan.lastS).toBeGreaterThan(1500);
    expect(plan.timesS).toHaveLength(12);
    expect(plan.timesS[11]).toBe(plan.lastS);
    expect(plan.conversion).toBeGreaterThan(0.45);
    expect(plan.evidenceRatio).toBeGreaterThan(10);
  });

  it('keep to the shortest interval and the longest run', () => {
    const well = bench('first', 0.01, 2)(times(12, 1500));
    const plan = discriminatingTimes(well, { shortestIntervalS: 60, longestRunS: 2000 })!;
    const gaps = plan.timesS.slice(1).map((time, i) => time - plan.timesS[i]!);
    expect(Math.min(...gaps)).toBeGreaterThanOrEqual(60 - 1e-6);
    expect(plan.lastS).toBeLessThanOrEqual(2000);
  });

  it('give way to replicates where no time helps, which then decide together', () => {
    const run = bench('first', 0.02, 23);
    const fixed = { shortestIntervalS: 900, longestRunS: 7200 };
    const plans = Array.from({ length: 12 }, () => discriminatingTimes(run(times(8, 7200)), fixed));
    const [plan] = plans.filter((one) => one?.by === 'noise');
    expect(plan!.replicates).toBe(Math.ceil(plan!.noiseShare! ** -2 - 1e-9));
    const verdicts = Array.from({ length: 20 }, () => {
      const wells = Array.from({ length: plan!.replicates! }, () => run(plan!.timesS));
      const series = wells.map(({ series: one }, i) => ({ ...one, id: `well ${i}` }));
      return analyseScreen(series, nowhere).catalysts[0]!.verdict;
    });
    expect(verdicts.filter((verdict) => verdict === 'first').length).toBeGreaterThan(13);
  });

  it('are none where neither times nor readings nor replicates help', () => {
    const well = bench('second', 0.08, 23)(times(6, 3600));
    const plan = discriminatingTimes(well, { shortestIntervalS: 720, longestRunS: 3600 })!;
    expect(plan).toMatchObject({ by: 'none', replicates: null, noiseShare: null });
  });

  it('come earlier for a reaction that is over at its second reading', () => {
    const plan = discriminatingTimes(bench('first', 0.01, 4)(times(8, 80 * 3600)), limits)!;
    expect(plan).toMatchObject({ by: 'over', lastS: (80 * 3600) / 7 });
  });

  it('come after a longer run for product that shows no end', () => {
    const run = bench('zero', 0.01, 8, 'product');
    const plan = discriminatingTimes(run(times(8, 900)), limits)!;
    expect(plan).toMatchObject({ by: 'bend', lastS: 2700 });
  });

  it('are none for a well that cannot be fitted', () => {
    expect(discriminatingTimes(bench('first', 0.01, 1)([0, 60]), limits)).toBeNull();
  });

  it('weigh every law within a ratio of 10 of the best, and at least two', () => {
    const clear = bench('first', 0.002, 3)(times(24, 10_800));
    expect(lawsInPlay(clear.analysis)).toHaveLength(2);
    expect(lawsInPlay(clear.analysis)[0]).toBe('first');
    const open = bench('first', 0.05, 3)(times(12, 1800));
    expect(lawsInPlay(open.analysis)).toHaveLength(3);
  });
});

import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { fitLaw } from '../../../../src/kinetics/fitting/fitLaw';
import { fitSaturating } from '../../../../src/kinetics/fitting/fitSaturating';
import { scaleReadings, type FitProblem } from '../../../../src/kinetics/fitting/problem';
import type { Readings } from '../../../../src/kinetics/fitting/readings';
import { firstOrder } from '../../../../src/kinetics/rateLaws/firstOrder';
import { saturatingShape } from '../../../../src/kinetics/rateLaws/saturating';
import { zerothOrder } from '../../../../src/kinetics/rateLaws/zerothOrder';

interface Reference {
  id: string;
  t: number[];
  c: number[];
  c0: number;
  kRel: number;
  coverage: number;
  rss: number;
}

const reference = JSON.parse(
  readFileSync(new URL('../../../reference/saturatingFits.json', import.meta.url), 'utf8'),
) as { source: string; wells: Reference[] };

function readingsOf(times: number[], values: number[]): Readings {
  return {
    times,
    values,
    indices: times.map((_, i) => i),
    excluded: 0,
    unsorted: false,
    distinctTimes: times.length,
  };
}

function fit(problem: FitProblem) {
  const scaled = (law: typeof firstOrder) => {
    const found = fitLaw(problem, law);
    return {
      kRel: (found.kRel ?? 0) * problem.timeScale,
      rss: found.rss / problem.valueScale ** 2,
    };
  };
  const [first, zero] = [scaled(firstOrder), scaled(zerothOrder)];
  return { first, zero, found: fitSaturating(problem, first, zero) };
}

describe('fitSaturating', () => {
  it.each(reference.wells)('agrees with SciPy on $id', ({ t, c, c0, kRel, coverage, rss }) => {
    const problem = scaleReadings(readingsOf(t, c), 'reactant');
    const { found } = fit(problem);
    expect(found.limit).toBeNull();
    expect((found.amplitude * problem.valueScale) / c0).toBeCloseTo(1, 6);
    expect(found.kRel / problem.timeScale / kRel).toBeCloseTo(1, 6);
    expect(found.coverage / coverage).toBeCloseTo(1, 6);
    expect(found.rss * problem.valueScale ** 2).toBeLessThanOrEqual(rss * (1 + 1e-10));
  });

  it.each([0.02, 0.2, 0.5, 0.8, 0.98, 0.999])(
    'finds its own curve again at a coverage of %d, in every kind of reading',
    (coverage) => {
      const shape = saturatingShape(coverage);
      const end = shape.reach(0.97);
      const times = Array.from({ length: 25 }, (_, i) => (i / 24) * 3600);
      const kRel = end / 3600;
      const decay = times.map((time) => 0.02 * shape.relative(kRel * time));
      for (const [kind, values] of [
        ['reactant', decay],
        ['product', decay.map((c) => 0.02 - c)],
        ['conversion', decay.map((c) => 1 - c / 0.02)],
      ] as const) {
        const { found } = fit(scaleReadings(readingsOf(times, values), kind));
        expect(found.kRel / 3600 / kRel).toBeCloseTo(1, 7);
        expect(found.coverage).toBeCloseTo(coverage, 7);
        expect(found.rss).toBeLessThan(1e-18);
      }
    },
  );

  it('ends at its limits where the readings ask for them, never worse than either', () => {
    const times = Array.from({ length: 20 }, (_, i) => i * 60);
    const second = times.map((time) => 1 / (1 + time / 400));
    const { first, found } = fit(scaleReadings(readingsOf(times, second), 'reactant'));
    expect(found.limit).toBe('first');
    expect(found.rss).toBeCloseTo(first.rss, 10);
    const zero = times.map((time) => Math.max(1 - time / 700, 0));
    const sharp = fit(scaleReadings(readingsOf(times, zero), 'reactant'));
    expect(sharp.found.coverage).toBeGreaterThan(0.9999);
    expect(sharp.found.rss).toBeLessThan(1e-8);
  });
});

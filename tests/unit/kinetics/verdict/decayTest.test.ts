import { describe, expect, it } from 'vitest';
import { analyseWell } from '../../../../src/kinetics';
import { decaySeries, seededNormal, times } from '../../../fixtures/decaySeries';

type Kind = 'reactant' | 'product';

/** The share of wells that are said to react; k of first order from the conversion at the end. */
function sharedReacting(
  given: { kind?: Kind; readings: number; noise: number; conversion: number; runs: number },
  seed: number,
): number {
  const normal = seededNormal(seed);
  const { kind = 'reactant', readings, noise, conversion, runs } = given;
  const t = times(readings, 3600);
  const k = -Math.log1p(-conversion) / 3600;
  let reacting = 0;
  for (let run = 0; run < runs; run += 1) {
    const values = t.map((time) => {
      const left = Math.exp(-k * time);
      return 0.01 * ((kind === 'product' ? 1 - left : left) + noise * normal());
    });
    const { verdict } = analyseWell(decaySeries({ timesS: t, values, kind })).analysis;
    if (verdict !== 'no-reaction') reacting += 1;
  }
  return reacting / runs;
}

describe('one well without a reaction', () => {
  // 1,000 wells leave a standard error of 0.4 % on 2 %.
  it.each([
    ['reactant', 4, 0.02],
    ['reactant', 8, 0.02],
    ['reactant', 24, 0.02],
    ['reactant', 8, 0.2],
    ['product', 8, 0.02],
    ['product', 24, 0.02],
  ] as const)('%s, %i readings, noise %f: kept as dead in 98 of 100', (kind, readings, noise) => {
    const share = sharedReacting({ kind, readings, noise, conversion: 0, runs: 1000 }, readings);
    expect(share).toBeLessThan(0.03);
  });
});

describe('one well with a reaction', () => {
  it('a slow one is found once it stands clear of the noise', () => {
    const share = sharedReacting({ readings: 12, noise: 0.01, conversion: 0.06, runs: 200 }, 3);
    expect(share).toBeGreaterThan(0.98);
  });
  it('one that is over after a few of many readings is found', () => {
    const share = sharedReacting({ readings: 24, noise: 0.01, conversion: 1 - 1e-15, runs: 50 }, 4);
    expect(share).toBe(1);
  });
  it('one of three readings is found by the size of its fall', () => {
    const share = sharedReacting({ readings: 3, noise: 0.01, conversion: 0.5, runs: 100 }, 5);
    expect(share).toBeGreaterThan(0.95);
  });
});

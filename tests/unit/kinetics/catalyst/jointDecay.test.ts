import { describe, expect, it } from 'vitest';
import { analyseScreen, GAS_CONSTANT } from '../../../../src/kinetics';
import type { CatalystAnalysis, DecaySeries } from '../../../../src/kinetics/types';
import { decaySeries, seededNormal, times } from '../../../fixtures/decaySeries';

const none = {
  temperatureK: null,
  concentration: null,
  loadingGPerL: null,
  targetConversion: null,
};
const EA = 55_000;
const SET_K = [313.15, 323.15, 333.15, 343.15];

interface Simulated {
  wells: number;
  readings: number;
  noise: number;
  /** First order, reached at 333.15 K. */
  conversion: number;
  with?: Partial<DecaySeries>;
}

function simulate({ wells, readings, noise, conversion, with: given }: Simulated, runs: number) {
  const normal = seededNormal(wells * 1000 + readings);
  const t = times(readings, 3600);
  return Array.from({ length: runs }, (): CatalystAnalysis => {
    const series = Array.from({ length: wells }, (_, i) => {
      const temperatureK = SET_K[Math.floor((i * SET_K.length) / wells)]!;
      const factor = Math.exp((-EA / GAS_CONSTANT) * (1 / temperatureK - 1 / 333.15));
      const k = (-Math.log1p(-conversion) / 3600) * factor;
      return decaySeries({
        id: `${i}`,
        temperatureK,
        timesS: t,
        values: t.map((time) => 0.01 * (Math.exp(-k * time) + noise * normal())),
        ...given,
      });
    });
    return analyseScreen(series, none).catalysts[0]!;
  });
}

const shareOf = (results: CatalystAnalysis[], is: (one: CatalystAnalysis) => boolean) =>
  results.filter(is).length / results.length;
const isDead = (one: CatalystAnalysis) => one.verdict === 'no-reaction';

describe('a catalyst without a reaction', () => {
  // 300 catalysts leave a standard error of 1 % on 5 %; each well by itself would lose 15 %.
  it.each([
    [4, 8, 0.01],
    [8, 24, 0.02],
    [8, 8, 0.2],
    [16, 12, 0.02],
  ])('of %i wells, %i readings, noise %f is kept in 95 of 100', (wells, readings, noise) => {
    const results = simulate({ wells, readings, noise, conversion: 0 }, 300);
    expect(shareOf(results, isDead)).toBeGreaterThan(0.93);
  });
});

describe('a slow catalyst', () => {
  const barely = { wells: 8, readings: 24, noise: 0.02, conversion: 0.025 };

  it('that its wells show together is found', () => {
    expect(shareOf(simulate(barely, 200), isDead)).toBeLessThan(0.1);
  });
  it('has no rate where no well shows the reaction by itself', () => {
    const together = simulate({ ...barely, conversion: 0.012 }, 200).filter((one) =>
      one.warnings.includes('reacts-only-together'),
    );
    expect(together.length).toBeGreaterThan(10);
    for (const one of together) {
      expect(one.verdict).toBe('undetermined');
      expect([one.rateRef, one.initialRateActivationEnergy, one.kRef]).toEqual([null, null, null]);
      expect(one.warnings).not.toContain('no-reacting-wells');
    }
  });
  it('stays without a reaction where a law is forced on wells that show none', () => {
    const given = { ...barely, conversion: 0.012, with: { law: 'first' as const } };
    const results = simulate(given, 100);
    for (const one of results) expect(['forced', 'no-reaction']).toContain(one.verdict);
  });
});

describe('wells at different temperatures', () => {
  it('are enough where the hot ones react', () => {
    // 22 % at 333 K is 6 % at 313 K.
    const results = simulate({ wells: 4, readings: 12, noise: 0.02, conversion: 0.22 }, 50);
    expect(shareOf(results, isDead)).toBe(0);
  });
});

import { describe, expect, it } from 'vitest';
import { analyseScreen, GAS_CONSTANT, rateLaws } from '../../../../src/kinetics';
import { decaySeries, seededNormal, times } from '../../../fixtures/decaySeries';

const none = {
  temperatureK: null,
  concentration: null,
  loadingGPerL: null,
  targetConversion: null,
};
const SET_K = [318.15, 328.15, 338.15, 348.15];
const READINGS = 16;

/** Verdicts on catalysts whose wells follow g(u), u = k t scaled to reach `u` at 333.15 K. */
function verdicts(g: (u: number) => number, u: number, replicates: number, runs: number) {
  const normal = seededNormal(replicates);
  const t = times(READINGS, 3600);
  return Array.from({ length: runs }, () => {
    const wells = SET_K.flatMap((temperatureK) => {
      const factor = Math.exp((-55_000 / GAS_CONSTANT) * (1 / temperatureK - 1 / 333.15));
      return Array.from({ length: replicates }, (_, i) =>
        decaySeries({
          id: `${temperatureK} ${i}`,
          temperatureK,
          timesS: t,
          values: t.map((time) => 0.01 * (g((u * factor * time) / 3600) + 0.01 * normal())),
        }),
      );
    });
    return analyseScreen(wells, none).catalysts[0]!.verdict;
  });
}

describe('many wells of one simple order', () => {
  // With more wells the right order must not be doubted more often by chance.
  it.each(
    rateLaws.flatMap((law) => [2, 8].map((replicates) => [law.name, replicates, law] as const)),
  )('%s, %i of each temperature', (name, replicates, law) => {
    const found = verdicts((u) => law.relative(u), law.reach(0.8), replicates, 60);
    const right = found.filter((verdict) => verdict === name).length;
    expect(right / found.length).toBeGreaterThan(0.9);
    expect(found).not.toContain(name === 'first' ? 'second' : 'first');
  });
});

describe('many wells of no simple order', () => {
  it.each([
    ['a catalyst that dies', (u: number) => Math.exp(-(1 - Math.exp(-0.4 * u)) / 0.4)],
    ['a level that stays', (u: number) => 0.1 + 0.9 * Math.exp(-u)],
    ['order 1.3', (u: number) => (1 + 0.3 * u) ** (-1 / 0.3)],
  ])('%s', (_, g) => {
    const found = verdicts(g, 1.6, 4, 30);
    for (const verdict of found) expect(['zero', 'first', 'second']).not.toContain(verdict);
  });
});

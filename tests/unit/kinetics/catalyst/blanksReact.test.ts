import { describe, expect, it } from 'vitest';
import { analyseScreen, GAS_CONSTANT } from '../../../../src/kinetics';
import type { DecaySeries, WellRole } from '../../../../src/kinetics/types';
import { decaySeries, seededNormal, times } from '../../../fixtures/decaySeries';

const ABOUT_BLANKS = ['blank-reacts', 'blank-subtracted'];

const none = {
  temperatureK: null,
  concentration: null,
  loadingGPerL: null,
  targetConversion: null,
};
const SET_K = [313.15, 323.15, 333.15, 343.15];
const CONVERSION = 0.6;

/** Wells over four temperatures with `share` of the rate of a catalyst that converts 60 %. */
function wells(count: number, role: WellRole, share: number, normal: () => number): DecaySeries[] {
  const t = times(24, 3600);
  return Array.from({ length: count }, (_, i) => {
    const temperatureK = SET_K[i % SET_K.length]!;
    const factor = Math.exp((-55_000 / GAS_CONSTANT) * (1 / temperatureK - 1 / 333.15));
    const k = (-Math.log1p(-CONVERSION) / 3600) * share * factor;
    return decaySeries({
      id: `${role} ${i}`,
      role,
      catalyst: role === 'sample' ? 'X' : null,
      temperatureK,
      timesS: t,
      values: t.map((time) => 0.01 * (Math.exp(-k * time) + 0.01 * normal())),
    });
  });
}

function warned(blanks: number, share: number, given = { catalyst: 1, runs: 100 }): number {
  const normal = seededNormal(blanks * 100 + share * 7);
  let count = 0;
  for (let run = 0; run < given.runs; run += 1) {
    const { catalysts } = analyseScreen(
      [...wells(8, 'sample', given.catalyst, normal), ...wells(blanks, 'blank', share, normal)],
      none,
    );
    if (catalysts[0]!.warnings.some((code) => ABOUT_BLANKS.includes(code))) count += 1;
  }
  return count / given.runs;
}

describe('a blank is pointed out', () => {
  it.each([1, 4, 16])('of %i, where it makes a fifth of the rate', (blanks) => {
    expect(warned(blanks, 0.2)).toBeGreaterThan(0.95);
  });
  it('where only several together show half the rate of a slow catalyst', () => {
    expect(warned(16, 0.01, { catalyst: 0.02, runs: 60 })).toBeGreaterThan(0.9);
  });
});

describe('a blank is not pointed out', () => {
  it.each([1, 4, 16])('of %i, where none reacts', (blanks) => {
    expect(warned(blanks, 0, { catalyst: 0.1, runs: 200 })).toBeLessThan(0.06);
  });
  it('where it surely reacts, but makes a fiftieth of the rate', () => {
    expect(warned(16, 0.02)).toBeLessThan(0.05);
  });
  it('where no well is near its temperature', () => {
    const normal = seededNormal(3);
    const blanks = wells(4, 'blank', 0.5, normal).map((well) => ({
      ...well,
      temperatureK: 383.15,
    }));
    const { catalysts } = analyseScreen([...wells(8, 'sample', 1, normal), ...blanks], none);
    expect(catalysts[0]!.warnings.filter((code) => ABOUT_BLANKS.includes(code))).toEqual([]);
  });
});

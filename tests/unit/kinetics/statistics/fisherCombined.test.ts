import { describe, expect, it } from 'vitest';
import { fisherCombined } from '../../../../src/kinetics/statistics/fisherCombined';
import { seededRandom } from '../../../fixtures/decaySeries';

describe('tests taken together', () => {
  it('one test stands for itself', () => {
    expect(fisherCombined([0.03])).toBeCloseTo(0.03, 14);
  });
  it('two tests: q (1 − ln q), q their product', () => {
    const q = 0.02 * 0.4;
    expect(fisherCombined([0.02, 0.4])).toBeCloseTo(q * (1 - Math.log(q)), 14);
  });
  it('the 5 % point of χ² with 20 degrees of freedom, 31.410 in printed tables', () => {
    expect(fisherCombined(Array<number>(10).fill(Math.exp(-31.41 / 20)))).toBeCloseTo(0.05, 4);
  });
  it('neither no test nor tests of 0 and 1 fail', () => {
    expect(fisherCombined([])).toBe(1);
    expect(fisherCombined([1, 1])).toBe(1);
    expect(fisherCombined([0, 0.5])).toBeGreaterThanOrEqual(0);
    expect(fisherCombined([0, 0.5])).toBeLessThan(1e-290);
  });
  it('thousands of tests without an effect say nothing', () => {
    const random = seededRandom(8);
    const p = fisherCombined(Array.from({ length: 5000 }, () => random()));
    expect(p).toBeGreaterThan(0.001);
    expect(p).toBeLessThan(0.999);
  });
});

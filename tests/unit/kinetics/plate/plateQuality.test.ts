import { describe, expect, it } from 'vitest';
import { medianPolish } from '../../../../src/kinetics/plate/medianPolish';
import {
  plateQuality,
  pooledVariance,
  type PlateWell,
} from '../../../../src/kinetics/plate/plateQuality';
import { zPrime, zPrimeOf } from '../../../../src/kinetics/plate/zPrime';
import { seededNormal, sharedDigits } from '../../../fixtures/decaySeries';

describe('Z′ (Zhang, Chung & Oldenburg 1999)', () => {
  it('of means 100 and 10, deviations 5 and 4, is 0.7', () => {
    const value = zPrimeOf({ mean: 100, sd: 5 }, { mean: 10, sd: 4 });
    expect(sharedDigits(value, 0.7)).toBeGreaterThan(12);
  });
  it('from wells; none where a kind is missing or both are alike', () => {
    // sd of 9, 10, 11 is 1, of 0, 0 is 0: 1 − 3/10.
    expect(zPrime([9, 10, 11], [0, 0])).toBeCloseTo(0.7, 12);
    expect(zPrime([9], [0, 0])).toBeNull();
    expect(zPrime([1, 1], [1, 1])).toBeNull();
  });
});

describe('pooled variance (by mpmath)', () => {
  it('of 0.04 (n 4), 0.06 (3), 0.05 (3) as standard deviations', () => {
    const groups = [
      { variance: 0.04 ** 2, n: 4 },
      { variance: 0.06 ** 2, n: 3 },
      { variance: 0.05 ** 2, n: 3 },
    ];
    expect(sharedDigits(pooledVariance(groups), 0.002428571428571)).toBeGreaterThan(11);
  });
});

describe('median polish (Tukey 1977)', () => {
  it('takes an additive plate apart to the last digit, outlier or not', () => {
    const row = [-2, 0, 1, 3];
    const column = [-1, 0, 0.5, 2, 4];
    const plate: (number | null)[][] = row.map((a) => column.map((b) => 10 + a + b));
    plate[1]![2] = 999;
    plate[3]![0] = null;
    const found = medianPolish(plate);
    found.residuals.forEach((values, i) =>
      values.forEach((value, j) => {
        if (i === 3 && j === 0) expect(value).toBeNull();
        else if (i === 1 && j === 2) expect(value).toBeGreaterThan(900);
        else expect(value).toBeCloseTo(0, 8);
      }),
    );
    expect(found.rows[3]! - found.rows[0]!).toBeCloseTo(5, 8);
    expect(found.columns[4]! - found.columns[1]!).toBeCloseTo(4, 8);
  });
  it('of an empty plate is empty', () => {
    expect(medianPolish([])).toEqual({ overall: 0, rows: [], columns: [], residuals: [] });
  });
});

/** 8 × 12 wells: 48 catalysts twice over, 4 % spread, with an effect on the first column. */
function plate(edge: number, seed: number): PlateWell[] {
  const normal = seededNormal(seed);
  return Array.from({ length: 96 }, (_, i) => {
    // The second half turned round, so that replicates do not share a row or column.
    const at = i < 48 ? i : 143 - i;
    const [row, column] = [Math.floor(at / 12), at % 12];
    return {
      row,
      column,
      role: 'sample',
      catalyst: `C${i % 48}`,
      temperatureK: 333.15,
      rate: 1e-6 * Math.exp((i % 48) / 20 + 0.04 * normal() + (column === 0 ? edge : 0)),
    };
  });
}

describe('plate quality', () => {
  it('finds the spread of replicates', () => {
    const sds = [1, 2, 3, 4, 5].map((seed) => plateQuality(plate(0, seed), 1).replicateSd!);
    const mean = sds.reduce((sum, sd) => sum + sd / sds.length, 0);
    expect(mean).toBeGreaterThan(0.035);
    expect(mean).toBeLessThan(0.045);
  });
  it('points out an edge, and seldom one that is not there', () => {
    expect(plateQuality(plate(0.25, 1), 1).columnP!).toBeLessThan(0.02);
    const alarms = Array.from({ length: 20 }, (_, seed) => plateQuality(plate(0, seed + 10), 1));
    expect(alarms.filter(({ columnP }) => columnP! < 0.01).length).toBeLessThanOrEqual(2);
  });
  it('says nothing of a plate with too few wells, and never NaN', () => {
    const few = plateQuality(plate(0, 1).slice(0, 4), 1);
    expect(few).toMatchObject({ zPrime: null, replicateSd: null, rowP: null });
    expect(JSON.stringify(plateQuality([], 1))).not.toContain('NaN');
  });
  it('is the same for the same seed', () => {
    expect(plateQuality(plate(0.1, 1), 5)).toEqual(plateQuality(plate(0.1, 1), 5));
  });
});

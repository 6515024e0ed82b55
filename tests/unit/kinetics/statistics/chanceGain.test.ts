import { describe, expect, it } from 'vitest';
import {
  chanceGain,
  oneSidedGain,
  polygamma,
} from '../../../../src/kinetics/statistics/chanceGain';
import { seededNormal } from '../../../fixtures/decaySeries';

const EULER = 0.5772156649015329;

describe('ψ and ψ′', () => {
  // Closed forms of Abramowitz & Stegun 1964, 6.3.2, 6.3.3, 6.4.2 and 6.4.4.
  it.each([
    [1, -EULER, Math.PI ** 2 / 6],
    [0.5, -EULER - 2 * Math.LN2, Math.PI ** 2 / 2],
    [3, -EULER + 3 / 2, Math.PI ** 2 / 6 - 5 / 4],
    [2.5, -EULER - 2 * Math.LN2 + 2 + 2 / 3, Math.PI ** 2 / 2 - 4 - 4 / 9],
  ])('at %f', (x, psi, psi1) => {
    expect(polygamma(x).psi).toBeCloseTo(psi, 11);
    expect(polygamma(x).psi1).toBeCloseTo(psi1, 11);
  });
});

describe('the gain of a needless parameter', () => {
  it('with many readings is that of χ² with one degree of freedom', () => {
    const { mean, variance } = chanceGain(1e5, 1e5 - 3);
    expect(mean).toBeCloseTo(1, 3);
    expect(variance).toBeCloseTo(2, 3);
  });
  it('with few readings is larger, as simulated straight lines through noise show', () => {
    const [n, runs] = [8, 20_000];
    const normal = seededNormal(4);
    const x = Array.from({ length: n }, (_, i) => i - (n - 1) / 2);
    const xx = x.reduce((sum, value) => sum + value * value, 0);
    let [sum, squares] = [0, 0];
    for (let run = 0; run < runs; run += 1) {
      const y = x.map(() => normal());
      const mean = y.reduce((total, value) => total + value / n, 0);
      const flat = y.reduce((total, value) => total + (value - mean) ** 2, 0);
      const slope = x.reduce((total, value, i) => total + (value * y[i]!) / xx, 0);
      const gain = n * Math.log(flat / (flat - slope * slope * xx));
      sum += gain;
      squares += gain * gain;
    }
    const expected = chanceGain(n, n - 2);
    expect(expected.mean).toBeGreaterThan(1.2);
    expect(sum / runs / expected.mean).toBeCloseTo(1, 1);
    expect((squares / runs - (sum / runs) ** 2) / expected.variance).toBeCloseTo(1, 1);
  });
  it('is halved where the parameter must not be negative', () => {
    expect(oneSidedGain({ mean: 1, variance: 2 })).toEqual({ mean: 0.5, variance: 1.25 });
  });
});

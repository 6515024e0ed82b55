import { describe, expect, it } from 'vitest';
import { dOptimalPair } from '../../../../src/kinetics/planning/dOptimalPair';

describe('the two times that determine two parameters best', () => {
  it('are 1.23 and 6.86 for two first-order steps with 0.7 and 0.2', () => {
    // Box & Lucas, Biometrika 1959, 46, 77: η = θ₁/(θ₁ − θ₂) (e^(−θ₂t) − e^(−θ₁t)), θ = (0.7, 0.2).
    const response = (a: number, b: number, t: number) =>
      (a / (a - b)) * (Math.exp(-b * t) - Math.exp(-a * t));
    const h = 1e-5;
    const gradient = (t: number): [number, number] => [
      (response(0.7 + h, 0.2, t) - response(0.7 - h, 0.2, t)) / (2 * h),
      (response(0.7, 0.2 + h, t) - response(0.7, 0.2 - h, t)) / (2 * h),
    ];
    const [early, late] = dOptimalPair(gradient, [0, 20])!;
    expect(early).toBeCloseTo(1.23, 2);
    expect(late).toBeCloseTo(6.86, 2);
  });

  it('are both ends of the range for a straight line', () => {
    expect(dOptimalPair((t) => [1, t], [2, 9])).toEqual([2, 9]);
  });

  it('do not exist where both parameters do the same', () => {
    expect(dOptimalPair((t) => [t, t], [0, 1])).toBeNull();
  });
});

import { describe, expect, it } from 'vitest';
import {
  aicc,
  akaikeWeights,
  evidenceRatio,
} from '../../../../src/kinetics/statistics/goodnessOfFit';
import { runsProbabilities, runsTest } from '../../../../src/kinetics/statistics/runsTest';
import { incompleteBeta, lnGamma } from '../../../../src/kinetics/statistics/specialFunctions';
import {
  fUpperTail,
  intervalFactor,
  studentTQuantile,
  studentTUpperTail,
} from '../../../../src/kinetics/statistics/tDistribution';
import { estimate, logEstimate } from '../../../../src/kinetics/statistics/estimate';
import { linearTrend } from '../../../../src/kinetics/statistics/linearTrend';

describe('Student t (values by mpmath, 13 digits)', () => {
  it.each([
    [1, 12.70620473617],
    [2, 4.302652729749],
    [3, 3.182446305284],
    [4, 2.776445105198],
    [6, 2.446911851145],
    [10, 2.228138851986],
    [20, 2.085963447266],
    [58, 2.001717484145],
  ])('with %i degrees of freedom leaves 2.5 %% above %d', (dof, t) => {
    expect(Math.abs(intervalFactor(dof) / t - 1)).toBeLessThan(1e-11);
    expect(studentTUpperTail(t, dof)).toBeCloseTo(0.025, 12);
  });

  it('tails mirror each other and refuse what is no probability', () => {
    expect(studentTUpperTail(-1.3, 7) + studentTUpperTail(1.3, 7)).toBeCloseTo(1, 14);
    expect(studentTUpperTail(Infinity, 3)).toBe(0);
    expect(studentTUpperTail(-Infinity, 3)).toBe(1);
    expect(() => studentTQuantile(0.7, 3)).toThrow(RangeError);
    expect(() => studentTQuantile(0.1, 0)).toThrow('degrees of freedom must be above 0, got 0');
  });

  it('squares to F with one degree of freedom', () => {
    expect(fUpperTail(2.776445105198 ** 2, 1, 4)).toBeCloseTo(0.05, 12);
    expect(fUpperTail(0, 1, 4)).toBe(1);
    expect(fUpperTail(Infinity, 1, 4)).toBe(0);
  });
});

describe('special functions (closed forms)', () => {
  it('ln Γ of whole and half numbers', () => {
    expect(lnGamma(10)).toBeCloseTo(Math.log(362880), 12);
    expect(lnGamma(0.5)).toBeCloseTo(0.5 * Math.log(Math.PI), 13);
  });
  it('incomplete beta: I_x(1,1) = x and I_x(2,1) = x²', () => {
    expect(incompleteBeta(0.3, 1, 1)).toBeCloseTo(0.3, 14);
    expect(incompleteBeta(0.3, 2, 1)).toBeCloseTo(0.09, 14);
    expect(incompleteBeta(-1, 2, 1)).toBe(0);
    expect(incompleteBeta(2, 2, 1)).toBe(1);
  });
});

describe('AICc (Hurvich & Tsai 1989, by mpmath)', () => {
  it('of 20 readings and two parameters', () => {
    expect(aicc(20, 0.5, 2)).toBeCloseTo(-66.27758908228, 10);
    expect(aicc(20, 0.8, 2)).toBeCloseTo(-56.87751649736, 10);
    const [better, worse] = [aicc(20, 0.5, 2)!, aicc(20, 0.8, 2)!];
    expect(evidenceRatio(better, worse)).toBeCloseTo(109.9511627776, 8);
    expect(akaikeWeights([better, worse])[0]).toBeCloseTo(0.9909870255077, 12);
  });
  it('charges 12 for 8 readings and K = 3, 21.33 for K = 4', () => {
    expect(aicc(8, 8, 2)).toBeCloseTo(12, 12);
    expect(aicc(8, 8, 3)).toBeCloseTo(21.33333333333, 10);
  });
  it('does not exist for an exact fit or below K + 2 readings', () => {
    expect(aicc(20, 0, 2)).toBeNull();
    expect(aicc(4, 1, 2)).toBeNull();
    expect(aicc(5, 1, 2)).not.toBeNull();
  });
  it('gives an exact fit all the weight', () => {
    expect(akaikeWeights([-Infinity, -50])).toEqual([1, 0]);
    expect(evidenceRatio(-Infinity, -Infinity)).toBe(1);
  });
});

describe('runs test (Wald & Wolfowitz 1940, by mpmath)', () => {
  const test = runsProbabilities(6, 12, 10);
  it('mean, variance and exact lower tail of 6 runs in 12 + 10', () => {
    expect(test.mean).toBeCloseTo(11.90909090909, 10);
    expect(test.variance).toBeCloseTo(5.147579693034, 10);
    expect(test.lower).toBeCloseTo(0.00784200319804, 12);
  });
  it('counts all runs between 2 and the most possible', () => {
    expect(runsProbabilities(21, 12, 10).lower).toBeCloseTo(1, 10);
  });
  it('needs both signs and eight residuals', () => {
    expect(runsTest([1, 1, 1, 1, 1, 1, 1, 1])).toBeNull();
    expect(runsTest([1, -1, 1])).toBeNull();
    expect(runsTest([1, 1, 1, 1, -1, -1, -1, -1])!.runs).toBe(2);
  });
});

describe('intervals', () => {
  it('on the logarithm stay positive (k = 0.01, se 0.001, 18 degrees of freedom, by mpmath)', () => {
    const k = logEstimate(Math.log(0.01), 0.1, 18)!;
    expect(k.low).toBeCloseTo(0.008105095102864, 12);
    expect(k.high).toBeCloseTo(0.01233791815283, 12);
  });
  it('are null without an error or degrees of freedom, never NaN', () => {
    expect(estimate(1, null, 5)).toEqual({ value: 1, se: null, low: null, high: null });
    expect(estimate(1, 0.1, 0)).toEqual({ value: 1, se: 0.1, low: null, high: null });
    expect(estimate(NaN, 0.1, 5)).toBeNull();
    expect(logEstimate(800, 0.1, 5)).toBeNull();
    expect(logEstimate(0, null, 5)!.low).toBeNull();
  });
});

describe('straight line', () => {
  it('refuses one x and unequal lengths', () => {
    expect(() => linearTrend([1, 1], [1, 2])).toThrow(RangeError);
    expect(() => linearTrend([1, 2], [1])).toThrow('x and y must have one length, got 2 and 1');
  });
});

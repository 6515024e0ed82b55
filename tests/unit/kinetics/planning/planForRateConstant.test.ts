import { describe, expect, it } from 'vitest';
import { analyseWell } from '../../../../src/kinetics';
import { firstOrder } from '../../../../src/kinetics/rateLaws/firstOrder';
import { secondOrder } from '../../../../src/kinetics/rateLaws/secondOrder';
import { expectedReading, type ExpectedCurve } from '../../../../src/kinetics/planning/plannedWell';
import { planForRateConstant } from '../../../../src/kinetics/planning/planForRateConstant';
import { intervalFactor } from '../../../../src/kinetics/statistics/tDistribution';
import { decaySeries, seededNormal } from '../../../fixtures/decaySeries';

const limits = { shortestIntervalS: 30 };
const curveOf = (given: Partial<ExpectedCurve> = {}): ExpectedCurve => ({
  law: firstOrder,
  kind: 'reactant',
  amplitude: 0.01,
  kRel: 1 / 3600,
  originS: 0,
  residualSd: 2e-4,
  ...given,
});

describe('readings for a rate constant', () => {
  it('lie at the start and at 1/k for first order', () => {
    // C0 e^(−kt) enters by e^(−kt) and −C0 t e^(−kt): |det J| = C0 t e^(−kt) with one reading at 0,
    // largest at t = 1/k; the criterion is that of Box & Lucas, Biometrika 1959, 46, 77.
    const plan = planForRateConstant(curveOf(), 12, 0, 20_000, limits)!;
    expect(plan.pointsS[0]).toBe(0);
    expect(plan.pointsS[1]! / 3600).toBeCloseTo(1, 3);
    expect(plan.conversion).toBeCloseTo(1 - Math.exp(-1), 3);
  });

  it('lie at the start and at half conversion for second order', () => {
    // u g² with g = 1/(1 + u) is largest at u = 1.
    const plan = planForRateConstant(curveOf({ law: secondOrder }), 12, 0, 20_000, limits)!;
    expect(plan.pointsS[0]).toBe(0);
    expect(plan.pointsS[1]! / 3600).toBeCloseTo(1, 3);
    expect(plan.conversion).toBeCloseTo(0.5, 3);
  });

  it('lie at 1/k alone for conversion, whose start is known', () => {
    const plan = planForRateConstant(
      curveOf({ kind: 'conversion', amplitude: 1, residualSd: 0.02 }),
      8,
      0,
      20_000,
      limits,
    )!;
    expect(plan.pointsS).toEqual([3600]);
  });

  it('stop at the end of the run for product', () => {
    const plan = planForRateConstant(curveOf({ kind: 'product' }), 12, 0, 10_800, limits)!;
    expect(plan.pointsS[1]).toBe(10_800);
  });

  it('give the interval that the engine then reports', () => {
    const curve = curveOf();
    const plan = planForRateConstant(curve, 12, 0, 20_000, limits)!;
    const normal = seededNormal(9);
    const widths = Array.from({ length: 200 }, () => {
      const values = plan.timesS.map((t) => expectedReading(curve, t) + 2e-4 * normal());
      const fit = analyseWell(decaySeries({ timesS: plan.timesS, values })).analysis.fits.first!;
      return (intervalFactor(fit.dof) * fit.kRelSe!) / fit.kRel!;
    });
    const mean = widths.reduce((sum, width) => sum + width, 0) / widths.length;
    expect(mean / plan.relativeHalfWidth).toBeGreaterThan(0.93);
    expect(mean / plan.relativeHalfWidth).toBeLessThan(1.07);
  });

  it('say how many would reach the target', () => {
    const noisy = planForRateConstant(curveOf({ residualSd: 1e-3 }), 12, 0, 20_000, limits, 0.1)!;
    expect(noisy.relativeHalfWidth).toBeGreaterThan(0.1);
    const more = planForRateConstant(
      curveOf({ residualSd: 1e-3 }),
      noisy.readingsForTarget,
      0,
      20_000,
      limits,
      0.1,
    )!;
    expect(more.relativeHalfWidth).toBeLessThanOrEqual(0.1);
  });
});

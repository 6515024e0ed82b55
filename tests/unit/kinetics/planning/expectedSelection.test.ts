import { describe, expect, it } from 'vitest';
import { analyseWell } from '../../../../src/kinetics';
import { firstOrder } from '../../../../src/kinetics/rateLaws/firstOrder';
import { secondOrder } from '../../../../src/kinetics/rateLaws/secondOrder';
import { zerothOrder } from '../../../../src/kinetics/rateLaws/zerothOrder';
import { expectedOrderSe } from '../../../../src/kinetics/planning/expectedOrderSe';
import { expectedSelection } from '../../../../src/kinetics/planning/expectedSelection';
import { expectedReading, type ExpectedCurve } from '../../../../src/kinetics/planning/plannedWell';
import { decaySeries, seededNormal, times } from '../../../fixtures/decaySeries';

const curveOf = (given: Partial<ExpectedCurve>): ExpectedCurve => ({
  law: firstOrder,
  kind: 'reactant',
  amplitude: 0.01,
  kRel: 1 / 3600,
  originS: 0,
  residualSd: 1e-4,
  ...given,
});

const simulate = (curve: ExpectedCurve, timesS: number[], runs: number, seed: number) => {
  const normal = seededNormal(seed);
  return Array.from({ length: runs }, () =>
    analyseWell(
      decaySeries({
        kind: curve.kind,
        timesS,
        values: timesS.map((t) => expectedReading(curve, t) + curve.residualSd * normal()),
      }),
    ),
  );
};

describe('the free order expected of a design', () => {
  it.each([
    ['first', firstOrder, 'reactant'],
    ['second', secondOrder, 'reactant'],
    ['second', secondOrder, 'product'],
    ['first', firstOrder, 'conversion'],
  ] as const)('scatters as that of 300 runs: %s order', (_, law, kind) => {
    const scale = kind === 'conversion' ? 100 : 1;
    const curve = curveOf({
      law,
      kind,
      amplitude: 0.01 * scale,
      residualSd: 5e-5 * scale,
    });
    const timesS = times(16, 10_800);
    const orders = simulate(curve, timesS, 300, 5).flatMap(({ freeOrder }) =>
      freeOrder === null ? [] : [freeOrder.order],
    );
    const mean = orders.reduce((sum, order) => sum + order, 0) / orders.length;
    const sd = Math.sqrt(
      orders.reduce((sum, order) => sum + (order - mean) ** 2, 0) / (orders.length - 1),
    );
    // The standard error of a standard deviation from 300 runs is 4 %.
    expect(sd / expectedOrderSe(curve, timesS)!).toBeGreaterThan(0.85);
    expect(sd / expectedOrderSe(curve, timesS)!).toBeLessThan(1.18);
  });

  it('is not there where the readings cannot hold it', () => {
    expect(expectedOrderSe(curveOf({}), [0, 1800])).toBeNull();
  });
});

describe('the verdict expected of a design', () => {
  const share = (curve: ExpectedCurve, timesS: number[]) => {
    const runs = simulate(curve, timesS, 200, 11);
    return runs.filter(({ analysis }) => analysis.verdict === curve.law.name).length / runs.length;
  };

  it.each([
    ['zero', zerothOrder, 0.7],
    ['first', firstOrder, 1.2],
    ['second', secondOrder, 4],
  ] as const)('is reached by most runs where it settles: %s order', (_, law, reach) => {
    const curve = curveOf({ law });
    let timesS = times(12, reach * 3600);
    while (!expectedSelection(curve, timesS).settles) {
      timesS = timesS.map((t) => t * 1.1);
      expect(timesS[11]!).toBeLessThan(40 * 3600);
    }
    expect(share(curve, timesS)).toBeGreaterThan(0.75);
  });

  it('is not reached by a short run, nor expected of it', () => {
    const curve = curveOf({});
    const timesS = times(12, 900);
    expect(expectedSelection(curve, timesS).settles).toBe(false);
    expect(share(curve, timesS)).toBeLessThan(0.2);
  });

  it('weighs the best-fitting rival: its ratio is that of the mean sums of squares of runs', () => {
    // T-optimality by brute force: the rival's mean RSS exceeds the true law's by σ²λ.
    const curve = curveOf({ law: secondOrder });
    const timesS = times(12, 7200);
    const runs = simulate(curve, timesS, 400, 3);
    const excess =
      runs.reduce(
        (sum, { analysis }) => sum + analysis.fits.first!.rss - analysis.fits.second!.rss,
        0,
      ) / runs.length;
    const lambda = excess / curve.residualSd ** 2;
    const left = lambda - 2 * 1.28 * Math.sqrt(lambda);
    const brute = 6 * Math.log1p(left / 10);
    expect(Math.log(expectedSelection(curve, timesS).evidenceRatio) / brute).toBeCloseTo(1, 1);
  });
});

import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import {
  calibrationWells,
  coverCatalysts,
  coverForced,
  PROMISED_PLANS,
} from '../../../src/calibration/calibrate';
import { judgeWell, rateVerdicts, type VerdictRates } from '../../../src/calibration/judgeWells';
import type { SimulatedWell } from '../../../src/calibration/simulateWells';
import { reachOf, trueCurve, TRUTHS } from '../../../src/calibration/truths';

const reference = JSON.parse(
  readFileSync(new URL('../../reference/openWells.json', import.meta.url), 'utf8'),
) as { source: string; wells: SimulatedWell[] };

function expectSafe(rates: VerdictRates) {
  expect(rates.otherSimpleOrder).toBeLessThanOrEqual(0.005);
  expect(rates.right).toBeGreaterThanOrEqual(0.35);
  expect(rates.rightOfGood).toBeGreaterThanOrEqual(0.9);
  expect(rates.wrongOrders).toBeLessThanOrEqual(0.05);
  expect(rates.wrongOrdersBesideLimits).toBeLessThanOrEqual(0.02);
  expect(rates.wrongSaturating).toBeLessThanOrEqual(0.02);
  expect(rates.deadKept).toBeGreaterThanOrEqual(0.98);
}

describe('verdicts on wells of seven truths', { timeout: 60_000 }, () => {
  it('are right or silent on wells simulated elsewhere', () => {
    expectSafe(rateVerdicts(reference.wells.map(judgeWell)));
  });
  it('are right or silent on our own, of wider ranges', () => {
    expectSafe(rateVerdicts(calibrationWells(2000).map(judgeWell)));
  });
});

describe('intervals', { timeout: 60_000 }, () => {
  // 94 to 96 %, and what 2,000 wells scatter (two standard errors, 1 %).
  it('of k hold it in 95 of 100 wells, the true law forced', () => {
    for (const share of Object.values(coverForced(2000))) {
      expect(share).toBeGreaterThanOrEqual(0.93);
      expect(share).toBeLessThanOrEqual(0.97);
    }
  });
  it('of Ea hold it in 93 to 97 of 100 catalysts', () => {
    for (const plan of PROMISED_PLANS) {
      const covered = coverCatalysts(plan, 600);
      expect(covered.activationEnergy, plan.name).toBeGreaterThanOrEqual(0.93);
      expect(covered.activationEnergy, plan.name).toBeLessThanOrEqual(0.975);
      expect(covered.wrong, plan.name).toBeLessThanOrEqual(0.005);
      expect(covered.curvatureAlarms, plan.name).toBeLessThanOrEqual(0.06);
    }
  });
});

describe('simulated curves', () => {
  it('follow their differential equations', () => {
    const shape = { load: 3, level: 0.2, decay: 0.5 };
    for (const truth of TRUTHS) {
      if (truth === 'none') continue;
      const curve = trueCurve(truth, shape);
      const relative = (u: number) => curve.relative(u);
      const slope = (u: number) => (relative(u + 1e-5) - relative(u - 1e-5)) / 2e-5;
      const expected: Record<string, (u: number) => number> = {
        zero: () => -1,
        first: (u) => -relative(u),
        second: (u) => -(relative(u) ** 2),
        saturating: (u) => (-4 * relative(u)) / (1 + 3 * relative(u)),
        plateau: (u) => -(relative(u) - 0.2),
        deactivating: (u) => -relative(u) * Math.exp(-0.5 * u),
      };
      for (const u of [0.1, 0.5, 0.9]) {
        expect(slope(u), truth).toBeCloseTo(expected[truth]!(u), 6);
      }
    }
  });
  it('know when they never get there', () => {
    expect(reachOf(trueCurve('plateau', { load: 1, level: 0.4, decay: 1 }), 0.7)).toBeNull();
  });
});

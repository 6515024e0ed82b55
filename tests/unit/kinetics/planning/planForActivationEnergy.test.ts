import { describe, expect, it } from 'vitest';
import { activationEnergyOf, fitArrhenius } from '../../../../src/kinetics/catalyst/fitArrhenius';
import { discriminatingTemperature } from '../../../../src/kinetics/planning/discriminatingTemperature';
import {
  expectedHalfWidth,
  planForActivationEnergy,
} from '../../../../src/kinetics/planning/planForActivationEnergy';
import type { ArrheniusPoint } from '../../../../src/kinetics';
import { seededNormal } from '../../../fixtures/decaySeries';

const R = 8.31446261815324;

/** Wells on a line of 60 kJ/mol with scatter between plate runs and between wells. */
function points(temperaturesK: number[], wells: number, run: number, well: number, seed: number) {
  const normal = seededNormal(seed);
  return temperaturesK.flatMap((temperatureK, block): ArrheniusPoint[] => {
    const shift = run * normal();
    return Array.from({ length: wells }, (_, i) => ({
      seriesId: `${block}-${i}`,
      temperatureK,
      lnK: 10 - 60_000 / (R * temperatureK) + shift + well * normal(),
      se: well,
      block: `run ${block}`,
    }));
  });
}

describe('runs for an activation energy', () => {
  it('are expected to give t R / √Σ(1/T − mean)² times the error of one run', () => {
    // Straight line through four single wells of equal error, by hand: t(2; 0.975) = 4.302652730,
    // Student's table (NIST/SEMATECH e-Handbook, 1.3.6.7.2).
    const x = [313, 323, 333].map((t) => 1 / t);
    const added = 1 / 343;
    const mean = (x[0]! + x[1]! + x[2]! + added) / 4;
    const sum = [...x, added].reduce((s, one) => s + (one - mean) ** 2, 0);
    const by = (4.30265273 * R * 0.05) / Math.sqrt(sum);
    const found = expectedHalfWidth(
      x.map((one) => ({ x: one, variance: 0.0025 })),
      3,
      { temperaturesK: [343], replicates: 1 },
      { wellVariance: 0.0025, runVariance: 0 },
    );
    expect(found! / by).toBeCloseTo(1, 8);
  });

  it('are at the ends of the range, with the interval that the engine then reports', () => {
    // Wells on the line, so that their stated errors are all the scatter there is.
    const exact = (temperaturesK: number[], wells: number, name: string) =>
      points(temperaturesK, wells, 0, 0, 1).map((point) => ({
        ...point,
        se: 0.06,
        block: `${name} ${point.block}`,
      }));
    const measured = exact([323.15, 333.15, 343.15], 2, 'measured');
    const plan = planForActivationEnergy(fitArrhenius(measured)!, [303.15, 363.15], 8000)!;
    expect(plan.reachesTarget).toBe(true);
    for (const t of plan.temperaturesK) expect([303.15, 363.15]).toContain(t);

    const joined = [...measured, ...exact(plan.temperaturesK, plan.replicates, 'added')];
    const { low, value } = activationEnergyOf(fitArrhenius(joined)!)!;
    expect((value - low!) / plan.halfWidth).toBeCloseTo(1, 6);
    expect(plan.halfWidth).toBeLessThanOrEqual(8000);
  });

  it('ask for more plate runs, not wells, where runs scatter', () => {
    const line = fitArrhenius(points([313.15, 333.15, 353.15], 4, 0.25, 0.01, 12))!;
    expect(line.tau).toBeGreaterThan(0.02);
    const plan = planForActivationEnergy(line, [303.15, 363.15], 100)!;
    expect(plan.reachesTarget).toBe(false);
    expect(plan.temperaturesK).toHaveLength(4);
  });

  it('never leave fewer than three temperatures', () => {
    const line = fitArrhenius(points([313.15, 343.15], 3, 0, 0.03, 3))!;
    const plan = planForActivationEnergy(line, [313.15, 343.15])!;
    expect(plan.temperaturesK.some((t) => t > 315 && t < 341)).toBe(true);
  });
});

describe('the temperature that stands in for a longer run', () => {
  it('makes the rate as many times as large', () => {
    const line = { activationEnergy: 60_000 };
    const hotter = discriminatingTemperature(line, 333.15, 3, [300, 400])!;
    expect(Math.exp((-60_000 / R) * (1 / hotter - 1 / 333.15))).toBeCloseTo(3, 10);
  });

  it('is none outside the range, or without a line that rises', () => {
    expect(discriminatingTemperature({ activationEnergy: 60_000 }, 333, 3, [300, 340])).toBeNull();
    expect(discriminatingTemperature({ activationEnergy: -5000 }, 333, 3, [300, 400])).toBeNull();
    expect(discriminatingTemperature(null, 333, 3, [300, 400])).toBeNull();
  });
});

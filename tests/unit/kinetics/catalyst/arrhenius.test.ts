import { describe, expect, it } from 'vitest';
import { GAS_CONSTANT } from '../../../../src/kinetics';
import {
  aboutMean,
  betweenVariance,
  momentVariance,
  weightedMean,
} from '../../../../src/kinetics/catalyst/betweenVariance';
import { testCurvature } from '../../../../src/kinetics/catalyst/curvature';
import {
  activationEnergyOf,
  fitArrhenius,
  lnPreExponentialOf,
  lnRateConstantAt,
} from '../../../../src/kinetics/catalyst/fitArrhenius';
import { countTemperatures, setTemperatures } from '../../../../src/kinetics/catalyst/temperatures';
import { lineThrough } from '../../../../src/kinetics/catalyst/weightedLine';
import type { ArrheniusPoint } from '../../../../src/kinetics/types';
import { seededNormal, sharedDigits } from '../../../fixtures/decaySeries';
import reference from '../../../reference/simulatedArrhenius.json';

type Triple = [number, number, number];
const tripled = reference.catalysts.map(
  (catalyst) => [catalyst.id, catalyst, catalyst.points as Triple[]] as const,
);

const point = (temperatureK: number, lnK: number, se: number, block = ''): ArrheniusPoint => ({
  seriesId: '',
  temperatureK,
  lnK,
  se,
  block,
});

describe('weighted line against statsmodels and mpmath', () => {
  it.each(tripled)('%s: OLS and WLS values and errors', (_, { expected }, points) => {
    const x = points.map(([t]) => 1 / t);
    const y = points.map(([, k]) => Math.log(k));
    for (const [name, weights] of [
      ['OLS', points.map(() => 1)],
      ['WLS', points.map(([, k, se]) => 1 / (se / k) ** 2)],
    ] as const) {
      const line = lineThrough(x, y, weights);
      const want = expected[name];
      expect(sharedDigits(-GAS_CONSTANT * line.slope, want.Ea)).toBeGreaterThan(9);
      expect(sharedDigits(line.level - line.slope * line.centre, want.lnA)).toBeGreaterThan(8);
      expect(sharedDigits(line.chi2, want.chi2)).toBeGreaterThan(7);
      expect(sharedDigits(1 / line.centre, want.T_harmonic)).toBeGreaterThan(11);
      const known = GAS_CONSTANT * Math.sqrt(line.slopeVariance);
      expect(sharedDigits(known, want.se_Ea_known)).toBeGreaterThan(9);
      const scaled = known * Math.sqrt(line.chi2 / line.dof);
      expect(sharedDigits(scaled, want.se_Ea_scaled)).toBeGreaterThan(7);
    }
  });

  const bendable = tripled.filter(([, { curvature }]) => curvature !== null);

  it.each(bendable)('%s: t test of the quadratic, unweighted', (_, { curvature }, points) => {
    // One block for each well and equal errors: no replicate term, so plain least squares.
    const test = testCurvature(points.map(([t, k], i) => point(t, Math.log(k), 0.1, `${i}`)))!;
    const want = curvature!;
    expect(test.dof).toBe(want.dof);
    expect(Math.sqrt(test.f)).toBeCloseTo(Math.abs(want.t), 4);
    expect(test.p).toBeCloseTo(want.p, 5);
  });

  it('Thm of 300, 320, 340, 360 K and its error of Ea (mpmath)', () => {
    const x = [300, 320, 340, 360].map((t) => 1 / t);
    const line = lineThrough(x, [0, 0, 0, 0], [400, 400, 400, 400]);
    expect(1 / line.centre).toBeCloseTo(328.4803757128, 9);
    expect(GAS_CONSTANT * Math.sqrt(line.slopeVariance)).toBeCloseTo(1003.210546202, 5);
  });
});

describe('between-block variance', () => {
  const y = [-3.1, -3.05, -2.8, -3.4];
  const v = [0.05, 0.08, 0.06, 0.1].map((se) => se * se);

  it('by moments agrees with DerSimonian & Laird 1986 (mpmath)', () => {
    const w = v.map((value) => 1 / value);
    expect(weightedMean(y, w)).toBeCloseTo(-3.034535315985, 11);
    expect(aboutMean(y, w)).toBeCloseTo(30.38773234201, 9);
    const tau2 = momentVariance(y, v);
    expect(tau2).toBeCloseTo(0.0425757050393, 12);
    const random = v.map((value) => 1 / (value + tau2));
    expect(weightedMean(y, random)).toBeCloseTo(-3.078244664165, 11);
    expect(Math.sqrt(1 / random.reduce((sum, one) => sum + one, 0))).toBeCloseTo(
      0.1095797216045,
      12,
    );
  });
  it('iterated, brings Q to its degrees of freedom', () => {
    const tau2 = betweenVariance((w) => aboutMean(y, w), v, 3);
    expect(
      aboutMean(
        y,
        v.map((value) => 1 / (value + tau2)),
      ),
    ).toBeCloseTo(3, 6);
  });
  it('is 0 where values scatter no more than their errors', () => {
    expect(betweenVariance((w) => aboutMean([1, 1.01], w), [1, 1], 1)).toBe(0);
    expect(betweenVariance(() => 5, [1], 0)).toBe(0);
  });
});

describe('Arrhenius line', () => {
  const exact = (t: number) => 12 - 60_000 / (GAS_CONSTANT * t);

  it('finds Ea, ln A and k anywhere on a straight line', () => {
    const line = fitArrhenius([310, 325, 340, 355].map((t) => point(t, exact(t), 0.02)))!;
    expect(activationEnergyOf(line)!.value).toBeCloseTo(60_000, 5);
    expect(lnPreExponentialOf(line)!.value).toBeCloseTo(12, 8);
    expect(lnRateConstantAt(line, 400).lnK).toBeCloseTo(exact(400), 9);
    expect(line.tau).toBe(0);
  });

  it('its band is narrowest at the centre', () => {
    const line = fitArrhenius([310, 325, 340, 355].map((t) => point(t, exact(t), 0.02)))!;
    const centre = lnRateConstantAt(line, line.centreK).se!;
    expect(lnRateConstantAt(line, line.centreK + 20).se).toBeGreaterThan(centre);
    expect(lnRateConstantAt(line, line.centreK - 20).se).toBeGreaterThan(centre);
  });

  it('needs two temperatures, and three for an interval', () => {
    expect(fitArrhenius([point(310, -9, 0.1), point(310.4, -9, 0.1)])).toBeNull();
    const two = fitArrhenius([310, 340].map((t) => point(t, exact(t), 0.02)))!;
    expect(activationEnergyOf(two)).toMatchObject({ se: null, low: null, high: null });
    expect(two.activationEnergy).toBeCloseTo(60_000, 5);
  });

  it('blocks that scatter widen the interval beyond the fit errors', () => {
    const shifted = [310, 325, 340, 355].map((t, i) =>
      point(t, exact(t) + (i % 2 ? 0.2 : -0.2), 0.01),
    );
    const line = fitArrhenius(shifted)!;
    expect(line.tau).toBeGreaterThan(0.1);
    expect(line.dof).toBe(2);
  });

  it.each([
    ['replicates scatter', 4, 2, 0, 0.1],
    ['blocks share an error', 4, 2, 0.08, 0.05],
    ['five temperatures, blocks', 5, 2, 0.08, 0.05],
    ['six temperatures, triplicates', 6, 3, 0, 0.08],
  ] as const)(
    'Ea is covered at 93 to 98.5 %% when %s',
    (_, temperatures, replicates, block, replicate) => {
      const normal = seededNormal(20261201);
      let covered = 0;
      const runs = 1500;
      for (let run = 0; run < runs; run += 1) {
        const points: ArrheniusPoint[] = [];
        for (let i = 0; i < temperatures; i += 1) {
          const t = 310 + 15 * i;
          const shared = block * normal();
          for (let r = 0; r < replicates; r += 1) {
            const noise = shared + replicate * normal() + 0.03 * normal();
            points.push(point(t, exact(t) + noise, 0.03, `${i}`));
          }
        }
        const energy = activationEnergyOf(fitArrhenius(points)!)!;
        if (energy.low! <= 60_000 && 60_000 <= energy.high!) covered += 1;
      }
      expect(covered / runs).toBeGreaterThanOrEqual(0.93);
      expect(covered / runs).toBeLessThanOrEqual(0.985);
    },
  );
});

describe('curvature', () => {
  it('a bend is found, a straight line is not bent', () => {
    const temperatures = [300, 315, 330, 345, 360, 375];
    const normal = seededNormal(3);
    const at = (t: number) => 10 - 50_000 / (GAS_CONSTANT * t) + 0.01 * normal();
    expect(testCurvature(temperatures.map((t) => point(t, at(t), 0.02, `${t}`)))!.curved).toBe(
      false,
    );
    const bent = temperatures.map((t) => point(t, Math.min(at(t), at(335)), 0.02, `${t}`));
    expect(testCurvature(bent)!.curved).toBe(true);
  });
  it('needs three temperatures and a degree of freedom', () => {
    expect(testCurvature([300, 310, 320].map((t) => point(t, 0, 0.1)))).toBeNull();
    expect(testCurvature([300, 300, 320, 320].map((t) => point(t, 0, 0.1)))).toBeNull();
  });
});

describe('set temperatures', () => {
  it('measured temperatures within 1.5 K were set to one', () => {
    expect(setTemperatures([333.4, 313.1, 313.4, 332.9])).toEqual([1, 0, 0, 1]);
    expect(countTemperatures([333.4, 313.1, 313.4, 332.9])).toBe(2);
    expect(countTemperatures([])).toBe(0);
  });
});

import { describe, expect, it } from 'vitest';
import { analyseCatalyst, analyseWell, type DecaySeries } from '../../../../src/kinetics';
import { fitOneStep } from '../../../../src/kinetics/catalyst/fitOneStep';
import { relativeOfOrder } from '../../../../src/kinetics/rateLaws/apparentOrder';
import { saturatingShape } from '../../../../src/kinetics/rateLaws/saturating';
import { decaySeries, seededNormal } from '../../../fixtures/decaySeries';

const R = 8.31446261815324;
const temperaturesK = [318, 330, 343, 357];
const energy = 55_000;
const kAt335 = 8e-4;
const c0 = 0.01;
const reference = {
  temperatureK: 335,
  concentration: c0,
  loadingGPerL: 2,
  targetConversion: 0.9,
};

interface Truth {
  order?: number;
  kind?: DecaySeries['kind'];
  /** Share of C0, in turn over the wells. */
  noises?: number[];
  /** ln k of a replicate beyond its readings. */
  replicate?: number;
  /** K, shared by a plate run. */
  run?: number;
  temperaturesK?: number[];
  off?: (well: number) => number;
}

/** Two wells at each temperature, kRel so that k C0^(n−1) is `kAt335` at 335 K. */
function catalyst(truth: Truth, seed: number): DecaySeries[] {
  const normal = seededNormal(seed);
  const { order = 1, kind = 'reactant', noises = [0.02], replicate = 0, run = 0 } = truth;
  const rate = (t: number) => kAt335 * Math.exp((-energy / R) * (1 / t - 1 / 335));
  return (truth.temperaturesK ?? temperaturesK).flatMap((temperatureK, b) => {
    const actual = temperatureK + run * normal();
    return [0, 1].map((r) => {
      const well = 2 * b + r;
      const kRel = rate(actual) * Math.exp(replicate * normal()) * (truth.off?.(well) ?? 1);
      const timesS = Array.from({ length: 14 }, (_, i) => (i * 2.2) / 13 / rate(temperatureK));
      const noise = noises[well % noises.length]!;
      const values = timesS.map((time) => {
        const g = relativeOfOrder(order, kRel * time) + noise * normal();
        if (kind === 'conversion') return 1 - g;
        return kind === 'product' ? 2 * c0 * (1 - g) : kind === 'signal' ? 740 * g : c0 * g;
      });
      return decaySeries({
        id: `well-${well}`,
        block: `run-${b}`,
        temperatureK,
        timesS,
        values,
        kind,
        dimension: kind === 'conversion' || kind === 'signal' ? 'ratio' : 'concentration',
        initialConcentration: kind === 'conversion' ? c0 : null,
        productPerReactant: kind === 'product' ? 2 : 1,
        loadingGPerL: 2,
        law: { order },
      });
    });
  });
}

const analyse = (series: DecaySeries[]) =>
  analyseCatalyst('MB-07', series.map(analyseWell), reference);

describe('fitOneStep', () => {
  it.each([
    ['first order', { order: 1 }],
    ['second order', { order: 2 }],
    ['zero order that runs out', { order: 0, noises: [0.01] }],
    ['order 1.5', { order: 1.5 }],
    ['first order, product', { order: 1, kind: 'product' }],
    ['second order, conversion', { order: 2, kind: 'conversion' }],
    ['first order, signal', { order: 1, kind: 'signal' }],
  ] as [string, Truth][])('%s: finds the energy and k within four errors', (_, truth) => {
    const result = analyse(catalyst(truth, 11));
    const one = result.oneStep!;
    expect(one.wells).toBe(8);
    expect(one.readings).toBe(112);
    expect(one.disagreesWithTwoStep).toBe(false);
    const { value, se } = one.activationEnergy;
    expect(Math.abs(value - energy)).toBeLessThan(4 * se!);
    expect(se!).toBeLessThan(3000);
    const kRel = kAt335 * Math.exp((-energy / R) * (1 / one.centreK - 1 / 335));
    const order = truth.order ?? 1;
    const lnK = Math.log(kRel) + (1 - order) * Math.log(c0);
    expect(Math.abs(one.lnKc - lnK)).toBeLessThan(4 * one.lnKcSe! + 1e-3);
  });

  it('readings without noise give the energy to 6 digits', () => {
    const result = analyse(catalyst({ order: 2, noises: [0] }, 1));
    expect(result.oneStep!.activationEnergy.value).toBeCloseTo(energy, -1);
    expect(Math.abs(result.oneStep!.activationEnergy.value / energy - 1)).toBeLessThan(1e-6);
  });

  it('wells of another loading are brought to one', () => {
    // Half the catalyst takes twice the time.
    const series = catalyst({}, 5).map((one, i) =>
      i % 2 === 0 ? one : { ...one, loadingGPerL: 1, timesS: one.timesS.map((time) => 2 * time) },
    );
    const same = analyse(catalyst({}, 5)).oneStep!;
    const mixed = analyse(series).oneStep!;
    expect(mixed.activationEnergy.value).toBeCloseTo(same.activationEnergy.value, 3);
    expect(mixed.lnKc).toBeCloseTo(same.lnKc, 7);
  });

  it('a saturating law gives both energies', () => {
    const normal = seededNormal(3);
    const series = temperaturesK.flatMap((temperatureK) =>
      [0, 1].map((r) => {
        const x = (1 / temperatureK - 1 / 335) / R;
        const k = 5e-6 * Math.exp(-66_000 * x);
        const load = 250 * Math.exp(24_000 * x) * 0.02;
        const kRel = (k * load) / 0.02 / (1 + load);
        const shape = saturatingShape(load / (1 + load));
        const timesS = Array.from({ length: 24 }, (_, i) => (i * 2) / 23 / kRel);
        return decaySeries({
          id: `${temperatureK}-${r}`,
          block: `${temperatureK}`,
          temperatureK,
          timesS,
          values: timesS.map((time) => 0.02 * (shape.relative(kRel * time) + 0.003 * normal())),
          loadingGPerL: 2,
          law: 'saturating',
        });
      }),
    );
    const { oneStep, adsorption } = analyse(series);
    const one = oneStep!;
    expect(Math.abs(one.activationEnergy.value - 66_000)).toBeLessThan(
      4 * one.activationEnergy.se!,
    );
    const enthalpy = one.adsorptionEnthalpy!;
    expect(Math.abs(enthalpy.value + 24_000)).toBeLessThan(4 * enthalpy.se!);
    expect(Math.abs(enthalpy.value - adsorption!.enthalpy!.value)).toBeLessThan(4 * enthalpy.se!);
    expect(one.disagreesWithTwoStep).toBe(false);
  });

  it('has no interval with two temperatures and no answer with one', () => {
    const two = analyse(catalyst({ temperaturesK: [320, 350] }, 2)).oneStep!;
    expect(two.activationEnergy.low).toBeNull();
    expect(two.readingSe).toBeGreaterThan(0);
    expect(analyse(catalyst({ temperaturesK: [335] }, 2)).oneStep).toBeNull();
  });

  it('says when a few exact wells pull all readings off the line of the single wells', () => {
    const off = (well: number) => (well === 6 ? 1.5 : well === 0 ? 0.7 : 1);
    const noises = [0.0005, 0.02, 0.02, 0.02, 0.02, 0.02];
    const truth = { off, noises, temperaturesK: [318, 330, 343, 357, 364, 371, 378] };
    const result = analyse(catalyst(truth, 4));
    expect(result.oneStep!.disagreesWithTwoStep).toBe(true);
    expect(result.warnings).toContain('one-step-disagrees');
  });

  it('does not answer without a law', () => {
    const answer = {
      law: null,
      order: null,
      arrhenius: null,
      activationEnergy: null,
      kKnown: true,
    };
    expect(fitOneStep([], answer)).toBeNull();
  });
});

describe('the interval of the one-step energy', () => {
  const covered = (truth: Truth, runs: number) => {
    let [inside, alarms, inReadings] = [0, 0, 0];
    for (let seed = 1; seed <= runs; seed += 1) {
      const { oneStep } = analyse(catalyst(truth, seed));
      const { value, low, high } = oneStep!.activationEnergy;
      if (low! < energy && energy < high!) inside += 1;
      if (oneStep!.disagreesWithTwoStep) alarms += 1;
      if (Math.abs(value - energy) < 1.98 * oneStep!.readingSe!) inReadings += 1;
    }
    return {
      inside: inside / runs,
      alarms: alarms / runs,
      inReadings: inReadings / runs,
    };
  };

  // 200 runs: the standard error of a share of 0.95 is 0.015.
  it.each([
    ['readings alone', {}],
    ['wells of unlike noise', { noises: [0.005, 0.03] }],
    ['replicates that differ', { replicate: 0.03 }],
    ['runs 0.7 K off', { run: 0.7, noises: [0.005, 0.03] }],
  ] as [string, Truth][])('%s: holds the truth in 91 to 100 of 100', (_, truth) => {
    const { inside, alarms } = covered(truth, 200);
    expect(inside).toBeGreaterThan(0.91);
    expect(alarms).toBeLessThanOrEqual(0.03);
  });

  it('would be far too short from the readings alone where runs are 0.7 K off', () => {
    expect(covered({ run: 0.7 }, 100).inReadings).toBeLessThan(0.75);
  });
});

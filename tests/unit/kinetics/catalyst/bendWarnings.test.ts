import { describe, expect, it } from 'vitest';
import { analyseWell, GAS_CONSTANT as R, type ArrheniusPoint } from '../../../../src/kinetics';
import { bendWarnings } from '../../../../src/kinetics/catalyst/bendWarnings';
import { decaySeries, seededNormal } from '../../../fixtures/decaySeries';

const temperaturesK = [310, 322, 334, 346, 358, 370];

/** ln k by temperature, two wells at each, as points with 2 % errors and seeded scatter. */
function plot(lnK: (temperatureK: number) => number, seed = 1, run = 0): ArrheniusPoint[] {
  const normal = seededNormal(seed);
  return temperaturesK.flatMap((temperatureK, b) => {
    const actual = temperatureK + run * normal();
    return [0, 1].map((r) => ({
      seriesId: `${b}-${r}`,
      temperatureK,
      lnK: lnK(actual) + 0.02 * normal(),
      se: 0.02,
      block: `${b}`,
    }));
  });
}

const arrhenius = (energy: number, lnKAt340: number) => (t: number) =>
  lnKAt340 - (energy / R) * (1 / t - 1 / 340);
const chemistry = arrhenius(80_000, -7);

describe('bendWarnings', () => {
  it('a straight plot bends neither way', () => {
    expect(bendWarnings([], plot(chemistry))).toEqual([]);
  });

  it('supply through a film, in series with the reaction, bends down', () => {
    // Film transport in series: 1/k = 1/k_chem + 1/k_film, k_film nearly the same at all T.
    const film = arrhenius(5_000, -7.5);
    const lnK = (t: number) => -Math.log(Math.exp(-chemistry(t)) + Math.exp(-film(t)));
    expect(bendWarnings([], plot(lnK))).toContain('arrhenius-bends-down');
  });

  it('half the energy in the upper half speaks for diffusion in the pores', () => {
    // Thiele 1939: effectiveness tanh φ/φ of a slab, φ² in proportion to k.
    const lnK = (t: number) => {
      const thiele = Math.exp((chemistry(t) + 7) / 2) * 2.5;
      return chemistry(t) + Math.log(Math.tanh(thiele) / thiele);
    };
    const warnings = bendWarnings([], plot(lnK));
    expect(warnings).toContain('arrhenius-curved');
    expect(warnings).toContain('pore-diffusion');
  });

  it('a second path of higher energy bends up', () => {
    const lnK = (t: number) =>
      Math.log(Math.exp(arrhenius(30_000, -7)(t)) + Math.exp(arrhenius(120_000, -7)(t)));
    expect(bendWarnings([], plot(lnK))).toContain('arrhenius-bends-up');
  });

  it.each([0, 0.5])('calls at most 6 of 100 straight plots bent, runs %f K off', (run) => {
    let alarms = 0;
    for (let seed = 1; seed <= 500; seed += 1) {
      if (bendWarnings([], plot(chemistry, seed, run)).length > 0) alarms += 1;
    }
    expect(alarms / 500).toBeLessThanOrEqual(0.06);
  });
});

describe('hot wells that lose activity', () => {
  const well = (temperatureK: number, fading: number, seed: number) => {
    const normal = seededNormal(seed);
    const k = Math.exp(chemistry(temperatureK));
    const kd = fading * k;
    const timesS = Array.from({ length: 20 }, (_, i) => (i * 4) / 19 / k);
    // dC/dt = −k e^(−kd t) C.
    const age = (t: number) => (kd === 0 ? t : -Math.expm1(-kd * t) / kd);
    const values = timesS.map((t) => 0.01 * (Math.exp(-k * age(t)) + 0.01 * normal()));
    return { ...analyseWell(decaySeries({ temperatureK, timesS, values })), factor: 1 };
  };
  const wells = (fading: number, seed: number) =>
    [320, 335, 350].flatMap((t, b) =>
      [0, 1].map((r) => well(t, b === 2 ? fading : 0, 100 * seed + 2 * b + r)),
    );

  it('are told where only the hottest fade', () => {
    expect(bendWarnings(wells(0.6, 1), [])).toContain('hot-wells-deactivate');
  });

  it('are seldom seen where none does', () => {
    let alarms = 0;
    for (let seed = 1; seed <= 100; seed += 1) alarms += bendWarnings(wells(0, seed), []).length;
    expect(alarms).toBeLessThanOrEqual(3);
  });
});

import { describe, expect, it } from 'vitest';
import { analyseScreen, GAS_CONSTANT } from '../../../../src/kinetics';
import {
  compensationPlot,
  errorCorrelation,
  harmonicMeanK,
} from '../../../../src/kinetics/catalyst/compensation';
import { activationEnergyFrom, eyringRate } from '../../../../src/kinetics/catalyst/eyring';
import { decaySeries, seededNormal, sharedDigits, times } from '../../../fixtures/decaySeries';

describe('Eyring (by mpmath from the 1935 formula, 13 digits)', () => {
  it('k(300 K, 80 kJ/mol, −20 J/mol/K) = 6.642e-3 s⁻¹', () => {
    expect(sharedDigits(eyringRate(80_000, -20, 300), 0.006642181521299)).toBeGreaterThan(11);
  });
  it('Ea = ΔH‡ + RT', () => {
    expect(sharedDigits(activationEnergyFrom(80_000, 300), 82494.33878545)).toBeGreaterThan(11);
  });
  it('gives ΔH‡ and ΔS‡ back from wells, per site', () => {
    const sites = 0.05; // mol/kg; with 2.5 g/L 1.25e-4 mol/L
    const normal = seededNormal(5);
    const wells = [313.15, 323.15, 333.15, 343.15].flatMap((temperatureK) =>
      [1, 2].map((replicate) => {
        const k = eyringRate(72_000, -30, temperatureK) * 1.25e-4;
        const t = times(24, 1.6 / k);
        return decaySeries({
          id: `${temperatureK} ${replicate}`,
          temperatureK,
          loadingGPerL: 2.5,
          siteDensityMolPerKg: sites,
          timesS: t,
          values: t.map((time) => 0.01 * (Math.exp(-k * time) + 0.002 * normal())),
        });
      }),
    );
    const reference = {
      temperatureK: 333.15,
      concentration: 0.01,
      loadingGPerL: 2.5,
      targetConversion: 0.8,
    };
    const { eyring } = analyseScreen(wells, reference).catalysts[0]!;
    expect(eyring!.enthalpy.low!).toBeLessThan(72_000);
    expect(eyring!.enthalpy.high!).toBeGreaterThan(72_000);
    expect(eyring!.entropy.low!).toBeLessThan(-30);
    expect(eyring!.entropy.high!).toBeGreaterThan(-30);
    expect(eyring!.enthalpy.value / 72_000).toBeCloseTo(1, 1);
    const plain = wells.map((well) => ({ ...well, siteDensityMolPerKg: null }));
    expect(analyseScreen(plain, reference).catalysts[0]!.eyring).toBeNull();
  });
});

describe('Arrhenius (by mpmath, 13 digits)', () => {
  it('k(A 1e13 s⁻¹, 100 kJ/mol, 500 K) = 357.5 s⁻¹', () => {
    const k = 1e13 * Math.exp(-100_000 / (GAS_CONSTANT * 500));
    expect(sharedDigits(k, 357.499942172)).toBeGreaterThan(10);
  });
  it('1 K is 7.85 % of k at 350 K and 80 kJ/mol', () => {
    expect(sharedDigits(80_000 / (GAS_CONSTANT * 350 ** 2), 0.07854521145647)).toBeGreaterThan(11);
  });
});

describe('compensation (Krug, Hunter & Grieger 1976; by mpmath)', () => {
  const set = [300, 320, 340, 360];
  it('harmonic mean of 300, 320, 340, 360 K, and what errors alone correlate', () => {
    expect(sharedDigits(harmonicMeanK(set), 328.4803757128)).toBeGreaterThan(11);
    expect(sharedDigits(errorCorrelation(set), 0.9976919379739)).toBeGreaterThan(11);
    const slope = 1 / (GAS_CONSTANT * harmonicMeanK(set));
    expect(sharedDigits(slope, 0.0003661477638709)).toBeGreaterThan(11);
  });
  it('draws no line where only errors make ln A follow Ea', () => {
    const mean = harmonicMeanK(set);
    const lines = [40_000, 50_000, 60_000].map((activationEnergy) => ({
      catalyst: `${activationEnergy}`,
      activationEnergy,
      lnA: -7 + activationEnergy / (GAS_CONSTANT * mean),
    }));
    const { points } = compensationPlot(lines, set);
    for (const { lnK } of points) expect(lnK).toBeCloseTo(-7, 10);
  });
});

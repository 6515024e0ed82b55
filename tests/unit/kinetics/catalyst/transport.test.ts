import { describe, expect, it } from 'vitest';
import {
  effectiveness,
  mears,
  mearsOf,
  weiszPrater,
  worstConcentration,
} from '../../../../src/kinetics/catalyst/transport';
import { sharedDigits } from '../../../fixtures/decaySeries';

const particle = {
  rate: 1e-3,
  order: 1,
  concentration: 10,
  particleRadius: 1e-4,
  particleDensity: 1000,
  poreDiffusivity: 1e-8,
  bulkDiffusivity: 1e-9,
};

/** Figures by mpmath, 13 digits, from the published formulas. */
describe('pore diffusion (Weisz & Prater 1954)', () => {
  it('r 1e-3 mol/kg/s, 1000 kg/m³, R 0.1 mm, D_eff 1e-8 m²/s, 10 mol/m³: 0.1', () => {
    const found = weiszPrater(particle)!;
    expect(sharedDigits(found.value, 0.1)).toBeGreaterThan(12);
    expect(found.limited).toBe(false);
  });
  it('of a first-order sphere at Thiele 3 is η φ² = 6.0447', () => {
    // r = η k C: Φ = η φ² whatever k and C are.
    const phi = 3;
    expect(sharedDigits(effectiveness(phi), 0.6716364899804)).toBeGreaterThan(12);
    const k = (phi ** 2 * 1e-8) / 1e-4 ** 2;
    const rate = (effectiveness(phi) * k * 10) / 1000;
    const found = weiszPrater({ ...particle, rate })!;
    expect(sharedDigits(found.value, 6.044728409823)).toBeGreaterThan(12);
    expect(found.limited).toBe(true);
  });
  it('allows less the higher the order', () => {
    const limits = [0, 0.5, 1, 1.5, 2, 3].map(
      (order) => weiszPrater({ ...particle, order })!.limit,
    );
    expect(limits).toEqual([...limits].sort((a, b) => b - a));
    expect(limits[0]).toBe(6);
    expect(limits[2]).toBeCloseTo(0.6, 12);
  });
  it('is not told without density or diffusivity', () => {
    expect(weiszPrater({ ...particle, poreDiffusivity: null })).toBeNull();
    expect(mears({ ...particle, particleDensity: null })).toBeNull();
  });
  it('a small particle has no gradient: η runs into 1', () => {
    expect(effectiveness(0)).toBe(1);
    expect(effectiveness(0.0099)).toBeCloseTo(effectiveness(0.0101), 6);
  });
});

describe('film diffusion (Mears 1971)', () => {
  it('r 1e-3, bed of 800 kg/m³, R 0.1 mm, n 1, k_c 0.01 m/s, 10 mol/m³: 8e-4', () => {
    const found = mearsOf(particle, 800, 0.01)!;
    expect(sharedDigits(found.value, 8e-4)).toBeGreaterThan(12);
    expect(found.limited).toBe(false);
  });
  it('with Sh = 2, k_c = D/R', () => {
    expect(mears(particle)!.value).toBeCloseTo((1e-3 * 1000 * 1e-4) / (1e-5 * 10), 12);
  });
  it('sees zero order too, which the published form calls safe at any rate', () => {
    const fast = { ...particle, order: 0, rate: 1 };
    expect(mears(fast)!.limited).toBe(true);
  });
  it('is hardest at the lowest concentration below first order, at the start above', () => {
    expect(worstConcentration(0, 10, 2)).toBe(2);
    expect(worstConcentration(2, 10, 2)).toBe(10);
  });
});

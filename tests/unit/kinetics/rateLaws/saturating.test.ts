import { describe, expect, it } from 'vitest';
import { coverageOf, saturatingShape } from '../../../../src/kinetics/rateLaws/saturating';

/** C(t) in the constants of the Michaelis form, K the half-saturation concentration. */
function concentration(c0: number, vmax: number, halfSaturation: number, time: number): number {
  const coverage = coverageOf(1 / halfSaturation, c0);
  const kRel = vmax / (halfSaturation + c0);
  return c0 * saturatingShape(coverage).relative(kRel * time);
}

describe('saturatingShape', () => {
  /** C(t) by the principal branch of Lambert's W: mpmath 1.3.0 with 13 digits. */
  it.each([
    [1, 0.01, 0.2, 50, 0.6016243922935],
    [1, 0.01, 0.2, 100, 0.2653449330484],
    [1, 0.01, 0.2, 150, 0.06062141455776],
    [1, 0.01, 0.01, 90, 0.1211105178001],
    [10, 0.05, 0.001, 150, 2.501385740219],
    [1, 0.5, 50, 100, 0.372525232704],
  ])('C0 %d, k %d, half saturation %d at %d s', (c0, vmax, half, time, expected) => {
    expect(concentration(c0, vmax, half, time) / expected).toBeCloseTo(1, 11);
  });

  it.each([0, 1e-9, 0.1, 0.5, 0.9, 1 - 1e-9])('obeys its rate law at a coverage of %d', (s) => {
    const shape = saturatingShape(s);
    for (const u of [-0.5, 0.01, 0.3, 0.9, 1.5]) {
      const w = shape.relative(u);
      const h = 1e-5;
      if (s > 0.99 && u > 0.8) continue;
      const slope = (shape.relative(u + h) - shape.relative(u - h)) / (2 * h);
      expect(slope).toBeCloseTo(-w / (1 - s + s * w), 6);
      expect(shape.slope(u)).toBeCloseTo(slope, 6);
      const bend = (shape.slope(u + h) - shape.slope(u - h)) / (2 * h);
      expect(shape.bend(u)).toBeCloseTo(bend, 5);
    }
    expect(shape.relative(0)).toBeCloseTo(1, 14);
    expect(shape.relative(shape.reach(0.9))).toBeCloseTo(0.1, 9);
  });

  it('is first order without coverage, and zero order that runs out with full coverage', () => {
    for (const u of [0.1, 0.5, 0.99, 2, 700]) {
      expect(saturatingShape(0).relative(u)).toBeCloseTo(Math.exp(-u), 14);
      expect(saturatingShape(1).relative(u)).toBeCloseTo(Math.max(1 - u, 0), 14);
      expect(saturatingShape(1 - 1e-12).relative(u)).toBeCloseTo(Math.max(1 - u, 0), 9);
    }
  });

  it('refuses a coverage outside 0 to 1', () => {
    for (const s of [-0.1, 1.1, NaN]) expect(() => saturatingShape(s)).toThrow(RangeError);
  });
});

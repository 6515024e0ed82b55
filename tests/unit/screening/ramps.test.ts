import { describe, expect, it } from 'vitest';
import {
  amountRamp,
  hexOfOklch,
  inkOn,
  luminanceOf,
  rateRamp,
  residualRamp,
  shareOf,
  temperatureRamp,
} from '../../../src/screening/ramps';

const linear = (hex: string) =>
  [1, 3, 5].map((at) => {
    const part = parseInt(hex.slice(at, at + 2), 16) / 255;
    return part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4;
  }) as [number, number, number];

/** OKLab lightness of a hex colour, by the forward matrices of B. Ottosson (2020). */
function lightnessOf(hex: string): number {
  const [r, g, b] = linear(hex);
  const l = Math.cbrt(0.4122214708 * r + 0.5363325363 * g + 0.0514459929 * b);
  const m = Math.cbrt(0.2119034982 * r + 0.6806995451 * g + 0.1073969566 * b);
  const s = Math.cbrt(0.0883024619 * r + 0.2817188376 * g + 0.6299787005 * b);
  return 0.2104542553 * l + 0.793617785 * m - 0.0040720468 * s;
}

/** Luminance as seen without M cones (Machado, Oliveira and Fernandes, 2009, severity 1). */
function deuteranopeLuminance(hex: string): number {
  const [r, g, b] = linear(hex);
  const seen = [
    0.367322 * r + 0.860646 * g - 0.227968 * b,
    0.280085 * r + 0.672501 * g + 0.047413 * b,
    -0.01182 * r + 0.04294 * g + 0.968881 * b,
  ] as const;
  return 0.2126 * seen[0] + 0.7152 * seen[1] + 0.0722 * seen[2];
}

const steps = Array.from({ length: 11 }, (_, index) => index / 10);

describe('ramps', () => {
  it.each([
    ['rate', rateRamp, 0.3, 0.92],
    ['temperature', temperatureRamp, 0.3, 0.9],
    ['amount', amountRamp, 0.94, 0.34],
  ])('%s runs from end to end in equal steps of lightness', (_, ramp, first, last) => {
    const lightness = steps.map((share) => lightnessOf(ramp(share)));
    expect(lightness[0]).toBeCloseTo(first, 2);
    expect(lightness[10]).toBeCloseTo(last, 2);
    const even = (last - first) / 10;
    lightness.slice(1).forEach((value, index) => {
      expect(Math.abs(value - (lightness[index] ?? 0) - even)).toBeLessThan(0.006);
    });
  });

  it.each([
    ['rate', rateRamp],
    ['temperature', temperatureRamp],
  ])('%s keeps its order for a reader who does not tell red from green', (_, ramp) => {
    const seen = steps.map((share) => deuteranopeLuminance(ramp(share)));
    seen.slice(1).forEach((value, index) => {
      expect(value).toBeGreaterThan((seen[index] ?? 1) * 1.05);
    });
  });

  it('residuals are equally dark at both ends and palest at zero', () => {
    expect(lightnessOf(residualRamp(-1))).toBeCloseTo(lightnessOf(residualRamp(1)), 2);
    expect(lightnessOf(residualRamp(0))).toBeGreaterThan(0.92);
    expect(residualRamp(-1)).not.toBe(residualRamp(1));
  });

  it.each([
    ['rate', rateRamp],
    ['temperature', temperatureRamp],
    ['amount', amountRamp],
  ])('text on %s has a contrast of 4.5 at least everywhere', (_, ramp) => {
    for (let share = 0; share <= 1; share += 0.01) {
      const ground = luminanceOf(ramp(share));
      const text = luminanceOf(inkOn(ramp(share)));
      const ratio = (Math.max(ground, text) + 0.05) / (Math.min(ground, text) + 0.05);
      expect(ratio).toBeGreaterThanOrEqual(4.5);
    }
  });

  it('gives the primaries their known coordinates', () => {
    // sRGB red is oklch(0.62796 0.25768 29.234), CSS Color 4 (W3C).
    expect(hexOfOklch({ lightness: 0.62796, chroma: 0.25768, hue: 29.234 })).toBe('#ff0000');
    expect(hexOfOklch({ lightness: 1, chroma: 0, hue: 0 })).toBe('#ffffff');
  });

  it('places values between the ends and holds those outside', () => {
    expect(shareOf(10, [1, 100], 'log')).toBeCloseTo(0.5);
    expect(shareOf(3, [1, 5], 'linear')).toBeCloseTo(0.5);
    expect(shareOf(500, [1, 100], 'log')).toBe(1);
    expect(shareOf(7, [7, 7], 'linear')).toBe(0.5);
  });
});

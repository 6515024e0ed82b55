import { describe, expect, it } from 'vitest';
import { readingUnitFor, timeUnitFor } from '@/islands/charts/displayUnits';
import { interpolate } from '@/islands/charts/interpolate';
import { extent, niceScale } from '@/islands/charts/niceScale';
import { plotNumber, tickWriter } from '@/islands/charts/plotNumber';
import { spreadLabels } from '@/islands/charts/spreadLabels';

describe('a round scale', () => {
  it.each([
    [0, 10.2, 0, 12, 2],
    [-0.3, 0.4, -0.3, 0.4, 0.1],
    [0, 1e-9, 0, 1e-9, 2e-10],
  ])('over %d to %d runs from %d to %d by %d', (low, high, min, max, interval) => {
    const scale = niceScale(low, high);
    expect(scale.min).toBeCloseTo(min, 15);
    expect(scale.max).toBeCloseTo(max, 15);
    expect(scale.interval).toBeCloseTo(interval, 15);
  });

  it('opens up around a single value', () => {
    const { min, max } = niceScale(5, 5);
    expect(min).toBeLessThan(5);
    expect(max).toBeGreaterThanOrEqual(5);
  });

  it('knows no extent of nothing', () => {
    expect(extent([null, NaN])).toBeNull();
    expect(extent([3, null, -1])).toEqual([-1, 3]);
  });
});

describe('units to show in', () => {
  it.each([
    ['concentration', 1.2, 'mol/L'],
    ['concentration', 0.0102, 'mmol/L'],
    ['concentration', 4e-5, 'µmol/L'],
    ['pressure', 101_325, 'bar'],
    ['pressure', 4000, 'kPa'],
    ['pressure', 12, 'Pa'],
    ['ratio', 0.2, ''],
  ] as const)('a %s of %d is shown in %s', (dimension, largest, unit) => {
    expect(readingUnitFor(dimension, largest).unit).toBe(unit);
  });

  it.each([
    [90, 's'],
    [1200, 'min'],
    [20_000, 'h'],
    [400_000, 'd'],
    [0, 's'],
  ])('%d s is shown in %s', (longest, unit) => {
    expect(timeUnitFor(longest).unit).toBe(unit);
  });

  it('writes numbers with a true minus and raised powers', () => {
    expect(plotNumber(-0.25)).toBe('−0.25');
    expect(plotNumber(3.42e-5, 3)).toBe('3.42 × 10⁻⁵');
    expect(plotNumber(-2e7)).toBe('−2 × 10⁷');
  });
});

describe('labels at the ends of curves', () => {
  it('stay where they belong when there is room', () => {
    expect(spreadLabels([1, 5, 9], 2, 0, 10)).toEqual([1, 5, 9]);
  });

  it('keep their order and distance where they would meet, also at the edge', () => {
    const placed = spreadLabels([0.2, 0, 0.1], 1, 0, 10);
    expect(placed[1]).toBeCloseTo(0, 12);
    expect(placed[2]).toBeCloseTo(1, 12);
    expect(placed[0]).toBeCloseTo(2, 12);
  });

  it('are centred on what they want', () => {
    expect(spreadLabels([5, 5], 2, 0, 10)).toEqual([4, 6]);
  });
});

describe('reading a drawn curve between its points', () => {
  const xs = Array.from({ length: 41 }, (_, index) => index * 25);

  it('follows an exponential far closer than a reading is measured', () => {
    const ys = xs.map((x) => Math.exp(-x / 400));
    for (const x of [0, 13, 500.5, 987, 1000]) {
      expect(Math.abs(interpolate(xs, ys, x)! - Math.exp(-x / 400))).toBeLessThan(2e-5);
    }
  });

  it('does not overshoot where a zero order runs out', () => {
    const ys = xs.map((x) => Math.max(1 - x / 510, 0));
    for (let x = 0; x <= 1000; x += 3) {
      const value = interpolate(xs, ys, x)!;
      expect(value).toBeGreaterThanOrEqual(-1e-12);
      expect(value).toBeLessThanOrEqual(1);
    }
  });

  it('knows nothing outside', () => {
    expect(interpolate(xs, xs, -1)).toBeNull();
    expect(interpolate(xs, xs, 1001)).toBeNull();
  });
});

describe('the ticks of one axis', () => {
  it('have the same number of decimals, and a bare zero', () => {
    expect([2.9, 2.95, 3].map(tickWriter([2.9, 2.95, 3]))).toEqual(['2.90', '2.95', '3.00']);
    expect([-0.5, 0, 0.5].map(tickWriter([-0.5, 0, 0.5]))).toEqual(['−0.5', '0', '0.5']);
  });

  it('keep powers of ten where one of them needs it', () => {
    expect(tickWriter([0, 1e-4])(1e-4)).toBe('1 × 10⁻⁴');
  });
});

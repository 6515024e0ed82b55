import { describe, expect, it } from 'vitest';
import {
  apparentOrder,
  orderSlope,
  relativeOfOrder,
} from '../../../../src/kinetics/rateLaws/apparentOrder';
import {
  findRateLaw,
  lawOfOrder,
  rateLawOf,
  rateLaws,
  requestedLaw,
} from '../../../../src/kinetics/rateLaws/registry';

const laws = [...rateLaws, ...[-1, -0.5, 0.5, 0.999999, 1.5, 3, 4].map(apparentOrder)];
const named = laws.map((law) => [`${law.name} ${law.order}`, law] as const);

describe.each(named)('rate law %s', (_, law) => {
  const parameters = { c0: 0.02, k: law.kOf(1e-3, 0.02) };
  const end = Math.min(law.order < 1 ? 0.9 / (1 - law.order) : 30, 30);

  it('starts at C0 and its relative rate is k C0^(n−1)', () => {
    expect(law.concentration(parameters)(0)).toBe(0.02);
    expect(law.kRelOf(parameters.k, 0.02)).toBeCloseTo(1e-3, 15);
    expect(law.relative(0)).toBe(1);
    expect(law.slope(0)).toBeCloseTo(-1, 14);
  });

  it('falls, stays finite and never below 0', () => {
    let last = 1;
    for (const u of [1e-12, 1e-6, 0.1, 0.5, 1, 2, 10, 1e3, 1e8]) {
      const g = law.relative(u);
      expect(Number.isFinite(g)).toBe(true);
      expect(g).toBeGreaterThanOrEqual(0);
      expect(g).toBeLessThanOrEqual(last);
      expect(law.converted(u)).toBeCloseTo(1 - g, 14);
      expect(Number.isFinite(law.slope(u))).toBe(true);
      expect(Number.isFinite(law.bend(u))).toBe(true);
      last = g;
    }
  });

  it('obeys its differential equation −dC/dt = k Cⁿ', () => {
    const curve = law.concentration(parameters);
    for (const share of [0.01, 0.2, 0.5, 0.9]) {
      const t = (share * end) / 1e-3;
      const h = t * 1e-5;
      const slope = (curve(t + h) - curve(t - h)) / (2 * h);
      const rate = law.rate(parameters.k, curve(t));
      expect(-slope / rate).toBeCloseTo(1, 6);
    }
  });

  it('has derivatives that match differences', () => {
    for (const share of [0.05, 0.3, 0.8]) {
      const u = share * end;
      const h = 1e-5 * u;
      expect((law.relative(u + h) - law.relative(u - h)) / (2 * h)).toBeCloseTo(law.slope(u), 7);
      expect((law.slope(u + h) - law.slope(u - h)) / (2 * h)).toBeCloseTo(law.bend(u), 5);
    }
  });

  it('reaches a conversion when its curve does', () => {
    for (const x of [0.01, 0.5, 0.8, 0.99]) {
      const t = law.timeToConversion(x, parameters);
      expect(law.concentration(parameters)(t) / 0.02).toBeCloseTo(1 - x, 10);
    }
    expect(() => law.timeToConversion(1, parameters)).toThrow(RangeError);
    expect(() => law.timeToConversion(0, parameters)).toThrow('between 0 and 1, got 0');
  });

  it('is a straight line in its own coordinate', () => {
    const curve = law.concentration(parameters);
    const at = (share: number) => law.straighten(curve((share * end) / 1e-3));
    expect((at(0.6) - at(0.4)) / (at(0.2) - at(0))).toBeCloseTo(1, 5);
  });
});

describe('concentrations (by mpmath)', () => {
  it.each([
    [0, 1, 0.004, 0.6],
    [1, 1, 0.01, 0.3678794411714],
    [2, 2, 0.01, 0.6666666666667],
    [1.5, 1, 0.01, 0.4444444444444],
    [0.5, 1, 0.01, 0.25],
  ])('order %d from %d with k = %d after 100 s', (order, c0, k, c) => {
    expect(apparentOrder(order).concentration({ c0, k })(100)).toBeCloseTo(c, 12);
  });

  it('half-life of first order with k = 0.01 is 69.31 s', () => {
    const time = findRateLaw('first')!.timeToConversion(0.5, { c0: 1, k: 0.01 });
    expect(time).toBeCloseTo(69.31471805599, 10);
  });

  it('zero order stops when the reactant is used up', () => {
    expect(findRateLaw('zero')!.concentration({ c0: 1, k: 0.01 })(101)).toBe(0);
    expect(findRateLaw('zero')!.slope(1.1)).toBe(0);
  });
});

describe('apparent order', () => {
  it('passes through first order without a step', () => {
    for (const e of [-1e-9, -1e-13, 1e-13, 1e-9]) {
      expect(relativeOfOrder(1 + e, 2)).toBeCloseTo(Math.exp(-2), 8);
    }
  });
  it('has an order slope that matches differences, near n = 1 too', () => {
    for (const n of [0.3, 0.9999, 1, 1.0004, 2.5]) {
      const difference = (relativeOfOrder(n + 1e-5, 1.2) - relativeOfOrder(n - 1e-5, 1.2)) / 2e-5;
      expect(orderSlope(n, 1.2)).toBeCloseTo(difference, 7);
    }
    expect(orderSlope(0, 5)).toBe(0);
  });
  it('is refused outside −1 to 4', () => {
    expect(() => apparentOrder(4.1)).toThrow('order must lie between -1 and 4, got 4.1');
    expect(() => apparentOrder(NaN)).toThrow(RangeError);
  });
  it('gives whole orders their own law', () => {
    expect([0, 1, 2].map((n) => apparentOrder(n).name)).toEqual(['zero', 'first', 'second']);
  });
});

describe('units of k', () => {
  it.each([
    ['zero', 'concentration', 'mol L^-1 s^-1'],
    ['first', 'concentration', 's^-1'],
    ['second', 'concentration', 'L mol^-1 s^-1'],
    ['zero', 'pressure', 'Pa s^-1'],
    ['second', 'pressure', 'Pa^-1 s^-1'],
    ['second', 'ratio', 's^-1'],
  ] as const)('%s order in %s: %s', (name, dimension, unit) => {
    expect(findRateLaw(name)!.kUnit(dimension)).toBe(unit);
  });
  it('of broken orders carry 1 − n as a number', () => {
    expect(apparentOrder(0.9).kUnit('concentration')).toBe('(mol/L)^(0.1) s^-1');
    expect(apparentOrder(1.5).kUnit('concentration')).toBe('(mol/L)^(-0.5) s^-1');
    expect(apparentOrder(3).kUnit('pressure')).toBe('Pa^(-2) s^-1');
  });
});

describe('registry', () => {
  it('finds laws by request and by order', () => {
    expect(requestedLaw('auto')).toBeNull();
    expect(requestedLaw('second')!.law!.order).toBe(2);
    expect(requestedLaw({ order: 1.5 })!.name).toBe('order');
    expect(rateLawOf('order', null)).toBeNull();
    expect(rateLawOf('order', 2.5)!.order).toBe(2.5);
    expect(lawOfOrder(1)).toBe('first');
    expect(lawOfOrder(1.5)).toBe('order');
  });
  it('knows the saturating law, which has no order', () => {
    expect(requestedLaw('saturating')).toEqual({ name: 'saturating', law: null });
  });
});

import { describe, expect, it } from 'vitest';
import { analyseSeries, rateLaws } from '../../../src/kinetics';
import type { DecaySeries, SeriesAnalysis } from '../../../src/kinetics/types';
import { decaySeries, seededNormal, seededRandom, times } from '../../fixtures/decaySeries';

/** Fails when a number in the tree is not finite or a member is undefined. */
function expectClean(value: unknown, path = ''): void {
  if (typeof value === 'number') expect(Number.isFinite(value), path).toBe(true);
  else if (typeof value === 'object' && value !== null) {
    for (const [key, inner] of Object.entries(value)) expectClean(inner, `${path}/${key}`);
  } else expect(value, path).not.toBeUndefined();
}

const t20 = times(20, 3600);
const decay = (order: number, conversion: number, noise: number, seed: number, c0 = 0.01) => {
  const law = rateLaws.find((one) => one.order === order)!;
  const kRel = law.reach(conversion) / 3600;
  const normal = seededNormal(seed);
  return t20.map((t) => c0 * (law.relative(kRel * t) + noise * normal()));
};

describe('verdicts on clear wells', () => {
  it.each([
    [0, 'zero', 'mol L^-1 s^-1'],
    [1, 'first', 's^-1'],
    [2, 'second', 'L mol^-1 s^-1'],
  ] as const)('order %i at 90 %% conversion and 1 %% noise is asserted', (order, verdict, unit) => {
    const a = analyseSeries(decaySeries({ timesS: t20, values: decay(order, 0.9, 0.01, 4) }));
    const law = rateLaws.find((one) => one.order === order)!;
    const k = law.kOf(law.reach(0.9) / 3600, 0.01);
    expect(a.verdict).toBe(verdict);
    expect(a.order).toBe(order);
    expect(a.kUnit).toBe(unit);
    expect(Math.abs(a.k!.value - k) / a.k!.se!).toBeLessThan(4);
    expect(a.conversion).toBeCloseTo(0.9, 1);
    expect(a.initialRate!.value / (k * 0.01 ** order)).toBeCloseTo(1, 1);
    expect(a.apparentOrder!.low).toBeLessThan(order + 0.2);
    expect(a.warnings).toEqual([]);
    expectClean(a);
  });

  it('calculated readings without noise give the exact constants and say so', () => {
    for (const law of rateLaws) {
      const a = analyseSeries(decaySeries({ timesS: t20, values: decay(law.order, 0.8, 0, 1) }));
      expect(a.verdict).toBe(law.name);
      expect(a.k!.value / law.kOf(law.reach(0.8) / 3600, 0.01)).toBeCloseTo(1, 11);
      expect(a.warnings).toEqual(['exact-fit']);
    }
  });

  it('low conversion is undetermined, without k', () => {
    const a = analyseSeries(decaySeries({ timesS: t20, values: decay(1, 0.25, 0.01, 11) }));
    expect(a.verdict).toBe('undetermined');
    expect(a.k).toBeNull();
    expect(a.kRel).toBeNull();
    expect(a.warnings).toContain('low-conversion');
    expect(a.initialRate!.low).toBeGreaterThan(0);
  });

  it('a level that stays is not called an order', () => {
    const normal = seededNormal(3);
    const values = t20.map((t) => 0.004 + 0.006 * Math.exp(-t / 500) + 1e-4 * normal());
    const a = analyseSeries(decaySeries({ timesS: t20, values }));
    expect(a.verdict).toBe('other');
    expect(a.warnings).toContain('no-simple-order');
  });

  it('a catalyst that dies is not called an order', () => {
    const normal = seededNormal(5);
    const values = t20.map(
      (t) => 0.01 * Math.exp(-1.5 * (1 - Math.exp(-t / 700))) + 5e-5 * normal(),
    );
    expect(analyseSeries(decaySeries({ timesS: t20, values })).verdict).toBe('other');
  });

  it('fewer than five readings are undetermined with an initial rate', () => {
    const a = analyseSeries(
      decaySeries({ timesS: [0, 600, 1200, 1800], values: [0.01, 0.0071, 0.0049, 0.0036] }),
    );
    expect(a.verdict).toBe('undetermined');
    expect(a.warnings).toContain('too-few-for-order');
    expect(a.initialRate!.value).toBeGreaterThan(0);
    expect(a.fits.first!.aicc).toBeNull();
    expectClean(a);
  });
});

describe('forced laws', () => {
  it('give k of the law asked for, whatever the evidence', () => {
    const values = decay(1, 0.9, 0.01, 4);
    const a = analyseSeries(decaySeries({ timesS: t20, values, law: 'second' }));
    expect(a.verdict).toBe('forced');
    expect(a.order).toBe(2);
    expect(a.kUnit).toBe('L mol^-1 s^-1');
    expect(a.law).toBe('second');
  });
  it('may have a broken order', () => {
    const values = decay(1, 0.9, 0.01, 4);
    const a = analyseSeries(decaySeries({ timesS: t20, values, law: { order: 1.5 } }));
    expect(a.verdict).toBe('forced');
    expect(a.order).toBe(1.5);
    expect(a.kUnit).toBe('(mol/L)^(-0.5) s^-1');
    expect(a.fits.order!.k).toBe(a.k!.value);
  });
  it('do not hide a dead well', () => {
    const normal = seededNormal(2);
    const values = t20.map(() => 0.01 + 1e-4 * normal());
    const a = analyseSeries(decaySeries({ timesS: t20, values, law: 'first' }));
    expect(a.verdict).toBe('no-reaction');
    expect(a.k).toBeNull();
  });
});

describe('kinds of reading', () => {
  const g = decay(1, 0.9, 0.005, 4, 1);

  it('product grows to s C0 and keeps k of the reactant', () => {
    const values = g.map((left) => 0.02 * (1 - left));
    const a = analyseSeries(
      decaySeries({ timesS: t20, values, kind: 'product', productPerReactant: 2 }),
    );
    expect(a.verdict).toBe('first');
    expect(a.c0!.value).toBeCloseTo(0.01, 3);
    expect(a.k!.value * 3600).toBeCloseTo(-Math.log(0.1), 0);
    expect(a.initialRate!.value / (a.k!.value * a.c0!.value)).toBeCloseTo(1, 10);
  });

  it('conversion without the initial concentration knows only kRel of second order', () => {
    const values = decay(2, 0.9, 0.005, 8, 1).map((left) => 1 - left);
    const known = { timesS: t20, values, kind: 'conversion', dimension: 'ratio' } as const;
    const without = analyseSeries(decaySeries(known));
    expect(without.verdict).toBe('second');
    expect(without.k).toBeNull();
    expect(without.kRel!.value * 3600).toBeCloseTo(9, 0);
    expect(without.warnings).toContain('initial-concentration-needed');
    const withC0 = analyseSeries(decaySeries({ ...known, initialConcentration: 0.02 }));
    expect(withC0.k!.value).toBeCloseTo(without.kRel!.value / 0.02, 12);
    expect(withC0.kUnit).toBe('L mol^-1 s^-1');
    expect(withC0.dimension).toBe('concentration');
  });

  it('a signal knows k of first order only', () => {
    const signal = { timesS: t20, kind: 'signal', dimension: 'ratio' } as const;
    expect(analyseSeries(decaySeries({ ...signal, values: g })).k!.value).toBeGreaterThan(0);
    const second = analyseSeries(decaySeries({ ...signal, values: decay(2, 0.9, 0.005, 8, 1) }));
    expect(second.verdict).toBe('second');
    expect(second.k).toBeNull();
    expect(second.kRel!.value).toBeGreaterThan(0);
  });

  it('zero-order product before exhaustion knows the rate but not C0', () => {
    const values = t20.map((t) => 1e-6 * t);
    const a = analyseSeries(decaySeries({ timesS: t20, values, kind: 'product', law: 'zero' }));
    expect(a.k!.value).toBeCloseTo(1e-6, 15);
    expect(a.c0).toBeNull();
    expect(a.kRel).toBeNull();
    expect(a.conversion).toBeNull();
    expectClean(a);
  });

  it('zero-order product and conversion see exhaustion', () => {
    const product = t20.map((t) => Math.min(1e-5 * t, 0.02));
    const a = analyseSeries(decaySeries({ timesS: t20, values: product, kind: 'product' }));
    expect(a.verdict).toBe('zero');
    expect(a.c0!.value).toBeCloseTo(0.02, 10);
    const b = analyseSeries(
      decaySeries({
        timesS: t20,
        values: product.map((p) => p / 0.02),
        kind: 'conversion',
        dimension: 'ratio',
      }),
    );
    expect(b.verdict).toBe('zero');
    expect(b.kRel!.value).toBeCloseTo(5e-4, 12);
  });
});

describe('clock and order of readings', () => {
  it('a late clock changes neither k nor, at time 0, C0', () => {
    for (const law of rateLaws) {
      const kRel = law.reach(0.8) / 3600;
      const late = t20.slice(5);
      const values = late.map((t) => 0.01 * law.relative(kRel * t));
      const a = analyseSeries(decaySeries({ timesS: late, values }));
      expect(a.k!.value / law.kOf(kRel, 0.01)).toBeCloseTo(1, 9);
      expect(a.c0!.value).toBeCloseTo(0.01, 10);
      expect(a.fits[law.name]!.kRel! / kRel).toBeCloseTo(1, 9);
      expect(a.fits[law.name]!.originS).toBe(0);
    }
  });

  it('a clock that starts at a million seconds keeps all digits of k', () => {
    const values = decay(2, 0.9, 0.01, 4);
    const near = analyseSeries(decaySeries({ timesS: t20, values, law: 'second' }));
    const far = analyseSeries(
      decaySeries({ timesS: t20.map((t) => t + 1e6), values, law: 'second' }),
    );
    expect(far.k!.value / near.k!.value).toBeCloseTo(1, 9);
    expect(far.fits.second!.originS).toBe(1e6);
    expectClean(far);
  });

  it('unsorted times are sorted, with a warning, and outliers keep their place', () => {
    const values = decay(1, 0.9, 0.005, 9);
    values[7]! += 0.003;
    const order = t20.map((_, i) => (i * 7) % 20);
    const a = analyseSeries(
      decaySeries({ timesS: order.map((i) => t20[i]!), values: order.map((i) => values[i]!) }),
    );
    expect(a.warnings).toContain('unsorted-times');
    expect(a.warnings).toContain('outlier');
    expect(a.outliers).toEqual([order.indexOf(7)]);
  });

  it('null readings are excluded and counted', () => {
    const values: (number | null)[] = decay(1, 0.9, 0.01, 4);
    values[3] = null;
    const a = analyseSeries(decaySeries({ timesS: t20, values }));
    expect([a.pointsUsed, a.pointsExcluded]).toEqual([19, 1]);
  });
});

describe('awkward wells', () => {
  const few: [string, number[], (number | null)[], string][] = [
    ['empty', [], [], 'too-few-readings'],
    ['one reading', [0], [1], 'too-few-readings'],
    ['all excluded', [0, 1, 2], [null, null, null], 'too-few-readings'],
    ['one time', [5, 5, 5, 5], [1, 2, 3, 4], 'too-few-distinct-times'],
    ['two times', [0, 0, 9, 9], [1, 1, 0.5, 0.4], 'too-few-distinct-times'],
  ];
  it.each(few)('%s is unusable', (_, timesS, values, warning) => {
    const a = analyseSeries(decaySeries({ timesS, values }));
    expect(a.verdict).toBe('unusable');
    expect(a.warnings).toContain(warning);
    expectClean(a);
  });

  const dead: [string, number[]][] = [
    ['constant', t20.map(() => 0.01)],
    ['all zero', t20.map(() => 0)],
    ['rising', t20.map((t) => 0.01 + 1e-6 * t)],
    ['negative and constant', t20.map(() => -3)],
  ];
  it.each(dead)('%s readings are no-reaction', (_, values) => {
    for (const kind of ['reactant', 'signal'] as const) {
      const a = analyseSeries(decaySeries({ timesS: t20, values, kind }));
      expect(a.verdict).toBe('no-reaction');
      expectClean(a);
    }
  });

  it('rising readings say that they rise', () => {
    const a = analyseSeries(decaySeries({ timesS: t20, values: t20.map((t) => 0.01 + 1e-6 * t) }));
    expect(a.warnings).toContain('rising');
  });

  it('a well that is finished after one reading still reacts', () => {
    const values = t20.map((_, i) => (i === 0 ? 0.01 : 0));
    const a = analyseSeries(decaySeries({ timesS: t20, values }));
    expect(a.verdict).not.toBe('no-reaction');
    expectClean(a);
  });

  it('a zero order that runs out between the first two readings has no error of k', () => {
    const values = t20.map((_, i) => (i === 0 ? 0.01 : 0));
    const a = analyseSeries(decaySeries({ timesS: t20, values, law: 'zero' }));
    expect(a.k!.value).toBeCloseTo(0.01 / t20[1]!, 12);
    expectClean(a);
  });

  it('one dominant outlier is pointed out and does not break the fit', () => {
    const values = decay(1, 0.8, 0.01, 6);
    values[10] = 5;
    const a = analyseSeries(decaySeries({ timesS: t20, values }));
    expectClean(a);
    expect(a.outliers).toEqual(a.verdict === 'unusable' ? [] : [10]);
  });

  it.each([1e-12, 1e-6, 1, 1e6])('a magnitude of %d changes nothing but the unit', (unit) => {
    const values = decay(1, 0.9, 0.01, 4, 1);
    const a = analyseSeries(decaySeries({ timesS: t20, values: values.map((v) => v * unit) }));
    const b = analyseSeries(decaySeries({ timesS: t20, values }));
    expect(a.verdict).toBe(b.verdict);
    expect(a.k!.value / b.k!.value).toBeCloseTo(1, 10);
    expect(a.c0!.value / (b.c0!.value * unit)).toBeCloseTo(1, 10);
  });

  it('never fails and never answers NaN, whatever finite readings come', () => {
    const random = seededRandom(99);
    const normal = seededNormal(98);
    const pick = <T>(all: readonly T[]) => all[Math.floor(random() * all.length)]!;
    for (let i = 0; i < 1500; i += 1) {
      const n = Math.floor(random() * 12);
      const scale = 10 ** (random() * 18 - 12);
      const series: DecaySeries = decaySeries({
        timesS: Array.from({ length: n }, () =>
          pick([normal() * 100, Math.floor(random() * 4), 0, 1e6 * random()]),
        ),
        values: Array.from({ length: n }, () =>
          pick([normal() * scale, scale, 0, null, 1e6 * scale * random()]),
        ),
        kind: pick(['reactant', 'product', 'conversion', 'signal'] as const),
        dimension: pick(['concentration', 'ratio'] as const),
        law: pick([
          'auto',
          'zero',
          'first',
          'second',
          { order: -1 },
          { order: 0.4 },
          { order: 4 },
        ] as const),
      });
      expectClean(analyseSeries(series));
    }
  });
});

describe('a caller’s mistakes', () => {
  it('are thrown with the value', () => {
    const good = { timesS: [0, 1, 2], values: [3, 2, 1] };
    expect(() => analyseSeries(decaySeries({ ...good, temperatureK: -5 }))).toThrow(
      'temperatureK must be above 0, got -5',
    );
    expect(() => analyseSeries(decaySeries({ ...good, values: [1] }))).toThrow('got 3 and 1');
  });
});

describe('calibration by seeded simulation', () => {
  const run = (count: number, make: (seed: number) => number[]): SeriesAnalysis[] =>
    Array.from({ length: count }, (_, i) =>
      analyseSeries(decaySeries({ timesS: t20, values: make(i + 1), law: 'auto' })),
    );

  it('keeps at least 98 % of dead wells as no-reaction', () => {
    const dead = run(1500, (seed) => {
      const normal = seededNormal(seed * 7919);
      return t20.map(() => 0.01 * (1 + 0.03 * normal()));
    });
    const kept = dead.filter((a) => a.verdict === 'no-reaction').length;
    expect(kept / dead.length).toBeGreaterThanOrEqual(0.98);
  });

  it.each(rateLaws.map((law) => [law.name, law] as const))(
    'covers k of %s order in 93 to 97 %% of 1000 runs',
    (name, law) => {
      const truth = law.kOf(law.reach(0.8) / 3600, 0.01);
      let covered = 0;
      for (let i = 0; i < 1000; i += 1) {
        const values = decay(law.order, 0.8, 0.03, 104729 * (i + 1));
        const { k } = analyseSeries(
          decaySeries({ timesS: t20, values, law: name as 'zero' | 'first' | 'second' }),
        );
        if (k!.low! <= truth && truth <= k!.high!) covered += 1;
      }
      expect(covered / 1000).toBeGreaterThanOrEqual(0.93);
      expect(covered / 1000).toBeLessThanOrEqual(0.97);
    },
  );

  it.each(rateLaws.map((law) => [law.name, law] as const))(
    'covers the initial rate of undetermined wells of %s order in 9 of 10 runs',
    (_, law) => {
      const truth = (law.reach(0.25) / 3600) * 0.01;
      const rates = Array.from({ length: 400 }, (__, i) =>
        analyseSeries(
          decaySeries({ timesS: t20, values: decay(law.order, 0.25, 0.01, 7 * i + 3) }),
        ),
      ).flatMap((a) => (a.verdict === 'undetermined' ? [a.initialRate!] : []));
      const covered = rates.filter((rate) => rate.low! <= truth && truth <= rate.high!).length;
      expect(rates.length).toBeGreaterThan(300);
      expect(covered / rates.length).toBeGreaterThan(0.88);
    },
  );

  it('asserts a wrong order in less than 1 % of simple wells, and decides most good ones', () => {
    let [wrong, right, good] = [0, 0, 0];
    for (let i = 0; i < 900; i += 1) {
      const order = i % 3;
      const conversion = 0.2 + 0.75 * ((i * 0.618) % 1);
      const a = analyseSeries(
        decaySeries({ timesS: t20, values: decay(order, conversion, 0.01, 15485863 + i) }),
      );
      if (a.order !== null && a.order !== order) wrong += 1;
      if (conversion < 0.7) continue;
      good += 1;
      if (a.order === order) right += 1;
    }
    expect(wrong / 900).toBeLessThan(0.01);
    expect(right / good).toBeGreaterThan(0.8);
  });
});

import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { analyseSeries } from '../../../../src/kinetics';
import { decaySeries, seededNormal, sharedDigits, times } from '../../../fixtures/decaySeries';

interface Reference {
  law: 'first' | 'second';
  t: number[];
  c: number[];
  below: boolean[];
  c0: number;
  kRel: number;
  lnL: number;
}

const reference = JSON.parse(
  readFileSync(new URL('../../../reference/censoredFits.json', import.meta.url), 'utf8'),
) as { source: string; wells: Reference[] };

describe('readings below a limit of quantification', () => {
  it.each(reference.wells.map((well, i) => [i, well.law, well] as const))(
    'well %i, %s order, agrees with SciPy',
    (_, law, { t, c, below, c0, kRel, lnL }) => {
      const a = analyseSeries(decaySeries({ law, timesS: t, values: c, belowLimit: below }));
      const fit = a.fits[law]!;
      expect(sharedDigits(fit.kRel, kRel)).toBeGreaterThan(5);
      expect(sharedDigits(fit.c0, c0)).toBeGreaterThan(5);
      // n ln(RSS/n) + n + n ln 2π = −2 ln L of readings over the largest; SciPy's are hundredths.
      const n = t.length;
      const largest = Math.max(...c);
      const scaled = -0.5 * n * (Math.log(fit.rss / largest ** 2 / n) + 1 + Math.log(2 * Math.PI));
      const known = below.filter((one) => !one).length;
      const found = scaled - known * Math.log(largest / 0.01);
      expect(found).toBeGreaterThan(lnL - 1e-7);
      expect(found).toBeCloseTo(lnL, 6);
    },
  );

  it('do not pull k as the limit in their place would, and the interval holds', () => {
    const runs = 250;
    let [hits, sum, naive] = [0, 0, 0];
    for (let seed = 1; seed <= runs; seed += 1) {
      const normal = seededNormal(seed);
      const t = times(20, 6000);
      const exact = t.map((time) => 0.01 * (Math.exp(-9e-4 * time) + 0.01 * normal()));
      const below = exact.map((value) => value < 0.001);
      const values = exact.map((value) => Math.max(value, 0.001));
      const { k } = analyseSeries(
        decaySeries({ law: 'first', timesS: t, values, belowLimit: below }),
      );
      sum += k!.value / runs;
      naive += analyseSeries(decaySeries({ law: 'first', timesS: t, values })).k!.value / runs;
      if (k!.low! <= 9e-4 && 9e-4 <= k!.high!) hits += 1;
    }
    expect(Math.abs(sum / 9e-4 - 1)).toBeLessThan(0.005);
    expect(Math.abs(naive / 9e-4 - 1)).toBeGreaterThan(0.02);
    expect(hits / runs).toBeGreaterThan(0.91);
    expect(hits / runs).toBeLessThan(0.985);
  });

  it('none of them: the plain fit', () => {
    const normal = seededNormal(4);
    const t = times(20, 3000);
    const values = t.map((time) => 0.01 * (Math.exp(-7e-4 * time) + 0.01 * normal()));
    const given = { timesS: t, values };
    expect(analyseSeries(decaySeries({ ...given, belowLimit: values.map(() => false) }))).toEqual(
      analyseSeries(decaySeries(given)),
    );
  });

  it('an order is asserted where the evidence is overwhelming', () => {
    const normal = seededNormal(5);
    const t = times(40, 6000);
    const exact = t.map((time) => 0.01 * (Math.exp(-9e-4 * time) + 0.004 * normal()));
    const a = analyseSeries(
      decaySeries({
        timesS: t,
        values: exact.map((value) => Math.max(value, 3e-4)),
        belowLimit: exact.map((value) => value < 3e-4),
      }),
    );
    expect(a.verdict).toBe('first');
    expect(a.fits.saturating).toBeUndefined();
  });
});

import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { analyseSeries } from '../../../../src/kinetics';
import { decaySeries, seededNormal, sharedDigits, times } from '../../../fixtures/decaySeries';

interface Reference {
  law: 'first' | 'second' | 'saturating';
  absolute: number;
  relative: number;
  t: number[];
  c: number[];
  c0: number;
  kRel: number;
  c0Se: number;
  kRelSe: number;
  rss: number;
}

const reference = JSON.parse(
  readFileSync(new URL('../../../reference/weightedFits.json', import.meta.url), 'utf8'),
) as { source: string; wells: Reference[] };

describe('readings of declared precision', () => {
  it.each(reference.wells.map((well, i) => [i, well.law, well] as const))(
    'well %i, %s, agrees with SciPy',
    (_, law, well) => {
      const { absolute, relative } = well;
      const a = analyseSeries(
        decaySeries({ law, precision: { absolute, relative }, timesS: well.t, values: well.c }),
      );
      const fit = a.fits[law]!;
      // Weights come from the law that fits best; where that is this one the answers are the same.
      const best = Object.entries(a.fits).reduce((x, y) =>
        (y[1].aicc ?? 0) < (x[1].aicc ?? 0) ? y : x,
      );
      const digits = best[0] === law ? 6 : 2;
      expect(sharedDigits(fit.kRel, well.kRel)).toBeGreaterThan(digits);
      expect(sharedDigits(fit.c0, well.c0)).toBeGreaterThan(digits);
      expect(sharedDigits(fit.kRelSe, well.kRelSe)).toBeGreaterThan(digits - 1.5);
      expect(sharedDigits(fit.c0Se, well.c0Se)).toBeGreaterThan(digits - 1.5);
    },
  );

  it('constant precision changes nothing', () => {
    const normal = seededNormal(4);
    const t = times(24, 3000);
    const values = t.map((time) => 0.01 * (Math.exp(-7e-4 * time) + 0.01 * normal()));
    const plain = analyseSeries(decaySeries({ timesS: t, values }));
    const declared = analyseSeries(
      decaySeries({ timesS: t, values, precision: { absolute: 1e-4, relative: 0 } }),
    );
    expect(declared.verdict).toBe(plain.verdict);
    for (const law of ['zero', 'first', 'second', 'saturating'] as const) {
      expect(sharedDigits(declared.fits[law]!.kRel, plain.fits[law]!.kRel!)).toBeGreaterThan(6);
      expect(sharedDigits(declared.fits[law]!.rss, plain.fits[law]!.rss)).toBeGreaterThan(8);
    }
  });

  it('proportional noise: k is surer with its weights, and its interval holds', () => {
    let [hits, tighter] = [0, 0];
    const runs = 300;
    for (let seed = 1; seed <= runs; seed += 1) {
      const normal = seededNormal(seed);
      const t = times(20, 5000);
      const values = t.map((time) => 0.01 * Math.exp(-8e-4 * time) * (1 + 0.04 * normal()));
      const given = { law: 'first' as const, timesS: t, values };
      const plain = analyseSeries(decaySeries(given)).k!;
      const { k } = analyseSeries(
        decaySeries({ ...given, precision: { absolute: 0, relative: 0.04 } }),
      );
      if (k!.low! <= 8e-4 && 8e-4 <= k!.high!) hits += 1;
      if (k!.se! < plain.se!) tighter += 1;
    }
    expect(hits / runs).toBeGreaterThan(0.92);
    expect(hits / runs).toBeLessThan(0.98);
    expect(tighter / runs).toBeGreaterThan(0.9);
  });

  it.each(['product', 'conversion'] as const)('of %s are weighted too', (kind) => {
    const normal = seededNormal(6);
    const t = times(20, 4000);
    const values = t.map((time) => {
      const x = -Math.expm1(-6e-4 * time);
      return (kind === 'product' ? 0.01 * x : x) * (1 + 0.02 * normal());
    });
    const a = analyseSeries(
      decaySeries({
        kind,
        law: 'first',
        initialConcentration: kind === 'conversion' ? 0.01 : null,
        precision: { absolute: kind === 'product' ? 2e-5 : 2e-3, relative: 0.02 },
        timesS: t,
        values,
      }),
    );
    expect(a.k!.value / 6e-4).toBeCloseTo(1, 1);
    expect(a.outliers).toEqual([]);
  });
});

import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { analyseScreen, analyseSeries, evaluateFit } from '../../../../src/kinetics';
import { decaySeries, seededNormal, sharedDigits, times } from '../../../fixtures/decaySeries';

interface Reference {
  order: number;
  t: number[];
  c: number[];
  amplitude: number;
  kRel: number;
  level: number;
  kRelSe: number;
  levelSe: number;
  rss: number;
}

const reference = JSON.parse(
  readFileSync(new URL('../../../reference/levelFits.json', import.meta.url), 'utf8'),
) as { source: string; wells: Reference[] };

const nameOf = (order: number) => (order === 1 ? ('first' as const) : ('second' as const));

describe('a level that stays', () => {
  it.each(reference.wells.map((well, i) => [i, well] as const))(
    'agrees with SciPy on well %i',
    (_, well) => {
      const law = nameOf(well.order);
      const series = decaySeries({ law, level: true, timesS: well.t, values: well.c });
      const a = analyseSeries(series);
      const fit = a.fits[law]!;
      expect(sharedDigits(fit.kRel, well.kRel)).toBeGreaterThan(6);
      expect(sharedDigits(fit.kRelSe, well.kRelSe)).toBeGreaterThan(5);
      expect(sharedDigits(a.level!.value, well.level)).toBeGreaterThan(6);
      expect(sharedDigits(a.level!.se, well.levelSe)).toBeGreaterThan(5);
      expect(sharedDigits(a.c0!.value, well.amplitude + well.level)).toBeGreaterThan(6);
      expect(fit.rss).toBeLessThanOrEqual(well.rss * (1 + 1e-9));
      // k is that of the approach: r0 = k (C0 − C∞)ⁿ.
      const r0 = fit.k! * well.amplitude ** well.order;
      expect(sharedDigits(a.initialRate!.value, r0)).toBeGreaterThan(6);
      expect(a.warnings).toContain('level-by-request');
      const curve = evaluateFit(a, law, fit, well.t)!;
      const rss = curve.values.reduce((sum, c, i) => sum + (c - well.c[i]!) ** 2, 0);
      expect(sharedDigits(rss, fit.rss)).toBeGreaterThan(6);
      expect(curve.low![0]!).toBeLessThan(curve.values[0]!);
    },
  );

  const t = times(40, 6000);
  const normal = seededNormal(2);
  const approach = (level: number) =>
    t.map((time) => 0.01 * (level + (1 - level) * Math.exp(-9e-4 * time) + 0.003 * normal()));

  it('finds the order beside it where the readings tell', () => {
    const a = analyseSeries(decaySeries({ level: true, timesS: t, values: approach(0.3) }));
    expect(a.verdict).toBe('first');
    expect(a.k!.low!).toBeLessThan(9e-4);
    expect(a.k!.high!).toBeGreaterThan(9e-4);
    expect(a.level!.value / 0.003).toBeCloseTo(1, 1);
    expect(a.conversion!).toBeCloseTo(0.7 * (1 - Math.exp(-5.4)), 1);
  });

  it('is a baseline under a signal, which is no concentration', () => {
    const values = t.map((time) => 40 + 200 * Math.exp(-9e-4 * time) + 0.5 * normal());
    const a = analyseSeries(
      decaySeries({
        kind: 'signal',
        dimension: 'ratio',
        level: true,
        law: 'first',
        timesS: t,
        values,
      }),
    );
    expect(a.level!.value / 40).toBeCloseTo(1, 1);
    expect(a.c0!.value / 200).toBeCloseTo(1, 1);
    expect(a.k!.value / 9e-4).toBeCloseTo(1, 1);
    expect(a.conversion!).toBeCloseTo(1 - Math.exp(-5.4), 2);
  });

  it('is what conversion falls short of', () => {
    const values = t.map((time) => 0.6 * -Math.expm1(-9e-4 * time) + 0.002 * normal());
    const a = analyseSeries(
      decaySeries({
        kind: 'conversion',
        initialConcentration: 0.01,
        level: true,
        law: 'first',
        timesS: t,
        values,
      }),
    );
    expect(a.level!.value / 0.004).toBeCloseTo(1, 1);
    expect(a.k!.value / 9e-4).toBeCloseTo(1, 1);
    expect(a.initialRate!.value / (0.006 * 9e-4)).toBeCloseTo(1, 1);
  });

  it('leaves a catalyst k and Ea, but neither rate nor time at the reference', () => {
    const wells = [313.15, 323.15, 333.15].map((temperatureK) =>
      decaySeries({
        id: `${temperatureK}`,
        temperatureK,
        level: true,
        law: 'first',
        timesS: t,
        values: approach(0.3),
      }),
    );
    const [found] = analyseScreen(wells, {
      temperatureK: 323.15,
      concentration: 0.01,
      loadingGPerL: null,
      targetConversion: 0.8,
    }).catalysts;
    expect(found!.kRef!.value / 9e-4).toBeCloseTo(1, 1);
    expect(found!.rateRef).toBeNull();
    expect(found!.timeToTarget).toBeNull();
  });

  it('of readings that do not fall is no reaction', () => {
    const flat = t.map(() => 0.01 * (1 + 0.01 * normal()));
    expect(analyseSeries(decaySeries({ level: true, timesS: t, values: flat })).verdict).toBe(
      'no-reaction',
    );
  });
});

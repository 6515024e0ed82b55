import { describe, expect, it } from 'vitest';
import {
  analyseSeries,
  evaluateArrhenius,
  evaluateFit,
  reactantConcentrations,
  straighten,
} from '../../../src/kinetics';
import { fitArrhenius } from '../../../src/kinetics/catalyst/fitArrhenius';
import { decaySeries, seededNormal, times } from '../../fixtures/decaySeries';

const t = times(16, 1800);
const truth = (time: number) => 0.01 * Math.exp(-1e-3 * time);
const noisy = (seed: number) => {
  const normal = seededNormal(seed);
  return t.map((time) => truth(time) + 1e-4 * normal());
};
const first = (values: number[], given = {}) =>
  analyseSeries(decaySeries({ timesS: t, values, law: 'first', ...given }));

describe('fitted curve and band', () => {
  it('goes through the fit at time 0 with the error of C0 as half width', () => {
    const a = first(noisy(1));
    const curve = evaluateFit(a, 'first', a.fits.first!, [0, 600])!;
    expect(curve.values[0]).toBeCloseTo(a.c0!.value, 12);
    expect(curve.low![0]).toBeCloseTo(a.c0!.low!, 12);
    expect(curve.high![0]).toBeCloseTo(a.c0!.high!, 12);
  });

  it('covers the true curve in 93 to 97 % of 1000 runs', () => {
    let covered = 0;
    for (let seed = 1; seed <= 1000; seed += 1) {
      const a = first(noisy(seed * 6151));
      const curve = evaluateFit(a, 'first', a.fits.first!, [700])!;
      if (curve.low![0]! <= truth(700) && truth(700) <= curve.high![0]!) covered += 1;
    }
    expect(covered).toBeGreaterThanOrEqual(930);
    expect(covered).toBeLessThanOrEqual(970);
  });

  it('is drawn in the readings of product and conversion', () => {
    const product = noisy(2).map((c) => 2 * (0.01 - c));
    const a = first(product, { kind: 'product', productPerReactant: 2 });
    const curve = evaluateFit(a, 'first', a.fits.first!, [900])!;
    expect(curve.values[0]).toBeCloseTo(2 * (0.01 - truth(900)), 3);
    expect(curve.low![0]).toBeLessThan(curve.values[0]!);
    const x = noisy(2).map((c) => 1 - c / 0.01);
    const b = first(x, { kind: 'conversion', dimension: 'ratio' });
    const conversion = evaluateFit(b, 'first', b.fits.first!, [-5, 900])!;
    expect(conversion.values[0]).toBeCloseTo(0, 14);
    expect(conversion.values[1]).toBeCloseTo(1 - Math.exp(-0.9), 1);
    expect(conversion.high![1]).toBeGreaterThan(conversion.values[1]!);
  });

  it('a product that has not run out is a straight line; other laws there have no curve', () => {
    const values = t.map((time, i) => 1e-6 * time + (i % 2 ? 1e-6 : -1e-6));
    const a = analyseSeries(decaySeries({ timesS: t, values, kind: 'product', law: 'zero' }));
    const line = evaluateFit(a, 'zero', a.fits.zero!, [0, 1000])!;
    expect(line.values[0]).toBe(0);
    expect(line.values[1]! / 1e-3).toBeCloseTo(1, 2);
    expect(line.high![1]).toBeGreaterThan(line.values[1]!);
    expect(evaluateFit(a, 'second', { ...a.fits.zero!, k: null }, [0])).toBeNull();
  });

  it('a forced broken order is drawn too, a law that is not there is not', () => {
    const a = first(noisy(3), { law: { order: 1.5 } });
    expect(evaluateFit(a, 'order', a.fits.order!, [0])!.values[0]).toBeCloseTo(a.c0!.value, 12);
    expect(evaluateFit(a, 'saturating', a.fits.order!, [0])).toBeNull();
  });
});

describe('Arrhenius band', () => {
  const points = [300, 320, 340].map((temperatureK) => ({
    seriesId: '',
    temperatureK,
    lnK: 5 - 6000 / temperatureK,
    se: 0.05,
    block: '',
  }));
  it('encloses the line where there is an interval', () => {
    const band = evaluateArrhenius(fitArrhenius(points)!, [310]);
    expect(band.values[0]).toBeCloseTo(5 - 6000 / 310, 10);
    expect(band.low![0]).toBeLessThan(band.values[0]!);
  });
  it('is missing with two temperatures', () => {
    expect(evaluateArrhenius(fitArrhenius(points.slice(0, 2))!, [310]).low).toBeNull();
  });
});

describe('straightened coordinates', () => {
  it('are C, ln C and 1/C; what is not above 0 has only C', () => {
    expect(straighten([0, 1, 2], [0.5, null, -0.1])).toEqual([
      { timeS: 0, zero: 0.5, first: Math.log(0.5), second: 2 },
      { timeS: 2, zero: -0.1, first: null, second: null },
    ]);
  });
  it('need readings as concentrations of the reactant', () => {
    const c0 = { value: 2, se: null, low: null, high: null };
    const of = (kind: 'signal' | 'conversion' | 'product', known: typeof c0 | null) =>
      reactantConcentrations({ kind, productPerReactant: 2, c0: known }, [1, null]);
    expect(of('signal', null)).toEqual([1, null]);
    expect(of('conversion', c0)).toEqual([0, null]);
    expect(of('conversion', null)).toEqual([0, null]);
    expect(of('product', c0)).toEqual([1.5, null]);
    expect(of('product', null)).toBeNull();
  });
});

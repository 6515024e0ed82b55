import { describe, expect, it } from 'vitest';
import { analyseScreen, GAS_CONSTANT, rateLaws } from '../../../../src/kinetics';
import { fitBesideBlank } from '../../../../src/kinetics/blanks/fitBesideBlank';
import { timeBesideBlank } from '../../../../src/kinetics/blanks/timeBesideBlank';
import type { DecaySeries } from '../../../../src/kinetics/types';
import { decaySeries, seededNormal, sharedDigits, times } from '../../../fixtures/decaySeries';

const C0 = 0.01;
const T = times(24, 3600);

/** First order beside a constant rate b: C = (C0 + b/k) e^(−k t) − b/k. */
const firstBesideZero = (k: number, b: number) => (t: number) =>
  (C0 + b / k) * Math.exp(-k * t) - b / k;
/** Second order beside first order b: dC/dt = −k C² − b C, Bernoulli's equation. */
const secondBesideFirst = (k: number, b: number) => (t: number) =>
  (b * C0 * Math.exp(-b * t)) / (b + k * C0 * -Math.expm1(-b * t));

describe('a constant fitted beside the blank', () => {
  const [first, second] = [rateLaws[1]!, rateLaws[2]!];

  it('of another order: rates add, constants do not', () => {
    const [k, b] = [8e-4, 4e-7];
    const well = decaySeries({ timesS: T, values: T.map(firstBesideZero(k, b)) });
    const own = fitBesideBlank(well, 1, { order: 0, k: b, se: 0 }, { k: 1e-3, c0: 0.0095 });
    expect(sharedDigits(own!.k, k)).toBeGreaterThan(7);
  });

  it('in product and conversion readings too', () => {
    const [k, b] = [0.07, 1.5e-4];
    const c = T.map(secondBesideFirst(k, b));
    const product = decaySeries({
      kind: 'product',
      productPerReactant: 2,
      timesS: T,
      values: c.map((value) => 2 * (C0 - value)),
    });
    const conversion = decaySeries({
      kind: 'conversion',
      initialConcentration: C0,
      timesS: T,
      values: c.map((value) => 1 - value / C0),
    });
    for (const well of [product, conversion]) {
      const own = fitBesideBlank(well, 2, { order: 1, k: b, se: 0 }, { k: 0.1, c0: C0 });
      expect(sharedDigits(own!.k, k), well.kind).toBeGreaterThan(7);
    }
  });

  it('gives the time in which both work together', () => {
    const blank = { order: 0, k: 4e-7, se: 0 };
    const k = { lnK: Math.log(8e-4), se: 0.02, dof: 10, temperatureK: 333 };
    const time = timeBesideBlank(k, first, blank, C0, 0.8)!;
    expect(sharedDigits(firstBesideZero(8e-4, 4e-7)(time.value), 0.2 * C0)).toBeGreaterThan(7);
    const other = { lnK: Math.log(0.07), se: 0.02, dof: 10, temperatureK: 333 };
    const later = timeBesideBlank(other, second, { order: 1, k: 1.5e-4, se: 1e-5 }, C0, 0.7)!;
    expect(sharedDigits(secondBesideFirst(0.07, 1.5e-4)(later.value), 0.3 * C0)).toBeGreaterThan(7);
    expect(later.low!).toBeLessThan(later.value);
  });
});

const CONDITIONS = {
  temperatureK: 333.15,
  concentration: C0,
  loadingGPerL: 5,
  targetConversion: 0.8,
};
const arrhenius = (k: number, energy: number, temperatureK: number) =>
  k * Math.exp((-energy / GAS_CONSTANT) * (1 / temperatureK - 1 / 333.15));

/** A first-order catalyst at 2.5 g/L and, at the same temperatures, its blanks. */
function screen(
  own: number,
  blank: number,
  blanksAt: readonly number[],
  given: Partial<DecaySeries> = {},
) {
  const normal = seededNormal(7);
  const well = (
    id: string,
    temperatureK: number,
    k: number,
    last: number,
    role: DecaySeries['role'],
  ) =>
    decaySeries({
      id,
      role,
      catalyst: role === 'sample' ? 'MB-07' : null,
      temperatureK,
      loadingGPerL: role === 'blank' ? null : 2.5,
      timesS: times(24, last),
      values: times(24, last).map((t) => C0 * (Math.exp(-k * t) + 0.002 * normal())),
      ...(role === 'sample' ? {} : given),
    });
  const set = [313.15, 323.15, 333.15, 343.15];
  return [
    ...set.flatMap((temperatureK) =>
      [1, 2].map((i) => {
        const k = arrhenius(own, 55_000, temperatureK) + arrhenius(blank, 80_000, temperatureK);
        return well(`s ${temperatureK} ${i}`, temperatureK, k, 1.6 / k, 'sample');
      }),
    ),
    ...blanksAt.flatMap((temperatureK) =>
      [1, 2].map((i) => {
        const k = arrhenius(blank, 80_000, temperatureK);
        return well(
          `b ${temperatureK} ${i}`,
          temperatureK,
          k,
          k > 0 ? 1.6 / k : 4000,
          given.role ?? 'blank',
        );
      }),
    ),
  ];
}

describe('blanks of a screen', () => {
  it('are taken off before k is brought to the reference loading, and work on in the time', () => {
    const found = analyseScreen(screen(6e-4, 2e-4, [313.15, 323.15, 333.15, 343.15]), CONDITIONS);
    const [catalyst] = found.catalysts;
    expect(catalyst!.verdict).toBe('first');
    expect(catalyst!.warnings).toContain('blank-subtracted');
    // Twice the loading: twice the catalyst, the same blank.
    expect(catalyst!.kRef!.value / 1.2e-3).toBeCloseTo(1, 2);
    expect(catalyst!.activationEnergy!.low!).toBeLessThan(55_000);
    expect(catalyst!.activationEnergy!.high!).toBeGreaterThan(55_000);
    expect(catalyst!.timeToTarget!.value / (-Math.log(0.2) / 1.4e-3)).toBeCloseTo(1, 2);
    const well = found.series.find(({ id }) => id === 's 333.15 1')!;
    expect(well.k!.value / 8e-4).toBeCloseTo(1, 1);
    expect(well.net!.k!.value / 6e-4).toBeCloseTo(1, 1);
    // Both fits are uncertain, and so is what is left.
    expect(well.net!.k!.se!).toBeGreaterThan(well.k!.se!);
    expect(well.net!.initialRate!.value / (6e-4 * C0)).toBeCloseTo(1, 1);
  });

  it('between measured temperatures stand on their own line', () => {
    const [catalyst] = analyseScreen(screen(6e-4, 2e-4, [313.15, 343.15]), CONDITIONS).catalysts;
    expect(catalyst!.warnings).toContain('blank-subtracted');
    expect(catalyst!.kRef!.value / 1.2e-3).toBeCloseTo(1, 2);
  });

  it('that do not reach a temperature leave everything gross, with a warning', () => {
    const [catalyst] = analyseScreen(screen(6e-4, 2e-4, [333.15]), CONDITIONS).catalysts;
    expect(catalyst!.warnings).toContain('blank-reacts');
    expect(Math.abs(catalyst!.kRef!.value / 1.6e-3 - 1)).toBeLessThan(0.02);
  });

  it('that are dead take nothing off', () => {
    const found = analyseScreen(screen(6e-4, 0, [313.15, 333.15, 343.15]), CONDITIONS);
    expect(found.catalysts[0]!.warnings).toEqual([]);
    const well = found.series.find(({ id }) => id === 's 333.15 1')!;
    expect(well.net!.k!.value).toBe(well.k!.value);
  });

  it('with bare support grow with the loading of the well', () => {
    const given = { role: 'support-blank' as const, loadingGPerL: 5 };
    const wells = screen(6e-4, 2e-4, [313.15, 323.15, 333.15, 343.15], given);
    const { series } = analyseScreen(wells, CONDITIONS);
    const well = series.find(({ id }) => id === 's 333.15 1')!;
    // The support blank had twice the mass of this well.
    expect(well.net!.k!.value / (8e-4 - 1e-4)).toBeCloseTo(1, 1);
  });

  it('absent: there is no net figure', () => {
    const { series } = analyseScreen(screen(6e-4, 0, []), CONDITIONS);
    expect(series.every(({ net }) => net === null)).toBe(true);
  });

  it('equal to the catalyst leave nothing, and it is said', () => {
    const [catalyst] = analyseScreen(
      screen(1e-12, 6e-4, [313.15, 323.15, 333.15, 343.15]),
      CONDITIONS,
    ).catalysts;
    const low = catalyst!.kRef?.low ?? 0;
    expect(low < 1e-4 || catalyst!.warnings.includes('not-above-blank')).toBe(true);
  });
});

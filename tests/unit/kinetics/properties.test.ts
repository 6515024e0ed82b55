import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { analyseScreen, analyseSeries } from '../../../src/kinetics';
import type { DecaySeries, LawRequest, SeriesAnalysis } from '../../../src/kinetics/types';
import { decaySeries, seededNormal, times } from '../../fixtures/decaySeries';

const NONE = {
  temperatureK: 333.15,
  concentration: 0.01,
  loadingGPerL: 2.5,
  targetConversion: 0.8,
};

/** Fails when a number anywhere is not finite. */
function expectFinite(value: unknown, path: string): void {
  if (typeof value === 'number') expect(Number.isFinite(value), path).toBe(true);
  else if (value !== null && typeof value === 'object') {
    for (const [key, inner] of Object.entries(value)) expectFinite(inner, `${path}/${key}`);
  }
}

const LAWS: readonly LawRequest[] = [
  'zero',
  'first',
  'second',
  'saturating',
  { order: 1.5 },
  { order: 0.5 },
];
/** k ∝ concentration^(1 − n) time^−1; the saturating k is a rate, K a reciprocal concentration. */
const powerOf = (law: LawRequest) =>
  typeof law === 'object'
    ? 1 - law.order
    : { zero: 1, first: 0, second: -1, saturating: 1, auto: 0 }[law];

const noisyWell = (seed: number, conversion: number): { t: number[]; c: number[] } => {
  const normal = seededNormal(seed);
  const t = times(20, 3000);
  const k = -Math.log(1 - conversion) / 3000;
  return { t, c: t.map((time) => 0.01 * (Math.exp(-k * time) + 0.01 * normal())) };
};

const close = (a: number | null | undefined, b: number | null | undefined, tolerance: number) => {
  if (a == null || b == null) expect(a ?? null).toBe(b ?? null);
  else expect(Math.abs(a - b)).toBeLessThanOrEqual(tolerance * Math.max(Math.abs(b), 1e-300));
};

describe('units', () => {
  it('scaling time and concentration by powers of two scales k as its unit says', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...LAWS),
        fc.integer({ min: 1, max: 500 }),
        fc.double({ min: 0.3, max: 0.97, noNaN: true }),
        fc.integer({ min: -12, max: 12 }),
        fc.integer({ min: -12, max: 12 }),
        (law, seed, conversion, slower, stronger) => {
          const { t, c } = noisyWell(seed, conversion);
          const [byTime, byConcentration] = [2 ** slower, 2 ** stronger];
          const one = analyseSeries(decaySeries({ law, timesS: t, values: c }));
          const other = analyseSeries(
            decaySeries({
              law,
              timesS: t.map((time) => time * byTime),
              values: c.map((value) => value * byConcentration),
            }),
          );
          expect(other.verdict).toBe(one.verdict);
          const factor = byConcentration ** powerOf(law) / byTime;
          close(other.k?.value, one.k && one.k.value * factor, 1e-10);
          close(other.k?.se, one.k?.se == null ? null : one.k.se * factor, 1e-6);
          close(
            other.adsorptionConstant?.value,
            one.adsorptionConstant && one.adsorptionConstant.value / byConcentration,
            1e-10,
          );
        },
      ),
      { numRuns: 120, seed: 7 },
    );
  });
});

describe('order of appearance', () => {
  const wells = [1, 2, 3, 4, 5, 6, 7, 8].map((seed) => {
    const { t, c } = noisyWell(seed, 0.4 + 0.06 * seed);
    return decaySeries({
      id: `${seed}`,
      catalyst: seed % 2 === 0 ? 'A' : 'B',
      temperatureK: 303.15 + 10 * Math.ceil(seed / 2),
      loadingGPerL: 2.5,
      timesS: t,
      values: c,
    });
  });
  const whole = analyseScreen(wells, NONE);

  it('of wells does not matter', () => {
    fc.assert(
      fc.property(fc.shuffledSubarray(wells, { minLength: 8, maxLength: 8 }), (shuffled) => {
        const found = analyseScreen(shuffled, NONE);
        for (const one of whole.series) {
          expect(found.series.find(({ id }) => id === one.id)).toEqual(one);
        }
        for (const one of whole.catalysts) {
          const other = found.catalysts.find(({ catalyst }) => catalyst === one.catalyst)!;
          expect(other.verdict).toBe(one.verdict);
          close(other.kRef?.value, one.kRef?.value, 1e-10);
          close(other.activationEnergy?.value, one.activationEnergy?.value, 1e-10);
          close(other.rateRef?.value, one.rateRef?.value, 1e-10);
        }
      }),
      { numRuns: 20, seed: 7 },
    );
  });

  it('of readings does not matter', () => {
    const { t, c } = noisyWell(11, 0.8);
    const sorted = analyseSeries(decaySeries({ timesS: t, values: c }));
    fc.assert(
      fc.property(
        fc.shuffledSubarray(
          t.map((_, i) => i),
          { minLength: 20, maxLength: 20 },
        ),
        (places) => {
          const found = analyseSeries(
            decaySeries({ timesS: places.map((i) => t[i]!), values: places.map((i) => c[i]!) }),
          );
          const comparable = ({ outliers, warnings, ...rest }: SeriesAnalysis) => ({
            ...rest,
            outliers: outliers.length,
            warnings: warnings.filter((code) => code !== 'unsorted-times'),
          });
          expect(comparable(found)).toEqual(comparable(sorted));
        },
      ),
      { numRuns: 20, seed: 7 },
    );
  });
});

describe('the clock', () => {
  it('started earlier or later changes C0 of a first-order decay only', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 500 }),
        fc.double({ min: -2000, max: 2000, noNaN: true }),
        (seed, shift) => {
          const { t, c } = noisyWell(seed, 0.8);
          const one = analyseSeries(decaySeries({ law: 'first', timesS: t, values: c }));
          const other = analyseSeries(
            decaySeries({ law: 'first', timesS: t.map((time) => time + shift), values: c }),
          );
          close(other.k!.value, one.k!.value, 1e-8);
          close(other.k!.se, one.k!.se, 1e-6);
          close(other.conversion, one.conversion, 1e-8);
          close(other.initialRate!.value, one.initialRate!.value, 1e-8);
          close(other.c0!.value, one.c0!.value * Math.exp(one.k!.value * shift), 1e-6);
        },
      ),
      { numRuns: 60, seed: 7 },
    );
  });
});

describe('whatever comes', { timeout: 30_000 }, () => {
  const odd = fc.oneof(
    fc.double(),
    fc.constantFrom(0, -0, 1, 1e300, -1e300, 1e-300, 5e-324, NaN, Infinity, -Infinity),
    fc.double({ min: 0, max: 1, noNaN: true }),
  );
  const series = fc
    .record({
      pairs: fc.array(fc.tuple(odd, fc.oneof(odd, fc.constant(null))), { maxLength: 14 }),
      kind: fc.constantFrom('reactant', 'product', 'conversion', 'signal'),
      role: fc.constantFrom('sample', 'blank', 'support-blank', 'control', 'benchmark'),
      law: fc.constantFrom<LawRequest>('auto', ...LAWS),
      temperatureK: fc.constantFrom(1e-3, 298.15, 333.15, 1e6),
      initialConcentration: fc.constantFrom(null, 0.01, 1e-300, 1e300),
      loadingGPerL: fc.constantFrom(null, 2.5, 1e-300),
      siteDensityMolPerKg: fc.constantFrom(null, 0.05),
      level: fc.boolean(),
      belowLimit: fc.constantFrom(
        null,
        [true, false, true],
        [false, false, false, false, true, true],
      ),
      precision: fc.constantFrom(
        null,
        { absolute: 1e-4, relative: 0.02 },
        { absolute: 0, relative: 0.05 },
      ),
    })
    .map(
      ({
        pairs,
        kind,
        ...given
      }): Partial<DecaySeries> & Pick<DecaySeries, 'timesS' | 'values'> => ({
        ...given,
        kind: kind,
        dimension: kind === 'signal' || kind === 'conversion' ? 'ratio' : 'concentration',
        timesS: pairs.map(([time]) => time),
        values: pairs.map(([, value]) => value),
      }),
    );

  it('gets an answer, never an exception and never a NaN', () => {
    fc.assert(
      fc.property(fc.array(series, { minLength: 1, maxLength: 5 }), (given) => {
        const wells = given.map((one, i) => decaySeries({ ...one, id: `${i}` }));
        const found = analyseScreen(wells, NONE);
        expect(found.series).toHaveLength(wells.length);
        // What is given comes back as given; what is found must be finite.
        for (const { productPerReactant: _, ...one } of found.series) expectFinite(one, one.id);
        for (const one of found.catalysts) expectFinite(one, one.catalyst);
      }),
      { numRuns: 1200, seed: 7 },
    );
  });

  it.each([
    ['one point', [0], [1]],
    ['no point', [], []],
    ['equal times', [5, 5, 5, 5, 5, 5], [1, 2, 3, 4, 5, 6]],
    ['all zeros', times(10, 100), Array<number>(10).fill(0)],
    ['one value all along', times(10, 100), Array<number>(10).fill(0.3)],
    ['huge', times(10, 1e300), times(10, 100).map((t) => 1e300 * Math.exp(-t / 50))],
    ['tiny', times(10, 1e-150), times(10, 100).map((t) => 1e-150 * Math.exp(-t / 50))],
  ])('%s', (_, t, c) => {
    for (const law of ['auto', ...LAWS] as const) {
      expectFinite(analyseScreen([decaySeries({ law, timesS: t, values: c })], NONE), '');
    }
  });
});

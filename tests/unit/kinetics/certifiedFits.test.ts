import { describe, expect, it } from 'vitest';
import { analyseSeries } from '../../../src/kinetics';
import { linearTrend } from '../../../src/kinetics/statistics/linearTrend';
import type { LawRequest } from '../../../src/kinetics/types';
import { decaySeries, sharedDigits } from '../../fixtures/decaySeries';
import nist from '../../reference/nist.json';
import published from '../../reference/publishedDecays.json';
import simulated from '../../reference/simulatedWells.json';

/** NIST StRD sets that are integrated rate laws of product growth, P = C0 (1 − g(kRel t)). */
const growth: [string, LawRequest][] = [
  ['Misra1a', 'first'],
  ['BoxBOD', 'first'],
  ['Misra1d', 'second'],
  ['Misra1b', { order: 1.5 }],
  ['Misra1c', { order: 3 }],
];
const nistSet = (name: string) => nist.sets.find((set) => set.name === name)!;

describe('certified nonlinear sets (NIST StRD), fitted as product growth', () => {
  it.each(growth)('%s under law %j agrees to 9 digits', (name, law) => {
    const { x, y, certified } = nistSet(name);
    const analysis = analyseSeries(decaySeries({ timesS: x, values: y, kind: 'product', law }));
    const fit = analysis.fits[analysis.shownLaw!]!;
    expect(sharedDigits(fit.c0, certified.b1)).toBeGreaterThan(9);
    expect(sharedDigits(fit.kRel, certified.b2!)).toBeGreaterThan(9);
    expect(sharedDigits(fit.c0Se, certified.sd_b1)).toBeGreaterThan(9);
    expect(sharedDigits(fit.kRelSe, certified.sd_b2!)).toBeGreaterThan(9);
    expect(sharedDigits(fit.rss, certified.rss)).toBeGreaterThan(9);
    expect(sharedDigits(fit.residualSd, certified.rsd)).toBeGreaterThan(9);
  });

  it.each(growth)('%s keeps its digits when readings and clock change their units', (name, law) => {
    const { x, y, certified } = nistSet(name);
    const small = decaySeries({
      timesS: x.map((t) => t * 3600),
      values: y.map((p) => p * 1e-12),
      kind: 'product',
      law,
    });
    const analysis = analyseSeries(small);
    const fit = analysis.fits[analysis.shownLaw!]!;
    expect(sharedDigits(fit.c0, certified.b1 * 1e-12)).toBeGreaterThan(9);
    expect(sharedDigits(fit.kRel, certified.b2! / 3600)).toBeGreaterThan(9);
  });
});

describe('certified straight lines (NIST StRD)', () => {
  it('Norris agrees to 9 digits', () => {
    const { x, y, certified } = nistSet('Norris') as ReturnType<typeof nistSet> & {
      certified: { b0: number; sd_b0: number };
    };
    const line = linearTrend(x, y);
    expect(sharedDigits(line.slope, certified.b1)).toBeGreaterThan(9);
    expect(sharedDigits(line.intercept, certified.b0)).toBeGreaterThan(9);
    expect(sharedDigits(line.rss, certified.rss)).toBeGreaterThan(9);
    // NIST names the slope b1 and its deviation sd_b1 here.
    expect(sharedDigits(line.slopeSe, certified.sd_b1)).toBeGreaterThan(9);
    expect(sharedDigits(line.interceptSe, certified.sd_b0)).toBeGreaterThan(9);
  });
});

describe('published decays', () => {
  const pinene = published.sets.filter((set) => set.name.startsWith('alpha-pinene'));

  it.each(pinene.map((set) => [set.name, set] as const))(
    '%s agrees with 50-digit fits and is first order',
    (_, set) => {
      const analysis = analyseSeries(decaySeries({ timesS: set.times, values: set.values }));
      // The reference line of zero order falls below 0; ours stops there and fits better.
      expect(analysis.fits.zero!.rss).toBeLessThan(set.fits.zero!.rss);
      for (const name of ['first', 'second'] as const) {
        const expected = set.fits[name];
        const fit = analysis.fits[name]!;
        expect(sharedDigits(fit.k, expected.k!)).toBeGreaterThan(9);
        expect(sharedDigits(fit.kSe, expected.kSe!)).toBeGreaterThan(8);
        expect(sharedDigits(fit.c0, expected.c0)).toBeGreaterThan(9);
        expect(sharedDigits(fit.c0Se, expected.c0Se)).toBeGreaterThan(8);
        expect(sharedDigits(fit.aicc, expected.aicc)).toBeGreaterThan(8);
      }
      expect(analysis.verdict).toBe('first');
    },
  );

  it('calcium uptake, growth whose first and second order differ by 1.3, is undetermined', () => {
    const set = published.sets.find((one) => one.name.startsWith('calcium'))!;
    const analysis = analyseSeries(
      decaySeries({ timesS: set.times, values: set.values, kind: 'product' }),
    );
    expect(analysis.verdict).toBe('undetermined');
    expect(analysis.initialRate!.value).toBeGreaterThan(0);
    const expected = set.fits.first as unknown as { kRel: number; c0: number; rss: number };
    expect(sharedDigits(analysis.fits.first!.kRel, expected.kRel)).toBeGreaterThan(8);
    expect(sharedDigits(analysis.fits.first!.c0, expected.c0)).toBeGreaterThan(8);
  });
});

/** What a reference fit of a simulated well says. */
interface WellReference {
  k: number;
  rss: number;
}

describe('simulated wells fitted elsewhere (SciPy, mpmath)', () => {
  it('every fit is at least as good, and the same constant where equally good', () => {
    let compared = 0;
    for (const well of simulated.wells) {
      if (well.truth === 'none') continue;
      const { fits } = analyseSeries(decaySeries({ timesS: well.times, values: well.values }));
      for (const [name, expected] of Object.entries(well.fits as Record<string, WellReference>)) {
        const fit = fits[name as 'zero' | 'first' | 'second']!;
        expect(fit.rss).toBeLessThanOrEqual(expected.rss * (1 + 1e-9));
        if (fit.rss < expected.rss * (1 - 1e-9)) continue;
        expect(sharedDigits(fit.k, expected.k)).toBeGreaterThan(8);
        compared += 1;
      }
    }
    expect(compared).toBeGreaterThan(300);
  });
});

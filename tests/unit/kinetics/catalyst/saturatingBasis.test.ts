import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { analyseScreen, analyseSeries, evaluateFit, GAS_CONSTANT } from '../../../../src/kinetics';
import { saturatingShape } from '../../../../src/kinetics/rateLaws/saturating';
import { decaySeries, seededNormal, sharedDigits, times } from '../../../fixtures/decaySeries';

interface Reference {
  id: string;
  t: number[];
  c: number[];
  k: number;
  K: number;
  kSe: number;
  KSe: number;
  rss: number;
}

const reference = JSON.parse(
  readFileSync(new URL('../../../reference/saturatingFits.json', import.meta.url), 'utf8'),
) as { source: string; wells: Reference[] };

/** C after t by −dC/dt = k K C/(1 + K C). */
function decay(k: number, adsorption: number, c0: number) {
  const load = adsorption * c0;
  const shape = saturatingShape(load / (1 + load));
  return (t: number) => c0 * shape.relative(((k * adsorption) / (1 + load)) * t);
}

const over = (energy: number, at: number, temperatureK: number) =>
  Math.exp((-energy / GAS_CONSTANT) * (1 / temperatureK - 1 / at));

const TRUE = { k: 1.4e-6, K: 1200, energy: 56_000, enthalpy: -26_000, at: 333.15 };
const C0 = 0.004;

function wells(noise: number, seed: number, law: 'auto' | 'saturating' = 'auto') {
  const normal = seededNormal(seed);
  return [313.15, 323.15, 333.15, 343.15].flatMap((temperatureK) => {
    const k = TRUE.k * over(TRUE.energy, TRUE.at, temperatureK);
    const adsorption = TRUE.K * over(TRUE.enthalpy, TRUE.at, temperatureK);
    const curve = decay(k, adsorption, C0);
    const t = times(30, (1.1 * C0) / k);
    return [1, 2].map((replicate) =>
      decaySeries({
        id: `${temperatureK} ${replicate}`,
        temperatureK,
        law,
        loadingGPerL: 2.5,
        timesS: t,
        values: t.map((time) => curve(time) + noise * C0 * normal()),
      }),
    );
  });
}

const CONDITIONS = {
  temperatureK: 333.15,
  concentration: 0.002,
  loadingGPerL: 5,
  targetConversion: 0.8,
};

describe('k and K of a well', () => {
  it.each(reference.wells)('agree with SciPy on $id', ({ t, c, k, K, kSe, KSe, rss }) => {
    const { fits } = analyseSeries(decaySeries({ timesS: t, values: c }));
    const { saturating } = fits;
    expect(sharedDigits(saturating!.k, k)).toBeGreaterThan(6);
    expect(sharedDigits(saturating!.saturation!.K, K)).toBeGreaterThan(6);
    expect(sharedDigits(saturating!.kSe, kSe)).toBeGreaterThan(4);
    expect(sharedDigits(saturating!.saturation!.KSe, KSe)).toBeGreaterThan(4);
    expect(saturating!.rss).toBeLessThanOrEqual(rss * (1 + 1e-10));
  });

  it('do not depend on when the clock was started', () => {
    const [well] = wells(0.005, 4, 'saturating');
    const late = { ...well!, timesS: well!.timesS.map((t) => t + 400) };
    const [a, b] = [analyseSeries(well!), analyseSeries(late)];
    expect(sharedDigits(b.k!.value, a.k!.value)).toBeGreaterThan(8);
    expect(sharedDigits(b.k!.se, a.k!.se!)).toBeGreaterThan(6);
    expect(sharedDigits(b.adsorptionConstant!.value, a.adsorptionConstant!.value)).toBeGreaterThan(
      8,
    );
    expect(sharedDigits(b.initialRate!.value, a.initialRate!.value)).toBeGreaterThan(8);
    expect(b.c0!.value).toBeGreaterThan(a.c0!.value);
  });

  it('draw a curve through the readings, with a band', () => {
    const [well] = wells(0.005, 4, 'saturating');
    const a = analyseSeries(well!);
    const curve = evaluateFit(a, 'saturating', a.fits.saturating!, well!.timesS)!;
    const rss = curve.values.reduce((sum, c, i) => sum + (c - well!.values[i]!) ** 2, 0);
    expect(sharedDigits(rss, a.fits.saturating!.rss)).toBeGreaterThan(8);
    // At t = 0 the band is that of c0.
    expect(
      sharedDigits(curve.high![0]! - curve.values[0]!, a.c0!.high! - a.c0!.value),
    ).toBeGreaterThan(8);
  });
});

describe('a catalyst that saturates', () => {
  it('gives back what it was made from, without noise', () => {
    const [found] = analyseScreen(wells(1e-7, 1), CONDITIONS).catalysts;
    expect(found!.verdict).toBe('saturating');
    expect(found!.order).toBeNull();
    expect(found!.kUnit).toBe('mol L^-1 s^-1');
    // The reference loading is twice that of the wells; K knows nothing of it.
    const k = 2 * TRUE.k;
    expect(sharedDigits(found!.kRef!.value, k)).toBeGreaterThan(4);
    expect(sharedDigits(found!.activationEnergy!.value, TRUE.energy)).toBeGreaterThan(4);
    expect(sharedDigits(found!.adsorption!.K.value, TRUE.K)).toBeGreaterThan(4);
    expect(sharedDigits(found!.adsorption!.enthalpy!.value, TRUE.enthalpy)).toBeGreaterThan(4);
    const load = TRUE.K * CONDITIONS.concentration;
    expect(sharedDigits(found!.rateRef!.value, (k * load) / (1 + load))).toBeGreaterThan(3);
    const time = (-Math.log(0.2) + load * 0.8) / (k * TRUE.K);
    expect(sharedDigits(found!.timeToTarget!.value, time)).toBeGreaterThan(3);
  });

  it('is told from the simple orders by its wells together, k and Ea within their intervals', () => {
    const runs = Array.from(
      { length: 40 },
      (_, seed) => analyseScreen(wells(0.01, seed), CONDITIONS).catalysts[0]!,
    );
    const told = runs.filter(({ verdict }) => verdict === 'saturating');
    expect(told.length).toBeGreaterThanOrEqual(38);
    const within = (low: number | null, high: number | null, value: number) =>
      low !== null && high !== null && low <= value && value <= high;
    const k = told.filter(({ kRef }) => within(kRef!.low, kRef!.high, 2 * TRUE.k));
    const energy = told.filter(({ activationEnergy: e }) => within(e!.low, e!.high, TRUE.energy));
    expect(k.length / told.length).toBeGreaterThanOrEqual(0.85);
    expect(energy.length / told.length).toBeGreaterThanOrEqual(0.85);
  });

  it('keeps rate and time where its wells are first order', () => {
    const t = times(30, 3600);
    const firstOrder = [313.15, 323.15, 333.15].map((temperatureK) =>
      decaySeries({
        id: `${temperatureK}`,
        temperatureK,
        law: 'saturating',
        timesS: t,
        values: t.map(
          (time) => 0.004 * Math.exp(-6e-4 * over(50_000, 333.15, temperatureK) * time),
        ),
      }),
    );
    const [found] = analyseScreen(firstOrder, { ...CONDITIONS, loadingGPerL: null }).catalysts;
    expect(found!.verdict).toBe('forced');
    expect(sharedDigits(found!.rateRef!.value, 6e-4 * 0.002)).toBeGreaterThan(4);
    expect(sharedDigits(found!.timeToTarget!.value, -Math.log(0.2) / 6e-4)).toBeGreaterThan(4);
    expect(found!.adsorption).toBeNull();
  });
});

describe('a forced saturating law', () => {
  it('is answered by k and K, order null', () => {
    const [well] = wells(0.005, 2, 'saturating');
    const a = analyseSeries(well!);
    expect(a.verdict).toBe('forced');
    expect(a.order).toBeNull();
    expect(a.kUnit).toBe('mol L^-1 s^-1');
    expect(a.adsorptionConstant!.low).not.toBeNull();
    expect(a.shownLaw).toBe('saturating');
  });

  it.each([3, 4, 5])('is fitted to %i readings too', (count) => {
    const curve = decay(1.4e-6, 1200, C0);
    const t = times(count, 3000);
    const a = analyseSeries(
      decaySeries({ law: 'saturating', timesS: t, values: t.map((time) => curve(time)) }),
    );
    expect(['forced', 'no-reaction']).toContain(a.verdict);
    if (a.verdict === 'forced') expect(a.k).not.toBeNull();
  });
});

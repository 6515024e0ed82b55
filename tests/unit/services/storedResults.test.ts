import { describe, expect, it } from 'vitest';
import { analyseScreen, evaluateFit } from '@/kinetics';
import { readCatalystAnalysis, readSeriesAnalysis } from '@/services/storedResults';
import { decaySeries, times } from '../../fixtures/decaySeries';

const { series, catalysts } = analyseScreen(
  [313.15, 323.15, 333.15].map((temperatureK) =>
    decaySeries({
      id: `${temperatureK}`,
      temperatureK,
      timesS: times(20, 3000),
      values: times(20, 3000).map((t, i) => 0.01 * Math.exp(-6e-4 * t) + (i % 2 ? 1e-4 : -1e-4)),
    }),
  ),
  { temperatureK: 323.15, concentration: 0.01, loadingGPerL: null, targetConversion: 0.8 },
);

/** The same without what engine 0.1 did not write. */
const without = (value: object, keys: readonly string[]) =>
  JSON.stringify(value, (key, inner: unknown) => (keys.includes(key) ? undefined : inner));

describe('stored results', () => {
  it('of this engine come back as they were', () => {
    expect(readSeriesAnalysis(JSON.stringify(series[0]))).toEqual(series[0]);
    expect(readCatalystAnalysis(JSON.stringify(catalysts[0]))).toEqual(catalysts[0]);
  });

  it('of engine 0.1 say null where they say nothing, and still draw', () => {
    const old = readSeriesAnalysis(
      without(series[0]!, ['saturation', 'level', 'adsorptionConstant', 'net']),
    );
    expect(old.adsorptionConstant).toBeNull();
    expect(old.net).toBeNull();
    expect(old.level).toBeNull();
    expect(evaluateFit(old, 'first', old.fits.first!, [0, 100])!.values).toHaveLength(2);
    const catalyst = readCatalystAnalysis(
      without(catalysts[0]!, ['adsorption', 'eyring', 'oneStep', 'massOrder']),
    );
    expect(catalyst).toMatchObject({
      adsorption: null,
      eyring: null,
      oneStep: null,
      massOrder: null,
    });
  });
});

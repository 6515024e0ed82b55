import { describe, expect, it } from 'vitest';
import { analyseScreen } from '../../../../src/kinetics';
import {
  benchmarkRatios,
  betweenPlateSpread,
  type RatedWell,
} from '../../../../src/kinetics/plate/benchmarkRatio';
import { decaySeries, seededNormal, times } from '../../../fixtures/decaySeries';

const REFERENCE = {
  temperatureK: null,
  concentration: null,
  loadingGPerL: null,
  targetConversion: null,
};

/** Wells whose k grows as loading^m, over two temperatures. */
function series(m: number, loadings: readonly number[], seed: number) {
  const normal = seededNormal(seed);
  return [323.15, 333.15].flatMap((temperatureK) =>
    loadings.map((loadingGPerL, i) => {
      const k = (temperatureK === 323.15 ? 3e-4 : 6e-4) * (loadingGPerL / 2) ** m;
      const t = times(20, 1.5 / k);
      return decaySeries({
        id: `${temperatureK} ${i}`,
        temperatureK,
        loadingGPerL,
        timesS: t,
        values: t.map((time) => 0.01 * (Math.exp(-k * time) + 0.01 * normal())),
      });
    }),
  );
}

describe('rate against catalyst mass', () => {
  it('in proportion, in the kinetic regime', () => {
    const [found] = analyseScreen(series(1, [1, 2, 4], 1), REFERENCE).catalysts;
    expect(found!.massOrder!.low!).toBeLessThan(1);
    expect(found!.massOrder!.high!).toBeGreaterThan(1);
    expect(found!.warnings).not.toContain('rate-below-mass');
  });
  it('that stays behind is a warning', () => {
    const [found] = analyseScreen(series(0.5, [1, 2, 4], 1), REFERENCE).catalysts;
    expect(found!.massOrder!.value).toBeCloseTo(0.5, 1);
    expect(found!.warnings).toContain('rate-below-mass');
  });
  it('says nothing where it was not varied', () => {
    const [found] = analyseScreen(series(1, [2, 2.1, 1.9], 1), REFERENCE).catalysts;
    expect(found!.massOrder).toBeNull();
  });
  it('seldom warns without a cause', () => {
    const alarms = Array.from(
      { length: 60 },
      (_, seed) => analyseScreen(series(1, [1, 2, 4], seed + 5), REFERENCE).catalysts[0]!,
    ).filter(({ warnings }) => warnings.includes('rate-below-mass'));
    expect(alarms.length).toBeLessThanOrEqual(2);
  });
});

describe('ratio to the benchmark of the same plate', () => {
  // Plates differ by 20 %; within a plate rates scatter by 3 %.
  const normal = seededNormal(3);
  const wells: RatedWell[] = [];
  const benchmarks: RatedWell[] = [];
  for (let plate = 0; plate < 6; plate += 1) {
    const level = 0.2 * normal();
    const base = { block: `${plate}`, temperatureK: 333.15, se: 0.03 };
    for (let i = 0; i < 2; i += 1) {
      benchmarks.push({ ...base, catalyst: 'B', lnRate: level + 0.03 * normal() });
      wells.push({ ...base, catalyst: 'A', lnRate: level + Math.log(1.5) + 0.03 * normal() });
    }
  }
  it('cancels what the plates differ by', () => {
    const [found] = benchmarkRatios(wells, benchmarks);
    expect(found!.blocks).toBe(6);
    expect(found!.ratio.low!).toBeLessThan(1.5);
    expect(found!.ratio.high!).toBeGreaterThan(1.5);
    expect(found!.ratio.high! / found!.ratio.low!).toBeLessThan(1.1);
    expect(betweenPlateSpread(benchmarks)!).toBeGreaterThan(0.08);
  });
  it('needs both on one plate', () => {
    expect(benchmarkRatios(wells, [])).toEqual([]);
    expect(betweenPlateSpread([])).toBeNull();
  });
});

import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { analyseSeries } from '../../../../src/kinetics';
import { fitLaw } from '../../../../src/kinetics/fitting/fitLaw';
import { scaleReadings } from '../../../../src/kinetics/fitting/problem';
import { profileRateConstant } from '../../../../src/kinetics/fitting/profileInterval';
import { collectReadings } from '../../../../src/kinetics/fitting/readings';
import { firstOrder } from '../../../../src/kinetics/rateLaws/firstOrder';
import { secondOrder } from '../../../../src/kinetics/rateLaws/secondOrder';
import { decaySeries, seededNormal, sharedDigits, times } from '../../../fixtures/decaySeries';

interface Reference {
  order: number;
  t: number[];
  c: number[];
  k: number;
  low: number;
  high: number | null;
}

const reference = JSON.parse(
  readFileSync(new URL('../../../reference/profileIntervals.json', import.meta.url), 'utf8'),
) as { source: string; wells: Reference[] };

describe('the profile of k', () => {
  it.each(reference.wells.map((well, i) => [i, well] as const))(
    'agrees with SciPy on well %i',
    (_, well) => {
      const series = decaySeries({ timesS: well.t, values: well.c });
      const law = well.order === 1 ? firstOrder : secondOrder;
      const fit = fitLaw(scaleReadings(collectReadings(series), 'reactant'), law);
      // An error that no parabola has: the profile is taken whatever the readings.
      const found = profileRateConstant(fit, 1e-3)!;
      if (well.low === 0) expect(found.low).toBe(0);
      else expect(sharedDigits(found.low * well.k, well.low)).toBeGreaterThan(5);
      if (well.high === null) expect(found.high).toBeNull();
      else expect(sharedDigits(found.high! * well.k, well.high)).toBeGreaterThan(5);
    },
  );

  it('is not taken where the plain interval says the same', () => {
    const normal = seededNormal(3);
    const t = times(40, 2000);
    const values = t.map((time) => 0.01 * (Math.exp(-1e-3 * time) + 0.005 * normal()));
    const { k } = analyseSeries(decaySeries({ law: 'first', timesS: t, values }));
    expect(k!.high! - k!.value).toBeCloseTo(k!.value - k!.low!, 12);
  });

  it('never lets a positive k reach below 0', () => {
    const normal = seededNormal(8);
    const t = times(8, 1000);
    const values = t.map((time) => 0.01 * (1 / (1 + 2e-3 * time) + 0.08 * normal()));
    const { k } = analyseSeries(decaySeries({ law: 'second', timesS: t, values }));
    expect(k!.low!).toBeGreaterThanOrEqual(0);
    expect(k!.high! - k!.value).toBeGreaterThan(k!.value - k!.low!);
  });
});

import { describe, expect, it } from 'vitest';
import { analyseSeries } from '../../../../src/kinetics';
import { collectReadings } from '../../../../src/kinetics/fitting/readings';
import type { ReadingKind } from '../../../../src/kinetics/types';
import { decaySeries } from '../../../fixtures/decaySeries';

const well = (timesS: number[], values: (number | null)[], kind: ReadingKind = 'reactant') =>
  decaySeries({
    timesS,
    values,
    kind,
    dimension: kind === 'conversion' ? 'ratio' : 'concentration',
  });

describe('collecting readings', () => {
  it('sorts by time, keeps equal times in order, and counts what is left out', () => {
    const readings = collectReadings(well([60, 0, NaN, 60, 30], [3, 1, 5, 4, null]));
    expect(readings.times).toEqual([0, 60, 60]);
    expect(readings.values).toEqual([1, 3, 4]);
    expect(readings.indices).toEqual([1, 0, 3]);
    expect([readings.excluded, readings.unsorted, readings.distinctTimes]).toEqual([2, true, 2]);
  });
  it('refuses times and values of different length by the name of the series', () => {
    expect(() => collectReadings(well([0, 1], [1]))).toThrow(/"P1-A1".*2 and 1/);
  });
});

describe('times that hold no curve are unusable, not an error', () => {
  it.each([
    ['one time three times over', [5, 5, 5], 'reactant'],
    ['two times', [0, 0, 60], 'reactant'],
    ['a span too short for its square', [0, 1e-300, 2e-300, 3e-300], 'reactant'],
    ['product before time 0 alone', [-60, -30, 0], 'product'],
    ['conversion before time 0 and once after', [-60, -30, 0, 60], 'conversion'],
  ] as const)('%s', (_, times, kind) => {
    const values = times.map((__, i) => 0.1 * i);
    const { verdict, warnings, fits } = analyseSeries(well([...times], values, kind));
    expect(verdict).toBe('unusable');
    expect(warnings).toContain('too-few-distinct-times');
    expect(fits).toEqual({});
  });
  it('a reactant may be followed before time 0', () => {
    const times = [-60, -50, -40, -30, -20, 0];
    const values = times.map((time) => Math.exp(-0.03 * (time + 60)));
    expect(analyseSeries(well(times, values)).kRel!.value).toBeCloseTo(0.03, 6);
  });
});

import { describe, expect, it } from 'vitest';
import type { Estimate } from '../../../src/kinetics/types';
import { tiedWithBest } from '../../../src/screening/ranking';

const rate = (value: number, factor: number): Estimate => ({
  value,
  se: null,
  low: value / factor,
  high: value * factor,
});

describe('ties with the best rate', () => {
  it('calls a rate inside the leader’s uncertainty tied, and one far below it not', () => {
    expect(tiedWithBest([rate(1, 1.2), rate(0.9, 1.2), rate(0.2, 1.2)])).toEqual([
      true,
      true,
      false,
    ]);
  });

  it('compares the difference’s own interval, not whether two intervals touch', () => {
    // ln 1.5 = 0.405; each interval reaches ln 1.3 = 0.262 to either side, so that they overlap,
    // while the difference has sd 0.262·√2/1.96 = 0.189 and 1.96 sd = 0.371 < 0.405.
    expect(tiedWithBest([rate(1.5, 1.3), rate(1, 1.3)])).toEqual([true, false]);
  });

  it('is the same whatever the order of the candidates and the unit of the rate', () => {
    const rates = [rate(2e-6, 1.4), rate(3e-6, 1.4), rate(1e-7, 1.4)];
    const scaled = rates.map((one) => rate(one.value * 1e5, 1.4));
    expect(tiedWithBest(scaled)).toEqual(tiedWithBest(rates));
    expect(tiedWithBest([...rates].reverse())).toEqual([...tiedWithBest(rates)].reverse());
  });

  it('never ties a candidate that has no interval, or no rate', () => {
    const bare: Estimate = { value: 0.99, se: null, low: null, high: null };
    expect(tiedWithBest([rate(1, 2), bare, null])).toEqual([true, false, false]);
    expect(tiedWithBest([null, null])).toEqual([false, false]);
  });
});

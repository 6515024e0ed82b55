import { describe, expect, it } from 'vitest';
import { intervalFactor, studentTUpperTail } from '../../../src/kinetics/statistics/tDistribution';
import { randomStream } from '../../../src/kinetics/statistics/randomStream';
import type { Estimate } from '../../../src/kinetics/types';
import { logErrorOf, studentDraw } from '../../../src/screening/logError';
import { drawErrors, rankCandidates, type ErrorParts } from '../../../src/screening/ranks';

const rate = (value: number, factor: number): Estimate => ({
  value,
  se: null,
  low: value / factor,
  high: value * factor,
});

const NONE = { sd: 0, dof: 1 };

function rank(rates: readonly (Estimate | null)[], seed = 1) {
  const parts = rates.map((one): ErrorParts | null => {
    const own = one && logErrorOf(one);
    return own && { own, shared: [] };
  });
  const ln = rates.map((one) => (one === null ? null : Math.log(one.value)));
  return rankCandidates(ln, drawErrors(parts, NONE, seed, 2000), 1);
}

const ties = (rates: readonly (Estimate | null)[]) =>
  rank(rates).map((one) => one?.tiedWithBest ?? null);

describe('ties with the best rate', () => {
  it('calls a rate inside the leader’s uncertainty tied, and one far below it not', () => {
    expect(ties([rate(1, 1.2), rate(0.9, 1.2), rate(0.2, 1.2)])).toEqual([true, true, false]);
  });

  it('compares the difference’s own interval, not whether two intervals touch', () => {
    // ln 1.5 = 0.405; each interval reaches ln 1.3 = 0.262 to either side, so that they overlap,
    // while the difference has sd 0.262·√2/1.96 = 0.189 and 1.96 sd = 0.371 < 0.405.
    expect(ties([rate(1.5, 1.3), rate(1, 1.3)])).toEqual([true, false]);
    expect(ties([rate(1.38, 1.3), rate(1, 1.3)])).toEqual([true, true]);
  });

  it('never ties a candidate that has no interval, or no rate', () => {
    const bare: Estimate = { value: 0.99, se: null, low: null, high: null };
    expect(ties([rate(1, 2), bare, null])).toEqual([true, false, null]);
    expect(rank([null, null])).toEqual([null, null]);
  });

  it('takes an error that all share off the difference', () => {
    const part = (block: string): ErrorParts => ({
      own: { se: 0.01, dof: Infinity },
      shared: [{ block, loading: 0.05 }],
    });
    const shared = { sd: 2, dof: 50 };
    const place = (second: string) =>
      rankCandidates([0, -0.1], drawErrors([part('a'), part(second)], shared, 5, 2000), 1);
    expect(place('a')[1]?.tiedWithBest).toBe(false);
    expect(place('b')[1]?.tiedWithBest).toBe(true);
  });
});

describe('ranks', () => {
  it('are the same whatever the order of the rows, the unit and how often they are asked', () => {
    const rates = [rate(2e-6, 1.4), rate(3e-6, 1.4), rate(1e-7, 1.4)];
    expect(rank(rates)).toEqual(rank(rates));
    expect(rank(rates.map((one) => rate(one.value * 1e5, 1.4)))).toEqual(rank(rates));
    expect(rank([...rates].reverse()).map((one) => one?.rank)).toEqual([3, 1, 2]);
  });

  it('give the chance to be first of two as the normal distribution has it', () => {
    // P(x1 > x2) = Φ(0.2/(0.1·√2)) = Φ(1.4142) = 0.9214 (normal table).
    const part: ErrorParts = { own: { se: 0.1, dof: Infinity }, shared: [] };
    const [one, two] = rankCandidates([0.2, 0], drawErrors([part, part], NONE, 11, 20_000), 1);
    expect(one!.chanceAmongFirst).toBeCloseTo(0.9214, 2);
    expect(two!.chanceAmongFirst).toBeCloseTo(0.0786, 2);
  });

  it('are certain where intervals are far apart', () => {
    expect(rank([rate(1, 1.01), rate(0.5, 1.01)])).toMatchObject([
      { rank: 1, rankLow: 1, rankHigh: 1, chanceAmongFirst: 1 },
      { rank: 2, rankLow: 2, rankHigh: 2, chanceAmongFirst: 0 },
    ]);
  });

  it('cover the true rank in 90 to 98 % of many near neighbours with known errors', () => {
    const random = randomStream(3);
    let [inside, total] = [0, 0];
    for (let run = 0; run < 30; run += 1) {
      const truth = Array.from({ length: 100 }, () => 0.2 * random.normal());
      const parts = truth.map((): ErrorParts => ({ own: { se: 0.04, dof: 9 }, shared: [] }));
      const found = truth.map((ln) => ln + 0.04 * studentDraw(random.normal(), 9));
      rankCandidates(found, drawErrors(parts, NONE, run, 400), 3).forEach((one, i) => {
        const trueRank = 1 + truth.filter((ln) => ln > truth[i]!).length;
        inside += one!.rankLow! <= trueRank && trueRank <= one!.rankHigh! ? 1 : 0;
        total += 1;
      });
    }
    expect(inside / total).toBeGreaterThan(0.9);
    expect(inside / total).toBeLessThan(0.98);
  });
});

describe('the error of a logarithm', () => {
  it('is read back from a t interval with its degrees of freedom', () => {
    for (const dof of [1, 2, 6, 30]) {
      const half = intervalFactor(dof) * 0.05;
      const error = logErrorOf({
        value: 3,
        se: 0.15,
        low: 3 * Math.exp(-half),
        high: 3 * Math.exp(half),
      })!;
      expect(error.dof).toBe(dof);
      expect(error.se).toBeCloseTo(0.05, 12);
    }
  });

  it('is drawn so that 2.5 % lie beyond the t quantile', () => {
    for (const dof of [1, 2, 5, 30]) {
      expect(studentDraw(1.959963984540054, dof)).toBeCloseTo(intervalFactor(dof), 8);
      // 10 % lie above z = 1.2816 (normal table).
      expect(studentTUpperTail(studentDraw(1.2815515655446, dof), dof)).toBeGreaterThan(0.09);
      expect(studentTUpperTail(studentDraw(1.2815515655446, dof), dof)).toBeLessThan(0.12);
    }
  });
});

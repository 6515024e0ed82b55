import { describe, expect, it } from 'vitest';
import type { SeriesAnalysis } from '../../../src/kinetics/types';
import { thinDecay } from '../../../src/screening/sparkline';

const well = (id: string, conversion: number | null) => ({ id, conversion }) as SeriesAnalysis;
const decay = (points: number) => ({
  timesS: Array.from({ length: points }, (_, index) => index * 60),
  values: Array.from({ length: points }, (_, index) => 8 * Math.exp(-index / 10)),
});

describe('the small decay on the leaderboard', () => {
  it('is that of the well followed far, not of one that hardly began', () => {
    const drawn: string[] = [];
    thinDecay(
      [well('slow', 0.1), well('good', 0.8), well('spent', 1)],
      (id) => {
        drawn.push(id);
        return decay(20);
      },
      16,
    );
    expect(drawn).toEqual(['good']);
  });

  it('keeps the first and the last reading, in order of time, scaled to the highest', () => {
    const pairs = thinDecay([well('a', 0.8)], () => decay(100), 16);
    expect(pairs).toHaveLength(16);
    expect(pairs[0]).toEqual([0, 1]);
    expect(pairs.at(-1)?.[0]).toBe(99 * 60);
    expect(pairs.map(([time]) => time)).toEqual(
      pairs.map(([time]) => time).toSorted((a, b) => a - b),
    );
  });

  it('leaves out missing readings and draws nothing for a well without any', () => {
    const pairs = thinDecay(
      [well('a', 0.5)],
      () => ({ timesS: [0, 1, 2], values: [2, null, 1] }),
      16,
    );
    expect(pairs).toEqual([
      [0, 1],
      [2, 0.5],
    ]);
    expect(thinDecay([well('a', null)], () => decay(5), 16)).toEqual([]);
    expect(thinDecay([], () => decay(5), 16)).toEqual([]);
  });
});

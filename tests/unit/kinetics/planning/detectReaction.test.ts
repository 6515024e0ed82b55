import { describe, expect, it } from 'vitest';
import { analyseWell } from '../../../../src/kinetics';
import { detectReaction } from '../../../../src/kinetics/planning/detectReaction';
import { decaySeries, seededNormal, times } from '../../../fixtures/decaySeries';

const limits = { shortestIntervalS: 60, longestRunS: null };
const timesS = times(12, 3600);

/** A well of 10 mmol/L with 2 % noise that falls at a steady rate. */
function bench(seed: number) {
  const normal = seededNormal(seed);
  return (rate: number, at = timesS) => {
    const values = at.map((t) => 0.01 - rate * t + 2e-4 * normal());
    return { analysis: analyseWell(decaySeries({ timesS: at, values })).analysis, timesS: at };
  };
}

const detect = (well: ReturnType<ReturnType<typeof bench>>, longestRunS: number | null = null) => {
  const [plan] = detectReaction([well], [303.15, 333.15], { ...limits, longestRunS });
  return plan?.code === 'detect-reaction' ? plan : null;
};

describe('the rate that a run would show', () => {
  it('is shown by about 9 of 10 runs, as they are and longer', () => {
    const run = bench(31);
    const plans = Array.from({ length: 60 }, () => detect(run(0))).filter((plan) => plan !== null);
    const mean = (of: (plan: (typeof plans)[number]) => number) =>
      plans.reduce((sum, plan) => sum + of(plan), 0) / plans.length;
    const share = (rate: number, at: number[]) => {
      const wells = Array.from({ length: 200 }, () => run(rate, at));
      return wells.filter(({ analysis }) => analysis.verdict !== 'no-reaction').length / 200;
    };
    const now = share(
      mean((plan) => plan.detectableNow),
      timesS,
    );
    const longer = share(
      mean((plan) => plan.detectableRate),
      times(12, plans[0]!.lastS),
    );
    for (const found of [now, longer]) {
      expect(found).toBeGreaterThan(0.83);
      expect(found).toBeLessThan(0.97);
    }
  });

  it('is not promised beyond the longest run', () => {
    const plan = detect(bench(4)(0), 7200)!;
    expect(plan.lastS).toBe(7200);
    expect(plan.detectableNow / plan.detectableRate).toBeCloseTo(2, 10);
  });

  it('comes with the hottest temperature allowed', () => {
    expect(detect(bench(4)(0))?.hotterK).toBe(333.15);
  });
});

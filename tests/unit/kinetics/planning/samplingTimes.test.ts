import { describe, expect, it } from 'vitest';
import { evenTimes, gatheredTimes } from '../../../../src/kinetics/planning/samplingTimes';

const gaps = (times: readonly number[]) => times.slice(1).map((time, i) => time - times[i]!);

describe('sampling times', () => {
  it('are spread evenly over the run', () => {
    expect(evenTimes(0, 3600, 4, 60)).toEqual([0, 1200, 2400, 3600]);
  });

  it('become fewer where the instrument cannot read so often', () => {
    const times = evenTimes(60, 660, 24, 120);
    expect(times).toHaveLength(6);
    expect(times[5]).toBe(660);
    expect(Math.min(...gaps(times))).toBeGreaterThanOrEqual(120);
  });

  it('gather around the times that tell most, no closer than the instrument reads', () => {
    const times = gatheredTimes([0, 1000], 7, 0, 3600, 30);
    expect(times).toEqual([0, 30, 60, 90, 970, 1000, 1030]);
  });

  it('keep their distance where the gathered readings would run into each other', () => {
    const times = gatheredTimes([0, 100], 10, 0, 120, 30);
    expect(Math.min(...gaps(times))).toBeGreaterThanOrEqual(30);
    expect(times).toHaveLength(10);
  });
});

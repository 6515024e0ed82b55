import { describe, expect, it } from 'vitest';
import {
  buildForestAxis,
  forestMark,
  placeOn,
} from '../../../../src/islands/leaderboard/forestAxis';
import { figureText, spokenFigure } from '../../../../src/islands/leaderboard/figureText';
import { unitOf } from '../../../../src/islands/leaderboard/measures';
import { estimate, leaderboardRow } from '../../../fixtures/views';

describe('the shared axis', () => {
  it('gives equal ratios equal lengths when rates are compared', () => {
    const axis = buildForestAxis([estimate(0.1), estimate(1), estimate(10)], 'log')!;
    const step = placeOn(axis, 1) - placeOn(axis, 0.1);
    expect(placeOn(axis, 10) - placeOn(axis, 1)).toBeCloseTo(step, 10);
    expect(axis.ticks.filter(({ major }) => major).map(({ value }) => value)).toEqual([0.1, 1, 10]);
  });

  it('holds every value with its interval', () => {
    const axis = buildForestAxis([estimate(2, 0.2), estimate(5, 0.2)], 'log')!;
    expect(forestMark(estimate(2, 0.2), axis, false)).toMatchObject({
      kind: 'dot',
      whisker: { openLeft: false, openRight: false },
    });
  });

  it('lets one wild interval run off rather than squeeze all others', () => {
    const wild = { value: 1, se: 5, low: 1e-6, high: 1e6 };
    const axis = buildForestAxis([estimate(1), estimate(3), wild], 'log')!;
    expect(axis.high / axis.low).toBeLessThan(100);
    expect(forestMark(wild, axis, false)).toMatchObject({
      whisker: { from: 0, to: 1, openLeft: true, openRight: true },
    });
  });

  it('draws a bracket without a dot and a bound as a bound', () => {
    const axis = buildForestAxis([estimate(1), estimate(9)], 'log');
    const bracket = { value: 3, se: null, low: 2, high: 5 };
    expect(forestMark(bracket, axis, true)).toMatchObject({ kind: 'bracket' });
    const nothing = { value: -0.2, se: 0.5, low: -1, high: 2 };
    expect(forestMark(nothing, axis, false)).toMatchObject({ kind: 'below' });
  });

  it('shows a value without an interval without one', () => {
    const axis = buildForestAxis([estimate(1), estimate(9)], 'log');
    const bare = { value: 3, se: null, low: null, high: null };
    expect(forestMark(bare, axis, false)).toMatchObject({ kind: 'dot', whisker: null });
  });

  it('takes energies below zero on its linear scale', () => {
    const axis = buildForestAxis(
      [estimate(40), { value: -5, se: 2, low: -9, high: -1 }],
      'linear',
    )!;
    expect(axis.low).toBeLessThan(-9);
    expect(placeOn(axis, -5)).toBeGreaterThan(0);
  });

  it('is not there without values', () => {
    expect(buildForestAxis([null, { ...estimate(1), value: 0 }], 'log')).toBeNull();
  });
});

describe('the number beside it', () => {
  const plain = { bracket: false, log: true };

  it('has the figures that its standard error leaves', () => {
    const text = figureText({ value: 3.4187, se: 0.0812, low: 3.2, high: 3.6 }, plain);
    expect(spokenFigure(text, 'µmol L⁻¹ s⁻¹')).toBe('3.42 ± 0.08 µmol L⁻¹ s⁻¹');
  });

  it('says a bracket as a bracket', () => {
    const bracket = { value: 3, se: null, low: 1.4321, high: 50 };
    const text = figureText(bracket, { bracket: true, log: true });
    expect(spokenFigure(text, 's')).toBe('between 1.4 and 50 s');
  });

  it('says what cannot be told from nothing as below its upper bound', () => {
    const text = figureText({ value: -0.1, se: 0.5, low: -1, high: 0.87 }, plain);
    expect(spokenFigure(text, 's⁻¹')).toBe('below 0.87 s⁻¹');
  });
});

describe('the unit of a column', () => {
  it('is one for all, with the largest at 1 or above', () => {
    const rows = [
      leaderboardRow('A', { rateRef: estimate(4e-6) }),
      leaderboardRow('B', { rateRef: estimate(9e-8) }),
    ];
    expect(unitOf('rate', 'concentration', rows)).toEqual({ unit: 'µmol L⁻¹ s⁻¹', factor: 1e6 });
  });

  it('counts a rate per gram from mol per kilogram', () => {
    const rows = [leaderboardRow('A', { rateRefPerMass: estimate(8e-4) })];
    const { unit, factor } = unitOf('perGram', 'concentration', rows);
    // 8e-4 mol kg⁻¹ s⁻¹ is 0.8 µmol g⁻¹ s⁻¹, so that nmol is the first with at least 1.
    expect(unit).toBe('nmol g⁻¹ s⁻¹');
    expect(8e-4 * factor).toBeCloseTo(800);
  });

  it('takes the time unit of the middle row', () => {
    const rows = [600, 3000, 90_000].map((seconds, index) =>
      leaderboardRow(`R${index}`, { timeToTarget: estimate(seconds) }),
    );
    expect(unitOf('time', 'concentration', rows).unit).toBe('min');
  });
});

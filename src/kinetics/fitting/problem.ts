import type { ReadingKind } from '../types';
import type { Readings } from './readings';

/**
 * How a reading follows from g(u): `decay` y = A g, `growth` y = A (1 − g), `fraction` y = 1 − g.
 */
export type ReadingMode = 'decay' | 'growth' | 'fraction';

/** A well's readings, scaled so that times and readings are of order 1. */
export interface FitProblem {
  mode: ReadingMode;
  /** Times since `originS`, divided by `timeScale`; ascending, not negative. */
  t: Float64Array;
  /** Readings divided by `valueScale`. */
  y: Float64Array;
  /** s on the clock of the readings: where u = 0. */
  originS: number;
  timeScale: number;
  valueScale: number;
  /** Smallest scaled time above 0. */
  firstStep: number;
  /** Σ(y − ȳ)² of the scaled readings. */
  spread: number;
}

/** The mode of each kind of reading. */
export const MODE: Record<ReadingKind, ReadingMode> = {
  reactant: 'decay',
  signal: 'decay',
  product: 'growth',
  conversion: 'fraction',
};

/**
 * Scales a well's readings for fitting.
 *
 * A decay is fitted from its first reading, so that a clock that starts late costs no digits.
 * Growth and conversion start from nothing at time 0; before it nothing has formed.
 *
 * @param readings at least 2 distinct times
 */
export function scaleReadings(readings: Readings, kind: ReadingKind): FitProblem {
  const mode = MODE[kind];
  const originS = mode === 'decay' ? readings.times[0]! : 0;
  const since = readings.times.map((time) => Math.max(time - originS, 0));
  const timeScale = since[since.length - 1]! || 1;
  const largest = readings.values.reduce((max, value) => Math.max(max, Math.abs(value)), 0);
  // A fraction has an absolute scale: 1 is complete conversion.
  const valueScale = mode === 'fraction' ? 1 : largest || 1;
  const t = Float64Array.from(since, (time) => time / timeScale);
  const y = Float64Array.from(readings.values, (value) => value / valueScale);
  const mean = y.reduce((sum, value) => sum + value, 0) / y.length;
  return {
    mode,
    t,
    y,
    originS,
    timeScale,
    valueScale,
    firstStep: t.find((value) => value > 0) ?? 1,
    spread: y.reduce((sum, value) => sum + (value - mean) ** 2, 0),
  };
}

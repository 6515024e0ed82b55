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
  /** Readings divided by `valueScale`, times `roots` where there are some. */
  y: Float64Array;
  /** Square roots of the readings' weights, which shapes are multiplied by too; null for equal ones. */
  roots: Float64Array | null;
  /** s on the clock of the readings: where u = 0. */
  originS: number;
  timeScale: number;
  valueScale: number;
  /** Smallest scaled time above 0. */
  firstStep: number;
  /** Σy² and Σ(y − ȳ)² of the scaled readings. */
  squares: number;
  spread: number;
}

/** The mode of each kind of reading. */
export const MODE: Record<ReadingKind, ReadingMode> = {
  reactant: 'decay',
  signal: 'decay',
  product: 'growth',
  conversion: 'fraction',
};

/** Numbers of one allocation: a buffer for each well would cost more than its fit. */
const SLAB = 8192;
let slab = new Float64Array(SLAB);
let taken = 0;

/** Room for `n` numbers; what it holds is undefined. */
function roomFor(n: number): Float64Array {
  if (n > SLAB / 8) return new Float64Array(n);
  if (taken + n > SLAB) {
    slab = new Float64Array(SLAB);
    taken = 0;
  }
  const room = new Float64Array(slab.buffer, taken * 8, n);
  taken += n;
  return room;
}

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
  const { times, values } = readings;
  const n = times.length;
  const originS = mode === 'decay' ? times[0]! : 0;
  const timeScale = Math.max(times[n - 1]! - originS, 0) || 1;
  let [largest, sum] = [0, 0];
  for (let i = 0; i < n; i += 1) {
    const size = Math.abs(values[i]!);
    if (size > largest) largest = size;
  }
  // A fraction has an absolute scale: 1 is complete conversion.
  const valueScale = mode === 'fraction' ? 1 : largest || 1;
  const t = roomFor(n);
  const y = roomFor(n);
  let firstStep = 0;
  for (let i = 0; i < n; i += 1) {
    const since = Math.max(times[i]! - originS, 0) / timeScale;
    t[i] = since;
    y[i] = values[i]! / valueScale;
    sum += y[i]!;
    if (firstStep === 0 && since > 0) firstStep = since;
  }
  let spread = 0;
  let squares = 0;
  for (let i = 0; i < n; i += 1) {
    const distance = y[i]! - sum / n;
    spread += distance * distance;
    squares += y[i]! * y[i]!;
  }
  const roots = null;
  return {
    mode,
    t,
    y,
    roots,
    originS,
    timeScale,
    valueScale,
    firstStep: firstStep || 1,
    squares,
    spread,
  };
}

import type { Estimate } from '../../kinetics/types';
import { niceScale } from '../charts/niceScale';

/** The shared axis of one column; places are shares of its width, 0 to 1. */
export interface ForestAxis {
  scale: 'log' | 'linear';
  /** In the unit of the values. */
  low: number;
  high: number;
  ticks: { value: number; place: number; major: boolean }[];
}

/** What a cell draws, in shares of the axis. `open` ends run beyond what the axis shows. */
export type ForestMark =
  | {
      kind: 'dot';
      place: number;
      whisker: { from: number; to: number; openLeft: boolean; openRight: boolean } | null;
    }
  | { kind: 'bracket'; from: number; to: number; openLeft: boolean; openRight: boolean }
  /** Cannot be told from nothing: all that is known is an upper bound. */
  | { kind: 'below'; to: number };

const finite = (value: number | null | undefined): value is number =>
  value !== null && value !== undefined && Number.isFinite(value);

/** Ends wider than this beyond the values leave the axis, so that one wild interval hides nothing. */
const mostBeyondLog = 3;
const mostBeyondLinear = 0.4;

/**
 * An axis that holds all values and as much of their intervals as helps to compare.
 *
 * @returns null when there is no value to place
 */
export function buildForestAxis(
  estimates: readonly (Estimate | null)[],
  scale: 'log' | 'linear',
): ForestAxis | null {
  const usable = (value: number | null): value is number =>
    finite(value) && (scale === 'linear' || value > 0);
  const values = estimates.flatMap((one) => (one && usable(one.value) ? [one.value] : []));
  if (values.length === 0) return null;
  const ends = estimates.flatMap((one) => [one?.low ?? null, one?.high ?? null]).filter(usable);
  const least = Math.min(...values);
  const most = Math.max(...values);
  const reach = scale === 'linear' ? Math.max(most - least, Math.abs(most) * 0.1) : 0;
  const floor = scale === 'log' ? least / mostBeyondLog : least - reach * mostBeyondLinear;
  const ceiling = scale === 'log' ? most * mostBeyondLog : most + reach * mostBeyondLinear;
  const low = Math.max(floor, Math.min(least, ...ends));
  const high = Math.min(ceiling, Math.max(most, ...ends));
  return scale === 'log' ? logAxis(low, high) : linearAxis(low, high);
}

function logAxis(low: number, high: number): ForestAxis {
  const pad = Math.max((high / low) ** 0.06, 1.12);
  const axis: ForestAxis = { scale: 'log', low: low / pad, high: high * pad, ticks: [] };
  const decades = Math.log10(axis.high / axis.low);
  const majors = decades > 1.6 ? [1] : decades > 0.9 ? [1, 3] : [1, 2, 5];
  const drawn = decades > 1.6 ? [1, 3] : [1, 2, 3, 4, 5, 6, 7, 8, 9];
  for (let power = Math.floor(Math.log10(axis.low)); 10 ** power <= axis.high; power += 1) {
    for (const digit of drawn) {
      const value = Number(`${digit}e${power}`);
      if (value < axis.low || value > axis.high) continue;
      axis.ticks.push({ value, place: placeOn(axis, value), major: majors.includes(digit) });
    }
  }
  return axis;
}

function linearAxis(low: number, high: number): ForestAxis {
  const pad = (high - low || Math.abs(high) || 1) * 0.06;
  const axis: ForestAxis = { scale: 'linear', low: low - pad, high: high + pad, ticks: [] };
  const { min, interval } = niceScale(axis.low, axis.high, 3);
  for (let step = 0; min + step * interval <= axis.high; step += 1) {
    const value = Number((min + step * interval).toPrecision(12));
    if (value >= axis.low) axis.ticks.push({ value, place: placeOn(axis, value), major: true });
  }
  return axis;
}

/** Where a value lies on the axis; below 0 or above 1 when it is outside. */
export function placeOn({ scale, low, high }: ForestAxis, value: number): number {
  if (scale === 'linear') return (value - low) / (high - low);
  return value <= 0 ? -Infinity : Math.log(value / low) / Math.log(high / low);
}

/** An estimate in another unit. */
export function scaleEstimate(estimate: Estimate | null, factor: number): Estimate | null {
  if (!estimate) return null;
  const times = (number: number | null) => (number === null ? null : number * factor);
  const { value, se, low, high } = estimate;
  return { value: value * factor, se: times(se), low: times(low), high: times(high) };
}

const within = (place: number) => Math.min(1, Math.max(0, place));

function span(axis: ForestAxis, low: number, high: number) {
  const from = placeOn(axis, low);
  const to = placeOn(axis, high);
  return { from: within(from), to: within(to), openLeft: from < 0, openRight: to > 1 };
}

/** What to draw for one figure; null when there is nothing. */
export function forestMark(
  estimate: Estimate | null,
  axis: ForestAxis | null,
  bracket: boolean,
): ForestMark | null {
  if (!estimate || !axis) return null;
  const { value, low, high } = estimate;
  const bounded = finite(low) && finite(high);
  if (bracket) return bounded ? { kind: 'bracket', ...span(axis, low, high) } : null;
  if (axis.scale === 'log' && value <= 0) {
    return finite(high) && high > 0 ? { kind: 'below', to: within(placeOn(axis, high)) } : null;
  }
  return {
    kind: 'dot',
    place: within(placeOn(axis, value)),
    whisker: bounded ? span(axis, low, high) : null,
  };
}

import type { Readings } from '../fitting/readings';
import { MODE, type ReadingMode } from '../fitting/problem';
import { linearTrend } from '../statistics/linearTrend';
import { studentTUpperTail } from '../statistics/tDistribution';
import type { ReadingKind } from '../types';

/** Whether the readings show any reaction. */
export interface DecayTest {
  outcome: 'decays' | 'flat' | 'rises';
  /** Signed rate of the straight line through the readings, reading's base unit s⁻¹. */
  rate: number;
  rateSe: number | null;
  dof: number;
  /** Chance of such readings from a dead well; at most `DECAY_LEVEL` where the outcome is `decays`. */
  p: number;
  /** One-sided tail of the straight line's slope: near 0 for a clear fall, near 1 for a rise. */
  trendTail: number;
  /** 1 − C(t_last)/C(t_first) along that line; null for growth, where C0 is not known. */
  conversion: number | null;
}

/** Chance that a dead well is said to decay. */
export const DECAY_LEVEL = 0.02;

/**
 * Levels of the two one-sided tests. Together they keep 98 % of dead wells as flat: the second
 * searches over kRel, which multiplies its false alarms a few times. Both were set by simulation
 * (tests/unit/kinetics/verdict/decayTest.test.ts).
 */
const TREND_LEVEL = 0.009;
const CURVE_LEVEL = 0.0012;

/** A fall this large is a reaction already at the plain level, where readings are too few to prove it. */
const PLAIN_CONVERSION = 0.3;
const PLAIN_LEVEL = 0.1;
/** Degrees of freedom of the line, up to which readings are that few. */
const PLAIN_DOF = 2;

const ROUNDING = 1e-14;

/**
 * Tests whether there is any decay on the signed slope of a straight line, and, for wells that are
 * finished after a few readings, on the gain of a first-order curve over a constant.
 *
 * @param readings at least 3 readings at 2 distinct times
 * @param firstOrderRss of the well's first-order fit, base unit squared
 * @param firstOrderDecays whether that fit has kRel above 0
 */
export function testForDecay(
  readings: Readings,
  kind: ReadingKind,
  firstOrderRss: number,
  firstOrderDecays: boolean,
): DecayTest {
  const { times, values } = readings;
  const mode = MODE[kind];
  const direction = mode === 'decay' ? -1 : 1;
  const largest = values.reduce((max, value) => Math.max(max, Math.abs(value)), 0);
  const unit = largest || 1;
  const y = values.map((value) => value / unit);
  const trend = linearTrend(times, y);
  const first = trend.intercept + trend.slope * times[0]!;
  const fall = direction * trend.slope * (times[times.length - 1]! - times[0]!);
  const result = {
    rate: direction * trend.slope * unit,
    rateSe: trend.slopeSe === null ? null : trend.slopeSe * unit,
    dof: trend.dof,
    conversion: relativeFall(mode, fall, first, unit),
  };
  if (y.every((value) => Math.abs(value - y[0]!) <= ROUNDING)) {
    return { ...result, outcome: 'flat', p: 1, trendTail: 0.5 };
  }

  const floor = y.length * ROUNDING ** 2;
  const span = times[times.length - 1]! - times[0]!;
  const se = Math.max(trend.slopeSe ?? Infinity, ROUNDING / span);
  const tail = studentTUpperTail((direction * trend.slope) / se, Math.max(trend.dof, 1));
  const large = trend.dof <= PLAIN_DOF && (result.conversion ?? 0) >= PLAIN_CONVERSION;
  const plain = large ? tail / PLAIN_LEVEL : Infinity;

  const mean = y.reduce((sum, value) => sum + value / y.length, 0);
  const flatRss = y.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  const curveRss = firstOrderRss / unit ** 2 + floor;
  const gain = Math.max(flatRss - curveRss, 0);
  const curveTail = studentTUpperTail(
    Math.sqrt((gain * Math.max(trend.dof, 1)) / curveRss),
    Math.max(trend.dof, 1),
  );
  const curve = firstOrderDecays ? curveTail / CURVE_LEVEL : Infinity;
  // Each test in units of its own level, so that the smallest one speaks for all.
  const p = Math.min(DECAY_LEVEL * Math.min(tail / TREND_LEVEL, plain, curve), 1);
  const outcome = p < DECAY_LEVEL ? 'decays' : tail > 1 - TREND_LEVEL ? 'rises' : 'flat';
  return { ...result, outcome, p, trendTail: tail };
}

function relativeFall(mode: ReadingMode, fall: number, first: number, unit: number): number | null {
  if (mode === 'growth') return null;
  const start = mode === 'decay' ? first : 1 / unit - first;
  const conversion = fall / start;
  return start > 0 && Number.isFinite(conversion) ? conversion : null;
}

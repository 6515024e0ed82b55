import type { FitProblem } from '../fitting/problem';
import type { Readings } from '../fitting/readings';
import { weighted } from '../fitting/fitWeighted';
import type { DecaySeries, Precision } from '../types';
import {
  censorOrder,
  residualsOfLaw,
  weighOrder,
  weighSaturation,
  type FittedLaw,
  type FittedOrder,
} from './fittedLaw';

/** The fits of one well by kind. */
export interface PlainFits {
  orders: FittedOrder[];
  saturation: FittedLaw | null;
  forced: FittedOrder | null;
}

/** The fit of an order that every well has. */
export const ofOrder = (orders: readonly FittedOrder[], order: number) =>
  orders.find(({ law }) => law.order === order)!.relative;

/**
 * All laws that have an order, by their likelihood where readings lie below a limit. The others are
 * not tried then: the choice rests on these alone.
 */
export function censorFits(
  problem: FitProblem,
  below: readonly boolean[],
  plain: PlainFits,
  series: DecaySeries,
  readings: Readings,
): PlainFits {
  const fit = (fitted: FittedOrder) => censorOrder(problem, below, fitted, series, readings);
  return {
    orders: plain.orders.map(fit),
    saturation: null,
    forced: plain.forced && fit(plain.forced),
  };
}

/** Rounds of fitting with weights from the curve fitted before. */
const WEIGHING_ROUNDS = 4;

/** All laws fitted with one set of weights, that of the law which describes the readings best. */
export function weighFits(
  problem: FitProblem,
  plain: PlainFits,
  precision: Precision,
  series: DecaySeries,
  readings: Readings,
): PlainFits {
  let fits = plain;
  for (let round = 0; round < WEIGHING_ROUNDS; round += 1) {
    const all = [...fits.orders, ...(fits.saturation === null ? [] : [fits.saturation])];
    const best = all.reduce((a, b) => (b.criterion < a.criterion ? b : a));
    const { roots } = best.problem;
    const curve = residualsOfLaw(best).map(
      (residual, i) => problem.y[i]! - residual / problem.valueScale / (roots?.[i] ?? 1),
    );
    const heavy = weighted(problem, curve, precision);
    fits = {
      orders: plain.orders.map((fitted) => weighOrder(heavy, fitted, series, readings)),
      saturation: plain.saturation && weighSaturation(heavy, plain.saturation, series, readings),
      forced: plain.forced && weighOrder(heavy, plain.forced, series, readings),
    };
  }
  return fits;
}

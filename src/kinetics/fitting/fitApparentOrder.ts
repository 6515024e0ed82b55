import {
  HIGHEST_ORDER,
  log1pOver,
  LOWEST_ORDER,
  orderSlope,
  relativeOfOrder,
} from '../rateLaws/apparentOrder';
import type { RelativeFit } from './fitLaw';
import { fitCurve, type CurveModel, type LeastSquaresFit } from './levenbergMarquardt';
import type { ReadingMode } from './problem';

/** The free order of −dC/dt = k Cⁿ in one well. */
export interface ApparentOrderFit {
  order: number;
  /** Null where the order is not determined or lies at an end of its range. */
  orderSe: number | null;
  /** The reading's base unit, squared. */
  rss: number;
  parameters: number;
  dof: number;
}

/** Where the search for n starts from a fit of order 0, 1 or 2: off the kink of n = 0. */
const startOrder = (order: number) => (order === 0 ? 0.2 : order);

/** Parameters (A, ln kRel, n), or (ln kRel, n) for a fraction. */
function orderModel(mode: ReadingMode): CurveModel {
  const offset = mode === 'fraction' ? 0 : 1;
  const sign = mode === 'decay' ? 1 : -1;
  return (p, t, gradient) => {
    const a = offset === 1 ? p[0]! : 1;
    const kRel = Math.exp(p[offset]!);
    const n = p[offset + 1]!;
    const u = kRel * t;
    const g = relativeOfOrder(n, u);
    const x = (n - 1) * u;
    const shape = mode === 'decay' ? g : x <= -1 ? 1 : -Math.expm1(-u * log1pOver(x));
    if (offset === 1) gradient[0] = shape;
    gradient[offset] = g > 0 ? -sign * a * u * g ** n : 0;
    gradient[offset + 1] = sign * a * orderSlope(n, u);
    return a * shape;
  };
}

function keepOrderInRange(position: number): (p: number[]) => void {
  return (p) => {
    p[position] = Math.min(Math.max(p[position]!, LOWEST_ORDER), HIGHEST_ORDER);
  };
}

/**
 * Fits the apparent order together with kRel and the amplitude, n between −1 and 4, from the two
 * best of the given fits.
 *
 * @param fits fits of whole orders to the same well
 * @returns null when no given fit decays or there are no degrees of freedom
 */
export function fitApparentOrder(fits: readonly RelativeFit[]): ApparentOrderFit | null {
  const starts = fits
    .filter((fit) => fit.kRel !== null && fit.kRel > 0 && fit.amplitude !== null)
    .sort((a, b) => a.rss - b.rss)
    .slice(0, 2);
  const first = starts[0];
  if (first === undefined) return null;
  const { problem } = first;
  const size = problem.mode === 'fraction' ? 2 : 3;
  const dof = problem.t.length - size;
  if (dof < 1) return null;
  const model = orderModel(problem.mode);
  let best: LeastSquaresFit | null = null;
  for (const fit of starts) {
    const start = [Math.log(fit.kRel! * problem.timeScale), startOrder(fit.law.order)];
    if (size === 3) start.unshift(fit.amplitude! / problem.valueScale);
    const found = fitCurve(model, problem.t, problem.y, start, keepOrderInRange(size - 1));
    if (best === null || found.rss < best.rss) best = found;
  }
  const order = best!.parameters[size - 1]!;
  const inside = order > LOWEST_ORDER && order < HIGHEST_ORDER;
  const variance = best!.inverse?.[size - 1]?.[size - 1] ?? null;
  return {
    order,
    orderSe: inside && variance !== null ? Math.sqrt((variance * best!.rss) / dof) : null,
    rss: best!.rss * problem.valueScale ** 2,
    parameters: size,
    dof,
  };
}

import { firstOrder } from './firstOrder';
import { definePowerLaw, type RateLaw } from './rateLaw';
import { secondOrder } from './secondOrder';
import { zerothOrder } from './zerothOrder';

/** Orders that may be forced or found, both ends included. */
export const LOWEST_ORDER = -1;
export const HIGHEST_ORDER = 4;

/** log1p(x)/x, 1 at x = 0. */
export function log1pOver(x: number): number {
  return x === 0 ? 1 : Math.log1p(x) / x;
}

/** g(u) of −dC/dt = k Cⁿ; exact through n = 1 because it is exp(−u log1p(x)/x), x = (n−1)u. */
export function relativeOfOrder(order: number, u: number): number {
  const x = (order - 1) * u;
  return x <= -1 ? 0 : Math.exp(-u * log1pOver(x));
}

/**
 * ∂g/∂n at fixed u: −g u² M(x), M(x) = [1/(1+x) − log1p(x)/x]/x, by its series near x = 0.
 *
 * @param g the relative concentration there, where it is known already
 */
export function orderSlope(order: number, u: number, g = relativeOfOrder(order, u)): number {
  const x = (order - 1) * u;
  if (x <= -1) return 0;
  const m =
    Math.abs(x) < 1e-3
      ? -1 / 2 + x * (2 / 3 + x * (-3 / 4 + x * (4 / 5 - (5 / 6) * x)))
      : (1 / (1 + x) - Math.log1p(x) / x) / x;
  return -g * u * u * m;
}

/**
 * Apparent order n: −dC/dt = k Cⁿ, C(t) = [C0^(1−n) + (n−1) k t]^(1/(1−n)), k in
 * (mol/L)^(1−n) s⁻¹; for n < 1 zero from t = C0^(1−n)/((1−n) k). The whole numbers 0, 1 and 2
 * give the laws of their own files.
 *
 * Laidler, Chemical Kinetics (1987). A description over the measured range, not a mechanism: it
 * breaks first when extrapolated in concentration.
 *
 * @param order n, −1 to 4
 * @throws RangeError when the order is outside this range
 */
export function apparentOrder(order: number): RateLaw {
  if (!(order >= LOWEST_ORDER && order <= HIGHEST_ORDER)) {
    throw new RangeError(
      `order must lie between ${LOWEST_ORDER} and ${HIGHEST_ORDER}, got ${order}`,
    );
  }
  if (order === 0) return zerothOrder;
  if (order === 1) return firstOrder;
  if (order === 2) return secondOrder;
  const e = order - 1;
  return definePowerLaw({
    name: 'order',
    order,
    relative: (u) => relativeOfOrder(order, u),
    converted: (u) => (e * u <= -1 ? 1 : -Math.expm1(-u * log1pOver(e * u))),
    reach: (conversion) => Math.expm1(-e * Math.log1p(-conversion)) / e,
    lowestU: e > 0 ? -1 / e : -Infinity,
    straighten: (c) => c ** -e,
  });
}

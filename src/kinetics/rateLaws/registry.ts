import type { LawRequest, RateLawName } from '../types';
import { apparentOrder } from './apparentOrder';
import { firstOrder } from './firstOrder';
import type { RateLaw } from './rateLaw';
import { secondOrder } from './secondOrder';
import { zerothOrder } from './zerothOrder';

/**
 * The laws that the engine tries on every well and chooses between. A new law is a file of its own
 * beside this one and an entry here.
 */
export const rateLaws: readonly RateLaw[] = [zerothOrder, firstOrder, secondOrder];

/** The law of a registered name; null for laws that are not tried on every well. */
export function findRateLaw(name: RateLawName): RateLaw | null {
  return rateLaws.find((law) => law.name === name) ?? null;
}

/** The law of a name with, for `order`, its number; null when this engine does not hold it. */
export function rateLawOf(name: RateLawName, order: number | null): RateLaw | null {
  return name === 'order' ? (order === null ? null : apparentOrder(order)) : findRateLaw(name);
}

/** A law asked for by name. */
export interface RequestedLaw {
  name: RateLawName;
  /** Null for the saturating law, which has no order. */
  law: RateLaw | null;
}

/**
 * The law that a caller forces, or null for the machine's choice.
 *
 * @throws RangeError for an order out of range
 */
export function requestedLaw(request: LawRequest): RequestedLaw | null {
  if (request === 'auto') return null;
  const law = typeof request === 'object' ? apparentOrder(request.order) : findRateLaw(request);
  return { name: law?.name ?? 'saturating', law };
}

/** The name under which a well's fits hold an order: a registered law's, else `order`. */
export function lawOfOrder(order: number): RateLawName {
  return rateLaws.find((law) => law.order === order)?.name ?? 'order';
}

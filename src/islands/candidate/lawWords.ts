import type { LawRequest, RateLawName, SeriesAnalysis } from '../../kinetics/types';
import { plotNumber } from '../charts/plotNumber';

/** The law's name where there is little room. */
export function lawLabel(law: string, order: number | null = null): string {
  switch (law) {
    case 'order':
      return order === null ? 'free order' : `order ${plotNumber(order, 3)}`;
    default:
      return law;
  }
}

/** The law's name in a sentence or a table. */
export function lawName(law: RateLawName, order: number | null = null): string {
  switch (law) {
    case 'zero':
      return 'Zero order';
    case 'first':
      return 'First order';
    case 'second':
      return 'Second order';
    case 'saturating':
      return 'Saturating surface';
    case 'order':
      return order === null ? 'Free order' : `Order ${plotNumber(order, 3)}`;
  }
}

/** The number that stands for `order` fits: the forced one, else the one found. */
export function freeOrderOf({ law, order, apparentOrder }: SeriesAnalysis): number | null {
  return forcedOrder(law) ?? order ?? apparentOrder?.value ?? null;
}

function forcedOrder(law: LawRequest): number | null {
  return typeof law === 'object' ? law.order : null;
}

/** True when the well's shown law is held to be the right one, and not merely the likeliest. */
export function isAsserted({ verdict }: Pick<SeriesAnalysis, 'verdict'>): boolean {
  switch (verdict) {
    case 'zero':
    case 'first':
    case 'second':
    case 'saturating':
    case 'forced':
      return true;
    case 'other':
    case 'undetermined':
    case 'no-reaction':
    case 'unusable':
      return false;
  }
}

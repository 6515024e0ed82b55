import type { ApparentOrderFit } from '../fitting/fitApparentOrder';
import { evidenceRatio } from '../statistics/goodnessOfFit';
import { intervalFactor } from '../statistics/tDistribution';
import type { RateLawName, WarningCode } from '../types';

/** AICc of one law, on readings that all laws share. */
export interface LawEvidence {
  name: RateLawName;
  order: number;
  aicc: number;
}

/** What the choice between the laws rests on, for one well or summed over many. */
export interface Evidence {
  laws: LawEvidence[];
  /** AICc of the curves with one more parameter, by name; absent where readings are too few. */
  rivals: Partial<Record<'order' | 'plateau' | 'deactivating' | 'saturating', number>>;
  /** What AICc charges a rival of this well for its extra parameter; 0 for pooled evidence. */
  rivalCharge: number;
  /** Coverage σ of the saturating fit, and whether its interval lies inside the law. */
  coverage: { value: number; bounded: boolean } | null;
  /** True where neither a free order nor rivals stand beside the laws. */
  unguarded?: boolean;
}

/** Evidence of laws beside which neither a free order nor rivals were fitted. */
export const unguardedEvidence = (laws: LawEvidence[]): Evidence => ({
  laws,
  rivals: {},
  rivalCharge: 0,
  coverage: null,
  unguarded: true,
});

/** Free order with its standard error. */
export type FreeOrder = Pick<ApparentOrderFit, 'order' | 'orderSe' | 'dof'>;

export interface Selection {
  verdict: 'zero' | 'first' | 'second' | 'saturating' | 'other' | 'undetermined';
  order: number | null;
  /** The law that is asserted; null with `other` and `undetermined`. */
  law: RateLawName | null;
  /** The law with the lowest AICc, asserted or not. */
  best: RateLawName;
  warnings: WarningCode[];
}

/** An order is asserted when it has this many times the support of each other order. */
export const EVIDENCE_TO_ASSERT = 10;
/** The same where nothing else guards the choice. */
export const EVIDENCE_UNGUARDED = 100;
/** A rival must have this many times the support of the best order to say that none holds. */
export const EVIDENCE_FOR_OTHER = 30;
/**
 * The saturating law must have this many times the support of every law with an order, and be no
 * worse than every other curve with as many parameters.
 */
export const EVIDENCE_TO_SATURATE = 30;
/**
 * How far the free order's interval may reach from the whole number that is asserted. These and the
 * numbers below were set by simulation (`npm run calibrate`): each is as wide as the share of wrong
 * orders allows.
 */
export const ORDER_TOLERANCE: Readonly<Record<number, number>> = { 0: 0.28, 1: 0.34, 2: 0.75 };
/** How many times the support of an order the saturating law, which holds it as a limit, may have. */
const SATURATION_ALLOWED: Readonly<Record<number, number>> = { 0: 1, 1: 5, 2: 5 };
/** How many times the support of a level that stays or a dying catalyst an order must have. */
const MARGIN_OVER_DEPARTURES: Readonly<Record<number, number>> = { 0: 10, 1: 1.25, 2: 10 };

/** True when the free order's 95 % interval lies within the tolerance of a whole order. */
export function orderAgrees(free: FreeOrder | null, whole: number): boolean {
  if (free?.orderSe == null) return false;
  const reach = Math.abs(free.order - whole) + intervalFactor(free.dof) * free.orderSe;
  return reach <= (ORDER_TOLERANCE[whole] ?? 0);
}

/** True when a coverage inside the law describes the readings better than anything else. */
function saturates({ rivals, coverage }: Evidence, best: LawEvidence): boolean {
  const own = rivals.saturating;
  if (own === undefined || coverage?.bounded !== true) return false;
  const others = [rivals.order, rivals.plateau, rivals.deactivating];
  return (
    evidenceRatio(own, best.aicc) >= EVIDENCE_TO_SATURATE &&
    others.every((one) => one === undefined || evidenceRatio(own, one) >= 1)
  );
}

/**
 * Chooses between zero, first and second order, or says why not.
 *
 * An order is asserted when the evidence ratio (Burnham & Anderson 2002) over the two others is at
 * least 10, no curve with one more parameter has 30 times its support, a level that stays, a dying
 * catalyst and the saturating law are held off by their own margins, and the free order's interval
 * lies near the whole number: an order of 1.96 ± 0.01 is second for a chemist, however well told
 * from 2. The saturating law is asserted where its coverage is bounded on both sides and it wins.
 * Otherwise `other` where a rival tells that none holds, else `undetermined`.
 *
 * @param evidence at least 2 laws
 */
export function selectRateLaw(evidence: Evidence, free: FreeOrder | null): Selection {
  const ranked = [...evidence.laws].sort((a, b) => a.aicc - b.aicc);
  const best = ranked[0]!;
  const rivals = Object.values(evidence.rivals);
  const strongest = Math.min(...rivals, Infinity);
  const refuse = (verdict: 'other' | 'undetermined', warning: WarningCode): Selection => ({
    verdict,
    order: null,
    law: null,
    best: best.name,
    warnings: [warning],
  });

  if (saturates(evidence, best)) {
    return {
      verdict: 'saturating',
      order: null,
      law: 'saturating',
      best: 'saturating',
      warnings: [],
    };
  }

  if (evidenceRatio(strongest, best.aicc) >= EVIDENCE_FOR_OTHER) {
    return refuse('other', 'no-simple-order');
  }
  const needed = evidence.unguarded === true ? EVIDENCE_UNGUARDED : EVIDENCE_TO_ASSERT;
  if (evidenceRatio(best.aicc, ranked[1]!.aicc) < needed) {
    return refuse('undetermined', 'laws-equally-good');
  }
  const { plateau, deactivating, saturating } = evidence.rivals;
  const departure = Math.min(plateau ?? Infinity, deactivating ?? Infinity);
  if (
    evidenceRatio(best.aicc, departure) < (MARGIN_OVER_DEPARTURES[best.order] ?? Infinity) ||
    evidenceRatio(saturating ?? Infinity, best.aicc) > (SATURATION_ALLOWED[best.order] ?? 0)
  ) {
    return refuse('undetermined', 'no-simple-order');
  }
  if (evidence.unguarded !== true && !orderAgrees(free, best.order))
    return refuse('undetermined', 'order-uncertain');
  return {
    verdict: best.name as 'zero' | 'first' | 'second',
    order: best.order,
    law: best.name,
    best: best.name,
    warnings: [],
  };
}

import type { AnalysedWell } from '../analyseWell';
import { chanceGain, oneSidedGain } from '../statistics/chanceGain';
import { akaikeWeights } from '../statistics/goodnessOfFit';
import type { RateLawName, WarningCode } from '../types';
import {
  selectRateLaw,
  type Evidence,
  type FreeOrder,
  type Selection,
} from '../verdict/selectRateLaw';
import { aboutMean, betweenVariance, weightedMean } from './betweenVariance';
import { setTemperatures } from './temperatures';

/** What a catalyst's wells say together. */
export interface PooledVerdict {
  verdict: Selection['verdict'];
  /** The law asserted; null with `other` and `undetermined`. */
  law: RateLawName | null;
  order: number | null;
  weights: Partial<Record<RateLawName, number>>;
  warnings: WarningCode[];
}

/** Wells that miss the shared law, beyond which the law is not asserted. */
const WELLS_MISSING = 2;
const SHARE_MISSING = 0.1;

type JudgedWell = AnalysedWell & { evidence: Evidence };

/**
 * Charge for a rival whose extra parameter the wells would share although each well fits its own:
 * the parameter itself, what fitting it per well gains by chance, and twice the spread of that.
 * AICc well by well would charge so much that departures seen in every well went unnoticed.
 *
 * @param oneSided true for a parameter that must not be negative
 */
function sharedCharge(wells: readonly JudgedWell[], oneSided: boolean): number {
  let [mean, variance] = [0, 0];
  for (const { analysis, series } of wells) {
    const n = analysis.pointsUsed;
    // C0 is no parameter of a conversion; k and the extra one always are.
    const gain = chanceGain(n, Math.max(n - (series.kind === 'conversion' ? 2 : 3), 1));
    const own = oneSided ? oneSidedGain(gain) : gain;
    mean += own.mean;
    variance += own.variance;
  }
  return 2 + mean + 2 * Math.sqrt(variance);
}

/** Sum of the wells' AICc: each well has its own k, C0 and noise, all share the law. */
function sumEvidence(wells: readonly JudgedWell[]): Evidence {
  const laws = wells[0]!.evidence.laws.map((law, i) => ({
    ...law,
    aicc: wells.reduce((sum, well) => sum + well.evidence.laws[i]!.aicc, 0),
  }));
  const best = laws.reduce((lowest, law) => (law.aicc < lowest.aicc ? law : lowest));
  const rivals: Evidence['rivals'] = {};
  for (const name of ['order', 'plateau', 'deactivating', 'saturating'] as const) {
    const own = wells.filter((well) => well.evidence.rivals[name] !== undefined);
    if (own.length === 0) continue;
    // Wells too small for the rival stand with the best law, so that the sums stay comparable.
    const gain = own.reduce((sum, { evidence }) => {
      const law = evidence.laws.find((one) => one.name === best.name)!;
      return sum + law.aicc - evidence.rivals[name]! + evidence.rivalCharge;
    }, 0);
    const charge = Math.min(
      own.reduce((sum, { evidence }) => sum + evidence.rivalCharge, 0),
      sharedCharge(own, name !== 'order'),
    );
    rivals[name] = best.aicc - gain + charge;
  }
  return {
    laws,
    rivals,
    rivalCharge: 0,
    coverage: poolCoverage(wells),
    unguarded: wells.every(({ evidence }) => evidence.unguarded === true),
  };
}

/** Inside the law when the intervals of two wells are, or that of the only one. */
function poolCoverage(wells: readonly JudgedWell[]): Evidence['coverage'] {
  const known = wells.flatMap(({ evidence }) => evidence.coverage ?? []);
  const bounded = known.filter((coverage) => coverage.bounded);
  if (known.length === 0) return null;
  const shown = bounded.length > 0 ? bounded : known;
  return {
    value: shown.reduce((sum, { value }) => sum + value, 0) / shown.length,
    bounded: bounded.length >= Math.min(2, known.length),
  };
}

/** Free order over the wells, with the scatter between wells as a random effect. */
function poolOrder(wells: readonly JudgedWell[]): FreeOrder | null {
  const free = wells
    .map((well) => well.freeOrder)
    .filter((order): order is FreeOrder & { orderSe: number } => order?.orderSe != null);
  if (free.length === 0) return null;
  if (free.length === 1) return free[0]!;
  const orders = free.map((order) => order.order);
  const variances = free.map((order) => Math.max(order.orderSe, 1e-9) ** 2);
  const tau2 = betweenVariance((w) => aboutMean(orders, w), variances, orders.length - 1);
  const weights = variances.map((variance) => 1 / (variance + tau2));
  const dof = free.reduce((sum, order) => sum + order.dof, 0);
  return {
    order: weightedMean(orders, weights),
    orderSe: Math.sqrt(1 / weights.reduce((sum, w) => sum + w, 0)),
    dof: tau2 > 0 ? orders.length - 1 : dof,
  };
}

/**
 * Lets a catalyst's wells decide its law together: one law for all, k, C0 and noise per well, the
 * evidence of the wells added up; the same guards as for one well, on the pooled free order; and
 * at least two wells that agree where there are two. Temperatures that each assert another order
 * give `other` with a warning.
 *
 * @param wells the reacting wells
 */
export function poolEvidence(wells: readonly AnalysedWell[]): PooledVerdict {
  const judged = wells.filter((well): well is JudgedWell => well.evidence !== null);
  if (judged.length === 0) {
    return {
      verdict: 'undetermined',
      law: null,
      order: null,
      weights: {},
      warnings: ['too-few-for-order'],
    };
  }
  const evidence = sumEvidence(judged);
  const shares = akaikeWeights(evidence.laws.map((law) => law.aicc));
  const weights: PooledVerdict['weights'] = {};
  evidence.laws.forEach((law, i) => (weights[law.name] = shares[i]!));
  const refuse = (
    verdict: 'other' | 'undetermined',
    ...warnings: WarningCode[]
  ): PooledVerdict => ({ verdict, law: null, order: null, weights, warnings });

  const selection = selectRateLaw(evidence, poolOrder(judged));
  const { verdict, law, order } = selection;
  // A surface that is full when cold and bare when hot shows both orders under one law.
  if (law !== 'saturating' && ordersByTemperature(judged).size > 1)
    return refuse('other', 'order-changes-with-temperature');
  if (law === null) {
    return refuse(verdict as 'other' | 'undetermined', ...selection.warnings);
  }
  if (order !== null && countAgreeing(judged, law) < Math.min(2, judged.length))
    return refuse('undetermined', 'laws-equally-good');
  const missing = judged.filter((well) => well.analysis.lackOfFit?.significant === true).length;
  if (
    missing >= Math.min(WELLS_MISSING, judged.length) &&
    missing > SHARE_MISSING * judged.length
  ) {
    return refuse('other', 'no-simple-order', 'lack-of-fit');
  }
  return { verdict, law, order, weights, warnings: [] };
}

/** Wells in which no other order has more support. */
function countAgreeing(wells: readonly JudgedWell[], name: RateLawName): number {
  return wells.filter(({ evidence: { laws } }) => {
    const own = laws.find((law) => law.name === name)!;
    return laws.every((law) => own.aicc <= law.aicc);
  }).length;
}

/** The orders that the wells of single temperatures assert. */
function ordersByTemperature(wells: readonly JudgedWell[]): Set<number> {
  const sets = setTemperatures(wells.map((well) => well.series.temperatureK));
  const orders = new Set<number>();
  for (const set of new Set(sets)) {
    const own = wells.filter((_, i) => sets[i] === set);
    const { order } = selectRateLaw(sumEvidence(own), poolOrder(own));
    if (order !== null) orders.add(order);
  }
  return orders;
}

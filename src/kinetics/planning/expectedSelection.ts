import { fitDepartures } from '../fitting/fitDepartures';
import { fitLaw, type RelativeFit } from '../fitting/fitLaw';
import { fitSaturating } from '../fitting/fitSaturating';
import { MODE, type FitProblem } from '../fitting/problem';
import { aicc, evidenceRatio } from '../statistics/goodnessOfFit';
import { intervalFactor } from '../statistics/tDistribution';
import {
  orderAgrees,
  selectRateLaw,
  type Evidence,
  type FreeOrder,
} from '../verdict/selectRateLaw';
import { expectedOrderSe } from './expectedOrderSe';
import { competingLaws, expectedProblem, type ExpectedCurve } from './plannedWell';

/** What the engine is expected to say of a well that is yet to be run. */
export interface ExpectedSelection {
  /** True when the true law is expected to be asserted. */
  settles: boolean;
  /** Expected evidence ratio of the true law over its best-fitting rival of whole order. */
  evidenceRatio: number;
  /** Expected standard error of the free order; null where the times do not determine it. */
  orderSe: number | null;
}

/**
 * Normal quantile by which every condition is held on the safe side. At 0 about half of the runs
 * would settle; with this one seven to nine in ten do, by the simulation in
 * tests/unit/kinetics/planning/discriminatingTimes.test.ts.
 */
const SAFETY = 1.28;

/** The saturating law and the noise take 4 parameters, AICc two readings more. */
const FEWEST_FOR_SATURATION = 6;

/**
 * The verdict expected from readings at given times when one law is true.
 *
 * Every rival is fitted to the predicted readings without noise; what it must leave,
 * Δ = Σ(η_true − η_rival)², over σ² is the non-centrality λ that a T-optimal design makes large
 * (Atkinson & Fedorov 1975). With noise the residual sums of the two differ by about
 * σ²(λ ± 2√λ); the lower end stands, and the engine's own rule decides on the AICc that follow.
 *
 * @param curve taken as true
 * @param timesS s, ascending
 */
export function expectedSelection(
  curve: ExpectedCurve,
  timesS: readonly number[],
): ExpectedSelection {
  const laws = competingLaws();
  const problem = expectedProblem(curve, timesS);
  const n = timesS.length;
  const variance = curve.residualSd ** 2;
  const fits = laws.map((law) => fitLaw(problem, law));
  const own = fits.find((fit) => fit.law === curve.law);
  const first = fits.find((fit) => fit.law.order === 1);
  const nothing = { settles: false, evidenceRatio: 1, orderSe: null };
  if (own === undefined || first === undefined) return nothing;

  const criterion = (rss: number, parameters: number) => {
    const lambda = rss / variance;
    const left = Math.max(lambda - 2 * SAFETY * Math.sqrt(lambda), 0);
    return aicc(n, n - parameters + left, parameters);
  };
  const evidence: Evidence = { laws: [], rivals: {}, rivalCharge: 0, coverage: null };
  for (const fit of fits) {
    const value =
      fit === own
        ? aicc(n, n - fit.parameters, fit.parameters)
        : criterion(fit.rss, fit.parameters);
    if (value === null) return nothing;
    evidence.laws.push({ name: fit.law.name, order: fit.law.order, aicc: value });
  }
  for (const { name, rss, parameters } of fitDepartures(first)) {
    const value = criterion(rss, parameters);
    if (value !== null) evidence.rivals[name] = value;
  }
  const saturated = saturatingRss(problem, fits);
  if (n >= FEWEST_FOR_SATURATION && saturated !== null) {
    const value = criterion(saturated, own.parameters + 1);
    if (value !== null) evidence.rivals.saturating = value;
  }
  const free = expectedOrder(curve, timesS);
  const selection = selectRateLaw(evidence, free);
  const [best, rival] = evidence.laws.map((law) => law.aicc).sort((a, b) => a - b);
  return {
    settles: selection.order === curve.law.order,
    evidenceRatio: Math.min(evidenceRatio(best!, rival!), Number.MAX_VALUE),
    orderSe: expectedOrderSe(curve, timesS),
  };
}

/** What the saturating law leaves of the predicted readings; 0 where it holds the true law. */
function saturatingRss(problem: FitProblem, fits: readonly RelativeFit[]): number | null {
  const unit = problem.valueScale ** 2;
  const [zero, first] = [0, 1].map((order) => {
    const fit = fits.find(({ law }) => law.order === order)!;
    return { kRel: (fit.kRel ?? 0) * problem.timeScale, rss: fit.rss / unit };
  });
  const { rss } = fitSaturating(problem, first!, zero!);
  return Number.isFinite(rss) ? rss * unit : null;
}

/** Whether the true law is expected to be asserted; quick where the free order already forbids it. */
export function isExpectedToSettle(curve: ExpectedCurve, timesS: readonly number[]): boolean {
  return (
    orderAgrees(expectedOrder(curve, timesS), curve.law.order) &&
    expectedSelection(curve, timesS).settles
  );
}

/** The free order, its error on the safe side; null where it is not determined. */
function expectedOrder(curve: ExpectedCurve, timesS: readonly number[]): FreeOrder | null {
  const orderSe = expectedOrderSe(curve, timesS);
  const dof = timesS.length - (MODE[curve.kind] === 'fraction' ? 2 : 3);
  if (orderSe === null || dof < 1) return null;
  return {
    order: curve.law.order,
    orderSe: orderSe * (1 + SAFETY / intervalFactor(dof)),
    dof,
  };
}

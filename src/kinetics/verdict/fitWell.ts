import { fitApparentOrder, type ApparentOrderFit } from '../fitting/fitApparentOrder';
import { fitDepartures } from '../fitting/fitDepartures';
import type { RelativeFit } from '../fitting/fitLaw';
import { weighted } from '../fitting/fitWeighted';
import { scaleReadings, type FitProblem } from '../fitting/problem';
import type { Readings } from '../fitting/readings';
import { rateLaws, type RequestedLaw } from '../rateLaws/registry';
import { aicc, akaikeWeights } from '../statistics/goodnessOfFit';
import { intervalFactor } from '../statistics/tDistribution';
import type { DecaySeries, LawFit, Precision, RateLawName } from '../types';
import {
  censorOrder,
  fitOrder,
  fitOrderWithLevel,
  fitSaturation,
  leastRss,
  residualsOfLaw,
  weighOrder,
  weighSaturation,
  type FittedLaw,
  type FittedOrder,
} from './fittedLaw';
import type { Evidence } from './selectRateLaw';

/** Everything fitted to one well. */
export interface WellFits {
  /** The laws with an order, then the saturating law, then a forced one. */
  laws: FittedLaw[];
  /** Every fit by name, weights filled in. */
  byName: Partial<Record<RateLawName, LawFit>>;
  apparentOrder: ApparentOrderFit | null;
  /** Null below 5 readings, where AICc does not exist. */
  evidence: Evidence | null;
  /** True when the best law fits to within rounding. */
  exact: boolean;
  /** Size of the readings. */
  unit: number;
  /** First order without a level, for the test of whether there is any decay. */
  plainFirst: RelativeFit;
}

const FEWEST_FOR_ORDERS = 5;
/** AICc of three parameters and the noise needs one more. */
const FEWEST_FOR_SATURATION = 6;
/** Where K is bounded on both sides: the coverage's 95 % interval lies within these. */
const LEAST_COVERAGE = 0.02;
const MOST_COVERAGE = 0.98;

/**
 * Fits every registered law, the saturating law, a forced one besides, the free order, and the
 * curves that are no law to rank by.
 *
 * @param readings at least 3 readings at 3 distinct times
 * @param forced a law to fit whatever the readings, or null
 */
export function fitWell(
  series: DecaySeries,
  readings: Readings,
  forced: RequestedLaw | null,
): WellFits {
  const problem = scaleReadings(readings, series.kind);
  const n = readings.values.length;
  const criterionOf = (rss: number, parameters: number) =>
    aicc(n, Math.max(rss, leastRss(problem)), parameters);

  const wanted = forced?.law ?? null;
  const fitsTo: PlainFits = {
    orders: rateLaws.map((law) => fitOrder(problem, law, series, readings)),
    saturation: null,
    forced:
      wanted === null || rateLaws.includes(wanted)
        ? null
        : fitOrder(problem, wanted, series, readings),
  };
  const plainFirst = ofOrder(fitsTo.orders, 1);
  if (n >= FEWEST_FOR_SATURATION || forced?.name === 'saturating') {
    const zero = ofOrder(fitsTo.orders, 0);
    fitsTo.saturation = fitSaturation(problem, plainFirst, zero, series, readings);
  }
  const precision = series.precision ?? null;
  const below = readings.indices.map((i) => series.belowLimit?.[i] === true);
  const censored = below.includes(true);
  let fits = fitsTo;
  if (censored) fits = censorFits(problem, below, fitsTo, series, readings);
  else if (precision !== null) fits = weighFits(problem, fitsTo, precision, series, readings);
  const { orders, saturation, forced: another } = fits;
  const weighable = saturation !== null && n >= FEWEST_FOR_SATURATION ? saturation : null;
  const tried: FittedLaw[] = weighable === null ? orders : [...orders, weighable];
  const weights = n >= FEWEST_FOR_ORDERS ? akaikeWeights(tried.map((one) => one.criterion)) : null;
  tried.forEach((fitted, i) => (fitted.fit.weight = weights?.[i] ?? null));

  const laws: FittedLaw[] = saturation === null ? [...orders] : [...orders, saturation];
  if (another !== null) laws.push(another);
  const byName: WellFits['byName'] = {};
  for (const fitted of laws) byName[fitted.name] = fitted.fit;

  const apparentOrder = censored ? null : fitApparentOrder(orders.map((fitted) => fitted.relative));
  const plain: WellFits = {
    laws,
    byName,
    apparentOrder,
    evidence:
      n >= FEWEST_FOR_ORDERS
        ? censored
          ? unguarded(orders)
          : gatherEvidence(orders, weighable, ofOrder(orders, 1), apparentOrder, criterionOf)
        : null,
    exact: tried.some((fitted) => fitted.fit.rss <= leastRss(problem)),
    unit: problem.valueScale,
    plainFirst,
  };
  return series.level === true ? withLevel(plain, problem, series, readings, forced) : plain;
}

/** The fits of one well by kind. */
interface PlainFits {
  orders: FittedOrder[];
  saturation: FittedLaw | null;
  forced: FittedOrder | null;
}

const ofOrder = (orders: readonly FittedOrder[], order: number) =>
  orders.find(({ law }) => law.order === order)!.relative;

/**
 * All laws that have an order, by their likelihood where readings lie below a limit. The others are
 * not tried then: the choice rests on these alone.
 */
function censorFits(
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

/** Evidence of laws beside which neither a free order nor rivals were fitted. */
const unguarded = (laws: readonly FittedLaw[]): Evidence => ({
  laws: laws.map(({ name, law, criterion }) => ({ name, order: law!.order, aicc: criterion })),
  rivals: {},
  rivalCharge: 0,
  coverage: null,
  unguarded: true,
});

/** Rounds of fitting with weights from the curve fitted before. */
const WEIGHING_ROUNDS = 4;

/** All laws fitted with one set of weights, that of the law which describes the readings best. */
function weighFits(
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

/**
 * Fits the laws that have an order with a level that stays. Without a free order beside it the choice
 * between them rests on their evidence alone, at ten times the usual ratio.
 *
 * @param plain the same well's fits without a level, which stand in where no approach is found
 */
function withLevel(
  plain: WellFits,
  problem: FitProblem,
  series: DecaySeries,
  readings: Readings,
  forced: RequestedLaw | null,
): WellFits {
  const wanted = forced?.law != null && !rateLaws.includes(forced.law) ? [forced.law] : [];
  const fitted = [...rateLaws, ...wanted].flatMap(
    (law) => fitOrderWithLevel(problem, law, series, readings) ?? [],
  );
  if (fitted.length < rateLaws.length) return plain;
  const tried = fitted.slice(0, rateLaws.length);
  const weights = akaikeWeights(tried.map(({ criterion }) => criterion));
  const weighed = readings.values.length >= FEWEST_FOR_SATURATION;
  tried.forEach(({ fit }, i) => (fit.weight = weighed ? weights[i]! : null));
  const byName: WellFits['byName'] = {};
  for (const { name, fit } of fitted) byName[name] = fit;
  return {
    ...plain,
    laws: fitted,
    byName,
    apparentOrder: null,
    evidence: !weighed ? null : unguarded(tried),
    exact: tried.some(({ fit }) => fit.rss <= leastRss(problem)),
  };
}

function gatherEvidence(
  orders: readonly FittedOrder[],
  saturation: FittedLaw | null,
  first: RelativeFit,
  apparentOrder: ApparentOrderFit | null,
  criterionOf: (rss: number, parameters: number) => number | null,
): Evidence {
  const rivals: Evidence['rivals'] = {};
  const add = (name: keyof Evidence['rivals'], rss: number, parameters: number) => {
    const criterion = criterionOf(rss, parameters);
    if (criterion !== null) rivals[name] = criterion;
  };
  if (apparentOrder !== null) add('order', apparentOrder.rss, apparentOrder.parameters);
  for (const { name, rss, parameters } of fitDepartures(first)) add(name, rss, parameters);
  if (saturation !== null) rivals.saturating = saturation.criterion;
  const parameters = orders[0]!.parameters;
  const unit = first.problem.valueScale ** 2;
  return {
    laws: orders.map(({ name, law, criterion }) => ({ name, order: law.order, aicc: criterion })),
    rivals,
    rivalCharge: (criterionOf(unit, parameters + 1) ?? 0) - (criterionOf(unit, parameters) ?? 0),
    coverage: saturation === null ? null : coverageRange(saturation),
  };
}

/** The coverage's 95 % interval, where it lies inside the law. */
function coverageRange({ fit }: FittedLaw): Evidence['coverage'] {
  const { coverage, coverageSe } = fit.saturation!;
  if (coverageSe === null) return null;
  const half = intervalFactor(fit.dof) * coverageSe;
  const bounded = coverage - half > LEAST_COVERAGE && coverage + half < MOST_COVERAGE;
  return { value: coverage, bounded };
}

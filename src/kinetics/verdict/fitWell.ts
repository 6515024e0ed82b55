import { fitApparentOrder, type ApparentOrderFit } from '../fitting/fitApparentOrder';
import { fitDepartures } from '../fitting/fitDepartures';
import type { RelativeFit } from '../fitting/fitLaw';
import { scaleReadings } from '../fitting/problem';
import type { Readings } from '../fitting/readings';
import { rateLaws, type RequestedLaw } from '../rateLaws/registry';
import { aicc, akaikeWeights } from '../statistics/goodnessOfFit';
import { intervalFactor } from '../statistics/tDistribution';
import type { DecaySeries, LawFit, RateLawName } from '../types';
import {
  FEWEST_FOR_SATURATION,
  fitOrder,
  fitSaturation,
  lawEvidence,
  leastRss,
  type FittedLaw,
  type FittedOrder,
} from './fittedLaw';
import { censorFits, ofOrder, weighFits, type PlainFits } from './givenNoise';
import { unguardedEvidence, type Evidence } from './selectRateLaw';
import { withLevel } from './withLevel';

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
          ? unguardedEvidence(orders.map(lawEvidence))
          : gatherEvidence(orders, weighable, ofOrder(orders, 1), apparentOrder, criterionOf)
        : null,
    exact: tried.some((fitted) => fitted.fit.rss <= leastRss(problem)),
    unit: problem.valueScale,
    plainFirst,
  };
  return series.level === true ? withLevel(plain, problem, series, readings, forced) : plain;
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
    laws: orders.map(lawEvidence),
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

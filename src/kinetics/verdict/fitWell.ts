import { fitApparentOrder, type ApparentOrderFit } from '../fitting/fitApparentOrder';
import { fitDepartures } from '../fitting/fitDepartures';
import type { RelativeFit } from '../fitting/fitLaw';
import { scaleReadings } from '../fitting/problem';
import type { Readings } from '../fitting/readings';
import { rateLaws, type RequestedLaw } from '../rateLaws/registry';
import { aicc, akaikeWeights } from '../statistics/goodnessOfFit';
import { intervalFactor } from '../statistics/tDistribution';
import type { DecaySeries, LawFit, RateLawName } from '../types';
import { fitOrder, fitSaturation, type FittedLaw } from './fittedLaw';
import type { Evidence } from './selectRateLaw';

/** A fitted law with what it is weighed by. */
export interface WeighedLaw extends FittedLaw {
  /** AICc with rss held above rounding; plain AIC where readings are too few for AICc. */
  criterion: number;
}

/** Everything fitted to one well. */
export interface WellFits {
  /** The laws with an order, then the saturating law, then a forced one. */
  laws: WeighedLaw[];
  /** Every fit by name, weights filled in. */
  byName: Partial<Record<RateLawName, LawFit>>;
  apparentOrder: ApparentOrderFit | null;
  /** Null below 5 readings, where AICc does not exist. */
  evidence: Evidence | null;
  /** True when the best law fits to within rounding. */
  exact: boolean;
  /** Size of the readings. */
  unit: number;
}

const ROUNDING = 1e-14;
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
  const floor = n * (ROUNDING * problem.valueScale) ** 2;
  const criterionOf = (rss: number, parameters: number) =>
    aicc(n, Math.max(rss, floor), parameters);
  const weigh = <F extends FittedLaw>(fitted: F): F & WeighedLaw => {
    const { rss } = fitted.fit;
    const plain = n * Math.log(Math.max(rss, floor) / n) + 2 * fitted.parameters;
    return { ...fitted, criterion: criterionOf(rss, fitted.parameters) ?? plain };
  };

  const orders = rateLaws.map((law) => weigh(fitOrder(problem, law, series, readings)));
  const byOrder = (order: number) => orders.find((fitted) => fitted.order === order)!.relative;
  const saturating =
    n >= FEWEST_FOR_SATURATION || forced?.name === 'saturating'
      ? fitSaturation(problem, byOrder(1), byOrder(0), series, readings)
      : null;
  const saturation = saturating === null ? null : weigh(saturating);
  const weighable = saturation !== null && n >= FEWEST_FOR_SATURATION ? saturation : null;
  const tried: WeighedLaw[] = weighable === null ? orders : [...orders, weighable];
  const weights = n >= FEWEST_FOR_ORDERS ? akaikeWeights(tried.map((one) => one.criterion)) : null;
  tried.forEach((fitted, i) => (fitted.fit.weight = weights?.[i] ?? null));

  const laws: WeighedLaw[] = saturation === null ? [...orders] : [...orders, saturation];
  const another = forced?.law ?? null;
  if (another !== null && !rateLaws.includes(another)) {
    laws.push(weigh(fitOrder(problem, another, series, readings)));
  }
  const byName: WellFits['byName'] = {};
  for (const fitted of laws) byName[fitted.name] = fitted.fit;

  const apparentOrder = fitApparentOrder(orders.map((fitted) => fitted.relative));
  return {
    laws,
    byName,
    apparentOrder,
    evidence:
      n >= FEWEST_FOR_ORDERS
        ? gatherEvidence(orders, weighable, byOrder(1), apparentOrder, criterionOf)
        : null,
    exact: tried.some((fitted) => fitted.fit.rss <= floor),
    unit: problem.valueScale,
  };
}

function gatherEvidence(
  orders: readonly WeighedLaw[],
  saturation: WeighedLaw | null,
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
    laws: orders.map(({ name, order, criterion }) => ({ name, order: order!, aicc: criterion })),
    rivals,
    rivalCharge: (criterionOf(unit, parameters + 1) ?? 0) - (criterionOf(unit, parameters) ?? 0),
    coverage: saturation === null ? null : coverageRange(saturation),
  };
}

/** The coverage's 95 % interval, where it lies inside the law. */
function coverageRange({ fit }: WeighedLaw): Evidence['coverage'] {
  const { coverage, coverageSe } = fit.saturation!;
  if (coverageSe === null) return null;
  const half = intervalFactor(fit.dof) * coverageSe;
  const bounded = coverage - half > LEAST_COVERAGE && coverage + half < MOST_COVERAGE;
  return { value: coverage, bounded };
}

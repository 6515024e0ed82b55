import { describeFit, type DescribedFit } from '../fitting/describeFit';
import { fitApparentOrder, type ApparentOrderFit } from '../fitting/fitApparentOrder';
import { fitDepartures } from '../fitting/fitDepartures';
import { fitLaw, type RelativeFit } from '../fitting/fitLaw';
import { scaleReadings } from '../fitting/problem';
import type { Readings } from '../fitting/readings';
import type { RateLaw } from '../rateLaws/rateLaw';
import { rateLaws } from '../rateLaws/registry';
import { aicc, akaikeWeights } from '../statistics/goodnessOfFit';
import type { DecaySeries, LawFit, RateLawName } from '../types';
import type { Evidence } from './selectRateLaw';

/** One law with its fit in both forms. */
export interface FittedLaw extends DescribedFit {
  law: RateLaw;
  relative: RelativeFit;
  /** AICc with rss held above rounding; plain AIC where readings are too few for AICc. */
  criterion: number;
}

/** Everything fitted to one well. */
export interface WellFits {
  laws: FittedLaw[];
  /** Every fit by name, weights filled in. */
  byName: Partial<Record<RateLawName, LawFit>>;
  apparentOrder: ApparentOrderFit | null;
  /** Null below 5 readings, where AICc does not exist. */
  evidence: Evidence | null;
  /** True when the best law fits to within rounding. */
  exact: boolean;
}

const ROUNDING = 1e-14;

/**
 * Fits every registered law, a forced one besides, the free order, and the curves that are no
 * simple order.
 *
 * @param readings at least 3 readings at 3 distinct times
 * @param forced a law to fit besides the registered ones, or null
 */
export function fitWell(series: DecaySeries, readings: Readings, forced: RateLaw | null): WellFits {
  const problem = scaleReadings(readings, series.kind);
  const n = readings.values.length;
  const floor = n * (ROUNDING * problem.valueScale) ** 2;
  const criterionOf = (rss: number, parameters: number) =>
    aicc(n, Math.max(rss, floor), parameters);
  const plainOf = (rss: number, parameters: number) =>
    n * Math.log(Math.max(rss, floor) / n) + 2 * parameters;

  const fitOne = (law: RateLaw): FittedLaw => {
    const relative = fitLaw(problem, law);
    const criterion =
      criterionOf(relative.rss, relative.parameters) ?? plainOf(relative.rss, relative.parameters);
    return { law, relative, criterion, ...describeFit(relative, series, readings) };
  };
  const laws = rateLaws.map(fitOne);
  const byName: WellFits['byName'] = {};
  const weighed = n >= 5 ? akaikeWeights(laws.map((fitted) => fitted.criterion)) : null;
  laws.forEach((fitted, i) => {
    fitted.fit.weight = weighed?.[i] ?? null;
    byName[fitted.law.name] = fitted.fit;
  });
  if (forced !== null && !rateLaws.includes(forced)) {
    const fitted = fitOne(forced);
    laws.push(fitted);
    byName[forced.name] = fitted.fit;
  }

  const tried = laws.slice(0, rateLaws.length);
  const apparentOrder = fitApparentOrder(tried.map((fitted) => fitted.relative));
  const exact = tried.some((fitted) => fitted.relative.rss <= floor);
  return {
    laws,
    byName,
    apparentOrder,
    evidence: n >= 5 ? gatherEvidence(tried, apparentOrder, criterionOf) : null,
    exact,
  };
}

function gatherEvidence(
  tried: readonly FittedLaw[],
  apparentOrder: ApparentOrderFit | null,
  criterionOf: (rss: number, parameters: number) => number | null,
): Evidence {
  const rivals: Evidence['rivals'] = {};
  const add = (name: keyof Evidence['rivals'], rss: number, parameters: number) => {
    const criterion = criterionOf(rss, parameters);
    if (criterion !== null) rivals[name] = criterion;
  };
  if (apparentOrder !== null) add('order', apparentOrder.rss, apparentOrder.parameters);
  const first = tried.find((fitted) => fitted.law.order === 1);
  const laws = first?.relative.problem.mode === 'fraction' ? 1 : 2;
  const unit = (first?.relative.problem.valueScale ?? 1) ** 2;
  if (first !== undefined) {
    for (const { name, rss, parameters } of fitDepartures(first.relative))
      add(name, rss, parameters);
  }
  return {
    laws: tried.map(({ law, criterion }) => ({
      name: law.name,
      order: law.order,
      aicc: criterion,
    })),
    rivals,
    rivalCharge: (criterionOf(unit, laws + 1) ?? 0) - (criterionOf(unit, laws) ?? 0),
  };
}

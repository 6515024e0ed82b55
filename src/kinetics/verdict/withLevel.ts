import type { FitProblem } from '../fitting/problem';
import type { Readings } from '../fitting/readings';
import { rateLaws, type RequestedLaw } from '../rateLaws/registry';
import { akaikeWeights } from '../statistics/goodnessOfFit';
import type { DecaySeries } from '../types';
import { FEWEST_FOR_SATURATION, fitOrderWithLevel, lawEvidence, leastRss } from './fittedLaw';
import type { WellFits } from './fitWell';
import { unguardedEvidence } from './selectRateLaw';

/**
 * Fits the laws that have an order with a level that stays. Without a free order beside it the choice
 * between them rests on their evidence alone, at ten times the usual ratio.
 *
 * @param plain the same well's fits without a level, which stand in where no approach is found
 */
export function withLevel(
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
    evidence: !weighed ? null : unguardedEvidence(tried.map(lawEvidence)),
    exact: tried.some(({ fit }) => fit.rss <= leastRss(problem)),
  };
}

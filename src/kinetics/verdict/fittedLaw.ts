import { describeFit, type DescribedFit } from '../fitting/describeFit';
import { describeSaturating } from '../fitting/describeSaturating';
import { describeLevel } from '../fitting/describeLevel';
import { fitLevel, levelLeverages, levelResiduals, type LevelFit } from '../fitting/fitLevel';
import { fitLaw, leveragesOf, residualsOf, type RelativeFit } from '../fitting/fitLaw';
import {
  fitSaturating,
  saturatingLeverages,
  saturatingResiduals,
  type SaturatingFit,
} from '../fitting/fitSaturating';
import { fitCensored } from '../fitting/fitCensored';
import { fitSaturatingWeighted, fitWeighted } from '../fitting/fitWeighted';
import type { FitProblem } from '../fitting/problem';
import type { Readings } from '../fitting/readings';
import type { RateLaw } from '../rateLaws/rateLaw';
import { aicc } from '../statistics/goodnessOfFit';
import { rateConstantUnit } from '../rateLaws/rateConstantUnit';
import type { DecaySeries, RateLawName, ReadingDimension } from '../types';
import type { LawEvidence } from './selectRateLaw';

/** AICc of three parameters and the noise needs one more. */
export const FEWEST_FOR_SATURATION = 6;

/** One law with its fit to one well. */
export interface FittedLaw extends DescribedFit {
  name: RateLawName;
  parameters: number;
  /** AICc with rss held above rounding; plain AIC where readings are too few for AICc. */
  criterion: number;
  problem: FitProblem;
  /** Null for the saturating law, which has no order. */
  law: RateLaw | null;
  /** The fit of a law that has an order. */
  relative: RelativeFit | null;
  /** The fit of the saturating law. */
  saturating: SaturatingFit | null;
  /** The fit of a law that approaches a level. */
  leveled: LevelFit | null;
}

/** A fitted law that has an order. */
export type FittedOrder = FittedLaw & { law: RateLaw; relative: RelativeFit };

/** Fits a law that has an order. */
export function fitOrder(
  problem: FitProblem,
  law: RateLaw,
  series: DecaySeries,
  readings: Readings,
): FittedOrder {
  return describeOrder(fitLaw(problem, law), series, readings);
}

/** The same, fitted to weighted readings from the fit without weights. */
export function weighOrder(
  problem: FitProblem,
  { relative }: FittedOrder,
  series: DecaySeries,
  readings: Readings,
): FittedOrder {
  return describeOrder(fitWeighted(problem, relative), series, readings);
}

/** The same on readings of which some lie below a limit. */
export function censorOrder(
  problem: FitProblem,
  below: readonly boolean[],
  { relative }: FittedOrder,
  series: DecaySeries,
  readings: Readings,
): FittedOrder {
  return describeOrder(fitCensored(problem, below, relative), series, readings);
}

function describeOrder(
  relative: RelativeFit,
  series: DecaySeries,
  readings: Readings,
): FittedOrder {
  const { law, problem } = relative;
  const described = describeFit(relative, series, readings);
  return {
    fit: described.fit,
    initialRate: described.initialRate,
    firstConcentration: described.firstConcentration,
    conversion: described.conversion,
    name: law.name,
    parameters: relative.parameters,
    criterion: criterionOf(problem, relative.rss, relative.parameters),
    problem,
    law,
    relative,
    saturating: null,
    leveled: null,
  };
}

/**
 * Fits the saturating law.
 *
 * @param first the well's first-order fit; @param zero its zero-order fit
 * @returns null where the readings are so far apart in size that squares overflow
 */
export function fitSaturation(
  problem: FitProblem,
  first: RelativeFit,
  zero: RelativeFit,
  series: DecaySeries,
  readings: Readings,
): FittedLaw | null {
  const saturating = fitSaturating(problem, scaled(first, problem), scaled(zero, problem));
  return describeSaturation(saturating, problem, series, readings);
}

/** The same, fitted to weighted readings from the fit without weights. */
export function weighSaturation(
  problem: FitProblem,
  { saturating }: FittedLaw,
  series: DecaySeries,
  readings: Readings,
): FittedLaw | null {
  if (saturating === null) return null;
  const found = fitSaturatingWeighted(problem, saturating);
  return describeSaturation(found, problem, series, readings);
}

function describeSaturation(
  saturating: SaturatingFit,
  problem: FitProblem,
  series: DecaySeries,
  readings: Readings,
): FittedLaw | null {
  if (!Number.isFinite(saturating.rss)) return null;
  const described = describeSaturating(saturating, problem, series, readings);
  const parameters = problem.mode === 'fraction' ? 2 : 3;
  return {
    fit: described.fit,
    initialRate: described.initialRate,
    firstConcentration: described.firstConcentration,
    conversion: described.conversion,
    name: 'saturating',
    parameters,
    criterion: criterionOf(problem, described.fit.rss, parameters),
    problem,
    law: null,
    relative: null,
    saturating,
    leveled: null,
  };
}

/**
 * Fits a law that has an order and approaches a level that stays.
 *
 * @returns null where no approach can be told from a level alone
 */
export function fitOrderWithLevel(
  problem: FitProblem,
  law: RateLaw,
  series: DecaySeries,
  readings: Readings,
): FittedLaw | null {
  const leveled = fitLevel(problem, law);
  if (leveled === null) return null;
  return {
    ...describeLevel(leveled, series, readings),
    name: law.name,
    parameters: leveled.parameters,
    criterion: criterionOf(problem, leveled.rss, leveled.parameters),
    problem,
    law,
    relative: null,
    saturating: null,
    leveled,
  };
}

const ROUNDING = 1e-14;

/** Residual sums of squares below this are rounding, base unit squared. */
export function leastRss({ t, valueScale }: FitProblem): number {
  return t.length * (ROUNDING * valueScale) ** 2;
}

/** What laws are weighed by. */
function criterionOf(problem: FitProblem, rss: number, parameters: number): number {
  const n = problem.t.length;
  const held = Math.max(rss, leastRss(problem));
  return aicc(n, held, parameters) ?? n * Math.log(held / n) + 2 * parameters;
}

const scaled = ({ kRel, rss }: RelativeFit, { timeScale, valueScale }: FitProblem) => ({
  kRel: (kRel ?? 0) * timeScale,
  rss: rss / valueScale ** 2,
});

/** What a choice between laws that have an order needs of a fit. */
export const lawEvidence = ({ name, law, criterion }: FittedLaw): LawEvidence => ({
  name,
  order: law?.order ?? NaN,
  aicc: criterion,
});

/** Readings less the curve, in the reading's base unit, in time order. */
export function residualsOfLaw({ problem, relative, saturating, leveled }: FittedLaw): number[] {
  if (leveled !== null) return levelResiduals(leveled);
  if (relative !== null) return residualsOf(relative);
  return saturating === null ? [] : saturatingResiduals(problem, saturating);
}

/** Diagonal of the hat matrix, in time order; null where the Jacobian is singular. */
export function leveragesOfLaw({
  problem,
  relative,
  saturating,
  leveled,
}: FittedLaw): number[] | null {
  if (leveled !== null) return levelLeverages(leveled);
  if (relative !== null) return leveragesOf(relative);
  return saturating === null ? null : saturatingLeverages(problem, saturating);
}

/** Unit of k: that of the law's order; in the saturating law k is the rate on the full surface. */
export function unitOfK({ law }: FittedLaw, dimension: ReadingDimension): string {
  return rateConstantUnit(law?.order ?? 0, dimension);
}

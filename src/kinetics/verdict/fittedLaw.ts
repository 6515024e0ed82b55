import { describeFit, type DescribedFit } from '../fitting/describeFit';
import { describeSaturating } from '../fitting/describeSaturating';
import { fitLaw, leveragesOf, residualsOf, type RelativeFit } from '../fitting/fitLaw';
import {
  fitSaturating,
  saturatingLeverages,
  saturatingResiduals,
  type SaturatingFit,
} from '../fitting/fitSaturating';
import type { FitProblem } from '../fitting/problem';
import type { Readings } from '../fitting/readings';
import type { RateLaw } from '../rateLaws/rateLaw';
import { rateConstantUnit } from '../rateLaws/rateConstantUnit';
import type { DecaySeries, RateLawName, ReadingDimension } from '../types';

/** One law with its fit to one well. */
export interface FittedLaw extends DescribedFit {
  name: RateLawName;
  /** Null for the saturating law. */
  order: number | null;
  parameters: number;
  kUnit(dimension: ReadingDimension): string;
  /** The reading's base unit, in time order. */
  residuals(): number[];
  /** Diagonal of the hat matrix, in time order; null where the Jacobian is singular. */
  leverages(): number[] | null;
  /** The fit of a law that has an order. */
  relative: RelativeFit | null;
  /** The fit of the saturating law. */
  saturating: SaturatingFit | null;
}

/** Fits a law that has an order. */
export function fitOrder(
  problem: FitProblem,
  law: RateLaw,
  series: DecaySeries,
  readings: Readings,
): FittedLaw & { relative: RelativeFit } {
  const relative = fitLaw(problem, law);
  return {
    ...describeFit(relative, series, readings),
    name: law.name,
    order: law.order,
    parameters: relative.parameters,
    kUnit: (dimension) => law.kUnit(dimension),
    residuals: () => residualsOf(relative),
    leverages: () => leveragesOf(relative),
    relative,
    saturating: null,
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
  const scaled = ({ kRel, rss }: RelativeFit) => ({
    kRel: (kRel ?? 0) * problem.timeScale,
    rss: rss / problem.valueScale ** 2,
  });
  const saturating = fitSaturating(problem, scaled(first), scaled(zero));
  if (!Number.isFinite(saturating.rss)) return null;
  return {
    ...describeSaturating(saturating, problem, series, readings),
    name: 'saturating',
    order: null,
    parameters: problem.mode === 'fraction' ? 2 : 3,
    // k is the rate on the full surface.
    kUnit: (dimension) => rateConstantUnit(0, dimension),
    residuals: () => saturatingResiduals(problem, saturating),
    leverages: () => saturatingLeverages(problem, saturating),
    relative: null,
    saturating,
  };
}

import type { AnalysedWell } from '../analyseWell';
import type { CatalystAnalysis, LawFit, RateLawName } from '../types';

/** The result keys that a basis fills in. */
export type BasisResult = Pick<
  CatalystAnalysis,
  | 'kUnit'
  | 'kRef'
  | 'kRefTemperatureK'
  | 'rateRef'
  | 'timeToTarget'
  | 'bracket'
  | 'arrhenius'
  | 'activationEnergy'
  | 'initialRateActivationEnergy'
  | 'lnA'
  | 'adsorption'
> & {
  /** True when the rate of blanks that react was taken off. */
  net: boolean;
};

/** A reacting well with the factor that brings its k to the pooled loading. */
export interface PooledWell extends AnalysedWell {
  factor: number;
}

/** The fit of a well under a law, or under its shown law. */
export function fitUnder(well: AnalysedWell, law: RateLawName | null): LawFit | null {
  const name = law ?? well.analysis.shownLaw;
  return name === null ? null : (well.analysis.fits[name] ?? null);
}

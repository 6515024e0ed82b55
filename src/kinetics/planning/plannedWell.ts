import { collectReadings } from '../fitting/readings';
import { MODE, scaleReadings, type FitProblem } from '../fitting/problem';
import { findRateLaw } from '../rateLaws/registry';
import type { RateLaw } from '../rateLaws/rateLaw';
import type { RateLawName, SeriesAnalysis } from '../types';

/** A well as a plan needs it: what was found, and when its usable readings were taken. */
export interface PlannedWell {
  analysis: SeriesAnalysis;
  /** s, ascending; only readings that count. */
  timesS: readonly number[];
}

/** What a law says that a further run of a well will read. */
export interface ExpectedCurve {
  law: RateLaw;
  kind: SeriesAnalysis['kind'];
  /** Reading's base unit: A of y = A g, or of y = A (1 − g); 1 for conversion. */
  amplitude: number;
  /** s⁻¹ at `originS`. */
  kRel: number;
  originS: number;
  /** Noise of one reading, its base unit, above 0. */
  residualSd: number;
}

/** The laws that compete for a well. */
const COMPETING = ['zero', 'first', 'second'] as const;

/** The laws of whole order, as the verdict weighs them. */
export function competingLaws(): RateLaw[] {
  return COMPETING.map((name) => findRateLaw(name)).filter((law) => law !== null);
}

/**
 * The curve of one law through a well, to predict further readings by.
 *
 * @param residualSd noise of one reading; the fit's own where it is not given
 * @returns null where the well does not hold the curve: no decay, C0 open, noise unknown, a
 *   level beside it
 */
export function expectedCurve(
  analysis: SeriesAnalysis,
  name: RateLawName,
  residualSd = analysis.fits[name]?.residualSd ?? null,
): ExpectedCurve | null {
  const law = findRateLaw(name);
  const fit = analysis.fits[name];
  if (law === null || fit == null || fit.level != null) return null;
  const { kRel, originS } = fit;
  const amplitude =
    analysis.kind === 'conversion'
      ? 1
      : fit.c0 === null
        ? NaN
        : fit.c0 * (analysis.kind === 'product' ? analysis.productPerReactant : 1);
  if (kRel === null || !(kRel > 0) || !(amplitude > 0) || !(residualSd! > 0)) return null;
  return { law, kind: analysis.kind, amplitude, kRel, originS, residualSd: residualSd! };
}

/** The reading that a curve predicts, base unit. */
export function expectedReading(curve: ExpectedCurve, timeS: number): number {
  const u = curve.kRel * (timeS - curve.originS);
  const shape = MODE[curve.kind] === 'decay' ? curve.law.relative(u) : curve.law.converted(u);
  return curve.amplitude * shape;
}

/** Conversion of the reactant that a curve reaches at a time, 0 to 1. */
export function expectedConversion(curve: ExpectedCurve, timeS: number): number {
  return Math.min(Math.max(curve.law.converted(curve.kRel * (timeS - curve.originS)), 0), 1);
}

/** The predicted readings without noise, as the engine fits them. */
export function expectedProblem(curve: ExpectedCurve, timesS: readonly number[]): FitProblem {
  const readings = collectReadings({
    id: '',
    catalyst: null,
    role: 'sample',
    block: null,
    temperatureK: 1,
    timesS,
    values: timesS.map((timeS) => expectedReading(curve, timeS)),
    dimension: 'ratio',
    kind: curve.kind,
    initialConcentration: null,
    productPerReactant: 1,
    loadingGPerL: null,
    siteDensityMolPerKg: null,
    nu: 1,
    law: 'auto',
  });
  return scaleReadings(readings, curve.kind);
}

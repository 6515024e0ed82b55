import { GAS_CONSTANT } from '../constants';
import { MODE } from '../fitting/problem';
import { collectReadings } from '../fitting/readings';
import { rateLawOf } from '../rateLaws/registry';
import { saturatingShape } from '../rateLaws/saturating';
import { estimate, finiteOrNull } from '../statistics/estimate';
import type { ArrheniusLine, Estimate, LawFit, OneStep, RateLawName } from '../types';
import { fitArrhenius, poolBlocks } from './fitArrhenius';
import { constantPoint } from './lawBasis';
import { oneStepOrder, oneStepSaturating } from './oneStep/oneStepLaw';
import { covarianceWithScatter, type Scatter } from './oneStep/scatter';
import { solveOneStep } from './oneStep/solveOneStep';
import type { OneStepWell } from './oneStep/wellTerms';
import { fitUnder, type PooledWell } from './pooledWell';
import { countTemperatures, setTemperatures } from './temperatures';

/** What the fit of the single wells came to: the law and its lines. */
export interface TwoStepAnswer {
  law: RateLawName | null;
  /** Null for the saturating law. */
  order: number | null;
  arrhenius: ArrheniusLine | null;
  activationEnergy: Estimate | null;
  /** False where only kRel is known, which then stands for k. */
  kKnown: boolean;
}

/** Residuals below this share of a reading's size are rounding. */
const ROUNDING = 1e-9;

/**
 * Fits all readings of all wells of a catalyst at once: one law, ln k (and ln K of the saturating
 * law) on straight lines against 1/T, one C0 per well.
 *
 * Readings are weighted by the noise of their own well, as its own fit shows it. That a plate run
 * has a temperature error and replicates differ is seen by no reading, so the intervals take the
 * scatter of wells and blocks from the lines of the two-step answer; `readingSe` leaves it out.
 *
 * @param wells the reacting wells
 * @returns null without a law or its lines, below 2 temperatures, or where no search settles
 */
export function fitOneStep(
  wells: readonly PooledWell[],
  { law, order, arrhenius, activationEnergy, kKnown }: TwoStepAnswer,
): OneStep | null {
  if (law === null || arrhenius === null) return null;
  const powerLaw = rateLawOf(law, order);
  const lines = powerLaw === null ? [arrhenius, adsorptionLine(wells)] : [arrhenius];
  if (!lines.every((line) => line !== null)) return null;
  const used = wells.flatMap((well) => {
    const own = readingsOf(well, law, order, kKnown);
    return own === null ? [] : [{ well, own }];
  });
  const temperatures = used.map(({ well }) => well.series.temperatureK);
  if (countTemperatures(temperatures) < 2) return null;

  const centre = 1 / arrhenius.centreK;
  const reach = Math.max(...temperatures.map((t) => Math.abs(1 / t - centre)));
  const fitted = used.map(({ well, own }) => ({
    ...own,
    x: (1 / well.series.temperatureK - centre) / reach,
  }));
  const start = lines.flatMap((line) => {
    const slope = -line.activationEnergy / GAS_CONSTANT;
    return [line.lnKc + slope * (centre - 1 / line.centreK), slope * reach];
  });
  const model = powerLaw === null ? oneStepSaturating : oneStepOrder(powerLaw);
  const solution = solveOneStep(model, fitted, start);
  const errors = covarianceWithScatter(
    solution,
    fitted.map(({ x }) => x),
    blocksOf(used.map(({ well }) => well)),
    lines.map(scatterOf),
  );
  const toEnergy = GAS_CONSTANT / reach;
  const errorOf = (matrix: number[][] | null, i: number) =>
    matrix === null ? null : finiteOrNull(Math.sqrt(matrix[i]![i]!));
  // Scatter of blocks about a line takes a third temperature to be seen.
  const certain = arrhenius.activationEnergySe !== null;
  const energyOf = (slope: number) => {
    const se = certain ? errorOf(errors, slope) : null;
    const dof = lines[(slope - 1) / 2]!.dof;
    const value = -solution.shared[slope]! * toEnergy;
    return estimate(value, se === null ? null : se * toEnergy, dof);
  };
  const energy = energyOf(1);
  if (energy === null || !solution.converged) return null;
  const readingError = errorOf(solution.covariance, 1);
  return {
    activationEnergy: energy,
    readingSe: readingError === null ? null : readingError * toEnergy,
    lnKc: solution.shared[0]!,
    lnKcSe: errorOf(errors, 0),
    centreK: arrhenius.centreK,
    adsorptionEnthalpy: powerLaw === null ? energyOf(3) : null,
    lnAdsorptionConstant: solution.shared[2] ?? null,
    wells: fitted.length,
    readings: solution.readings,
    disagreesWithTwoStep: disagree(energy, activationEnergy),
  };
}

/** One of the answers lies outside the other's interval. */
function disagree(one: Estimate, two: Estimate | null): boolean {
  const outside = (value: number, { low, high }: Estimate) =>
    low !== null && high !== null && (value < low || value > high);
  return two !== null && (outside(one.value, two) || outside(two.value, one));
}

/** ln K of the wells against 1/T, where the saturating law holds it inside its limits. */
function adsorptionLine(wells: readonly PooledWell[]): ArrheniusLine | null {
  const points = wells.flatMap((well) => {
    const fit = well.analysis.fits.saturating;
    if (fit?.saturation == null) return [];
    const { K, KSe } = fit.saturation;
    const point = constantPoint({ ...well, factor: 1 }, K, KSe, fit.dof);
    return point === null ? [] : [point];
  });
  return fitArrhenius(points);
}

function scatterOf({ points, activationEnergy, tau }: ArrheniusLine): Scatter {
  const { replicateVariance } = poolBlocks(points, -activationEnergy / GAS_CONSTANT);
  return { replicate: replicateVariance, block: tau * tau };
}

function blocksOf(wells: readonly PooledWell[]): string[] {
  const sets = setTemperatures(wells.map((well) => well.series.temperatureK));
  return wells.map(({ series }, i) => `${series.block ?? ''}\u0000${sets[i]!}`);
}

/** A well as the fit needs it, all but its place on the temperature axis. */
function readingsOf(
  well: PooledWell,
  law: RateLawName,
  order: number | null,
  kKnown: boolean,
): Omit<OneStepWell, 'x'> | null {
  const fit = fitUnder(well, law);
  if (fit === null || !(well.factor > 0)) return null;
  const { series } = well;
  const mode = MODE[series.kind];
  const { times, values } = collectReadings(series);
  const originS = mode === 'decay' ? times[0]! : 0;
  const largest = values.reduce((most, value) => Math.max(most, value), 0);
  const start = amplitudeAt(originS, fit, order) ?? largest;
  const perReactant = mode === 'growth' ? series.productPerReactant : 1;
  // Growth that has not run out ends beyond its last reading.
  const amplitude = fit.c0 === null && mode === 'growth' ? (2 * largest) / perReactant : start;
  if (!(amplitude > 0)) return null;
  const size = mode === 'fraction' ? 1 : amplitude * perReactant;
  const variance = Math.max(noiseOf(fit), (ROUNDING * size) ** 2);
  if (!Number.isFinite(1 / variance)) return null;
  const lnC = lnConcentration(well, order, kKnown);
  if (lnC === undefined) return null;
  return {
    mode,
    timesS: times.map((time) => Math.max(time - originS, 0)),
    values,
    variance,
    lnFactor: Math.log(well.factor),
    perReactant,
    lnC,
    lnAmplitude: Math.log(amplitude),
  };
}

/**
 * Variance of a well's readings, as a weight needs it: the reciprocal of rss/dof is on average too
 * large by dof/(dof − 2) (Meier 1953).
 */
function noiseOf({ rss, dof }: LawFit): number {
  return dof > 0 ? rss / Math.max(dof - 2, dof / 2) : rss;
}

/** C of a well's own fit at a time, base unit. */
function amplitudeAt(timeS: number, fit: LawFit, order: number | null): number | null {
  if (fit.c0 === null || fit.kRel === null) return null;
  const u = fit.kRel * (timeS - fit.originS);
  const law = order === null ? null : rateLawOf('order', order);
  const shape = law ?? saturatingShape(fit.saturation?.coverage ?? 0);
  const c = fit.c0 * shape.relative(u);
  return c > 0 && Number.isFinite(c) ? c : null;
}

/**
 * ln C0 where it is no parameter of the curve's shape; null where it is fitted; undefined where the
 * well cannot be set beside the others.
 */
function lnConcentration(
  { series, analysis }: PooledWell,
  order: number | null,
  kKnown: boolean,
): number | null | undefined {
  // The shape of a first order knows no concentration.
  if (!kKnown || order === 1) return 0;
  if (series.kind === 'conversion') {
    const c0 = series.initialConcentration;
    return c0 !== null && c0 > 0 ? Math.log(c0) : undefined;
  }
  return series.kind === 'signal' || analysis.dimension === 'ratio' ? 0 : null;
}

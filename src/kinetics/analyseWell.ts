import { profileRateConstant } from './fitting/profileInterval';
import type { Readings } from './fitting/readings';
import { collectReadings, resultDimension } from './fitting/readings';
import { requestedLaw } from './rateLaws/registry';
import { estimate, finiteOrNull } from './statistics/estimate';
import { intervalFactor } from './statistics/tDistribution';
import type { DecaySeries, Estimate, SeriesAnalysis, WarningCode } from './types';
import { averageInitialRate } from './verdict/averageInitialRate';
import { testForDecay, type DecayTest } from './verdict/decayTest';
import { residualsOfLaw, unitOfK, type FittedLaw } from './verdict/fittedLaw';
import { fitWell, type WellFits } from './verdict/fitWell';
import { testLackOfFit } from './verdict/lackOfFit';
import { findOutliers } from './verdict/outliers';
import {
  selectRateLaw,
  type Evidence,
  type FreeOrder,
  type Selection,
} from './verdict/selectRateLaw';

/** A well's analysis together with what a catalyst's pooled verdict needs of it. */
export interface AnalysedWell {
  series: DecaySeries;
  analysis: SeriesAnalysis;
  evidence: Evidence | null;
  freeOrder: FreeOrder | null;
  /** Whether it reacts at all; null where the well is unusable. */
  decay: Pick<DecayTest, 'p' | 'trendTail'> | null;
  /** C at the first reading by the shown law, base unit; null where C0 is not known. */
  firstConcentration: number | null;
}

/** Readings and distinct times below which nothing is fitted. */
const FEWEST_READINGS = 3;
/** Below this conversion an undetermined order is put down to it. */
const LOW_CONVERSION = 0.5;
/** A free order whose interval reaches farther than this says nothing. */
const WIDEST_ORDER = 5;

/**
 * Analyses one well: fits, verdict, rate constant and initial rate.
 *
 * @throws RangeError when times and values differ in length, the temperature is not above 0 K, or
 *   a forced order is out of range
 */
export function analyseWell(series: DecaySeries): AnalysedWell {
  if (!(series.temperatureK > 0)) {
    throw new RangeError(`temperatureK must be above 0, got ${series.temperatureK}`);
  }
  const forced = requestedLaw(series.law);
  const readings = collectReadings(series);
  const blank = emptyAnalysis(series, readings);
  const few = readings.values.length < FEWEST_READINGS;
  if (few || readings.distinctTimes < FEWEST_READINGS) {
    blank.warnings.push(few ? 'too-few-readings' : 'too-few-distinct-times');
    return {
      series,
      analysis: blank,
      evidence: null,
      freeOrder: null,
      decay: null,
      firstConcentration: null,
    };
  }

  const fits = fitWell(series, readings, forced);
  const decay = testForDecay(
    readings,
    series.kind,
    fits.plainFirst.rss,
    fits.plainFirst.kRel === null || fits.plainFirst.kRel > 0,
  );
  if (decay.outcome !== 'decays') return describeDeadWell(series, readings, blank, fits, decay);

  const selection: Selection =
    fits.evidence === null
      ? {
          verdict: 'undetermined',
          order: null,
          law: null,
          best: bestOf(fits).name,
          warnings: ['too-few-for-order'],
        }
      : selectRateLaw(fits.evidence, fits.apparentOrder);
  const asserted = forced?.name ?? selection.law;
  const shown = fits.laws.find((fitted) => fitted.name === asserted) ?? bestOf(fits);
  const analysis = describeReactingWell(series, readings, blank, fits, selection, shown);
  return {
    series,
    analysis,
    evidence: fits.evidence,
    freeOrder: fits.apparentOrder,
    decay,
    firstConcentration: shown.firstConcentration,
  };
}

function bestOf(fits: WellFits): FittedLaw {
  return fits.laws.reduce((best, fitted) => (fitted.criterion < best.criterion ? fitted : best));
}

function emptyAnalysis(series: DecaySeries, readings: Readings): SeriesAnalysis {
  return {
    id: series.id,
    catalyst: series.catalyst,
    role: series.role,
    block: series.block,
    temperatureK: series.temperatureK,
    dimension: resultDimension(series),
    kind: series.kind,
    productPerReactant: series.productPerReactant,
    loadingGPerL: series.loadingGPerL,
    law: series.law,
    verdict: 'unusable',
    order: null,
    k: null,
    kUnit: null,
    kRel: null,
    adsorptionConstant: null,
    c0: null,
    level: null,
    conversion: null,
    initialRate: null,
    net: null,
    apparentOrder: null,
    fits: {},
    shownLaw: null,
    residualSd: null,
    lackOfFit: null,
    outliers: [],
    pointsUsed: readings.values.length,
    pointsExcluded: readings.excluded,
    warnings: readings.unsorted ? ['unsorted-times'] : [],
  };
}

/** A well that shows no reaction: its signed rate, so that an upper limit can be read off. */
function describeDeadWell(
  series: DecaySeries,
  readings: Readings,
  blank: SeriesAnalysis,
  fits: WellFits,
  decay: DecayTest,
): AnalysedWell {
  const zero = fits.laws.find((fitted) => fitted.law?.order === 0)!;
  const perReading =
    series.kind === 'product'
      ? 1 / series.productPerReactant
      : series.kind === 'conversion'
        ? (series.initialConcentration ?? 1)
        : 1;
  const rateSe = decay.rateSe === null ? null : decay.rateSe * perReading;
  const analysis: SeriesAnalysis = {
    ...blank,
    verdict: 'no-reaction',
    c0: estimate(zero.fit.c0, zero.fit.c0Se, zero.fit.dof),
    conversion: decay.conversion,
    initialRate: estimate(decay.rate * perReading, rateSe, decay.dof),
    fits: fits.byName,
    shownLaw: 'zero',
    residualSd: zero.fit.residualSd,
    lackOfFit: testLackOfFit(residualsOfLaw(zero), fits.unit),
    outliers: findOutliers(zero, fits.unit, readings.indices),
    warnings: [...blank.warnings],
  };
  if (decay.outcome === 'rises') analysis.warnings.push('rising');
  if (analysis.outliers.length > 0) analysis.warnings.push('outlier');
  return {
    series,
    analysis,
    evidence: null,
    freeOrder: null,
    decay,
    firstConcentration: zero.firstConcentration,
  };
}

function describeReactingWell(
  series: DecaySeries,
  readings: Readings,
  blank: SeriesAnalysis,
  fits: WellFits,
  selection: Selection,
  shown: FittedLaw,
): SeriesAnalysis {
  const isForced = series.law !== 'auto';
  const lackOfFit = testLackOfFit(residualsOfLaw(shown), fits.unit);
  const misses = !isForced && selection.law !== null && lackOfFit.significant;
  const isAsserted = isForced || (selection.law !== null && !misses);
  const { fit, initialRate } = shown;
  const warnings: WarningCode[] = [...blank.warnings];
  if (!isForced) warnings.push(...selection.warnings);
  if (series.level === true) warnings.push('level-by-request');
  if (misses) warnings.push('no-simple-order');
  if (lackOfFit.significant) warnings.push('lack-of-fit');
  if (
    !isAsserted &&
    selection.verdict === 'undetermined' &&
    (shown.conversion ?? 0) < LOW_CONVERSION
  ) {
    warnings.push('low-conversion');
  }
  if (isAsserted && fit.k === null && blank.dimension === 'ratio') {
    warnings.push('initial-concentration-needed');
  }
  if (fits.exact) warnings.push('exact-fit');
  const outliers = findOutliers(shown, fits.unit, readings.indices);
  if (outliers.length > 0) warnings.push('outlier');

  const rates = fits.laws
    .filter((fitted) => fitted.name !== 'order')
    .map((fitted) => ({ ...fitted.initialRate, criterion: fitted.criterion }));
  const known = series.belowLimit?.includes(true) !== true;
  const k = isAsserted ? rateConstantOf(shown, known) : null;
  return {
    ...blank,
    verdict: isForced ? 'forced' : misses ? 'other' : selection.verdict,
    order: isAsserted ? (shown.law?.order ?? null) : null,
    k,
    kUnit: k === null ? null : unitOfK(shown, blank.dimension),
    adsorptionConstant:
      isAsserted && fit.saturation !== null
        ? estimate(fit.saturation.K, fit.saturation.KSe, fit.dof)
        : null,
    kRel: isAsserted ? estimate(fit.kRel, fit.kRelSe, fit.dof) : null,
    c0: estimate(fit.c0, fit.c0Se, fit.dof),
    level: fit.level === null ? null : estimate(fit.level.value, fit.level.se, fit.dof),
    conversion: shown.conversion,
    initialRate: isAsserted
      ? estimate(initialRate.value, initialRate.se, fit.dof)
      : averageInitialRate(rates, fit.dof),
    apparentOrder: freeOrderEstimate(fits.apparentOrder),
    fits: fits.byName,
    shownLaw: shown.name,
    residualSd: finiteOrNull(fit.residualSd),
    lackOfFit,
    outliers,
    warnings,
  };
}

/**
 * k with its interval: by profile where the plain one misleads.
 *
 * @param known false where readings lie below a limit, which the profile does not count
 */
function rateConstantOf({ fit, relative }: FittedLaw, known: boolean): Estimate | null {
  const plain = estimate(fit.k, fit.kSe, fit.dof);
  if (!known || plain?.se == null || relative === null || !(plain.value > 0)) return plain;
  const profile = profileRateConstant(relative, plain.se / plain.value);
  if (profile === null) return plain;
  return {
    ...plain,
    low: plain.value * profile.low,
    high: profile.high === null ? null : finiteOrNull(plain.value * profile.high),
  };
}

function freeOrderEstimate(free: FreeOrder | null): Estimate | null {
  if (free?.orderSe == null) return null;
  const half = free.orderSe * intervalFactor(free.dof);
  return half <= WIDEST_ORDER ? estimate(free.order, free.orderSe, free.dof) : null;
}

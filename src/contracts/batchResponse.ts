import { baseUnit, rateUnit, reciprocalUnit } from '../kinetics/rateLaws/rateConstantUnit';
import type {
  CatalystAnalysis,
  Estimate,
  LawFit,
  LawRequest,
  RateLawName,
  ScreenAnalysis,
  SeriesAnalysis,
  Verdict,
  WarningCode,
} from '../kinetics/types';

interface WithUnit {
  value: number;
  unit: string;
}
interface WithError extends WithUnit {
  se: number | null;
}
interface WithLimits extends WithUnit {
  low: number | null;
  high: number | null;
}
type WithErrorAndLimits = WithError & WithLimits;

/** One law's fit in the answer: base units, the law's own unit for k. */
export type BatchFit = Pick<
  LawFit,
  'k' | 'kSe' | 'kRel' | 'kRelSe' | 'c0' | 'c0Se' | 'rss' | 'aicc' | 'weight'
> & {
  /** Adsorption constant; only with the saturating law. */
  K?: number | null;
  KSe?: number | null;
};

export interface BatchSeriesResult {
  id: string;
  verdict: Verdict;
  order: number | null;
  law: LawRequest;
  k: WithErrorAndLimits | null;
  kRel: WithError | null;
  /** Adsorption constant of the saturating law. */
  K: WithError | null;
  c0: WithError | null;
  /** After the blank. */
  net: { k: WithErrorAndLimits | null; initialRate: WithLimits | null } | null;
  conversion: number | null;
  initialRate: WithLimits | null;
  apparentOrder: { value: number; low: number | null; high: number | null } | null;
  fits: Partial<Record<RateLawName, BatchFit>>;
  points: { used: number; excluded: number };
  warnings: WarningCode[];
}

export interface BatchCatalystResult {
  catalyst: string;
  verdict: Verdict;
  order: number | null;
  basis: 'law' | 'initial-rate';
  activationEnergy: WithErrorAndLimits | null;
  initialRateActivationEnergy: WithErrorAndLimits | null;
  lnA: WithError | null;
  kRef: (WithLimits & { temperature: WithUnit }) | null;
  rateRef: WithLimits | null;
  timeToTarget: WithLimits | null;
  temperatures: number;
  wells: number;
  warnings: WarningCode[];
}

/** The answer to a batch. */
export interface BatchResponse {
  engine: string;
  series: BatchSeriesResult[];
  catalysts: BatchCatalystResult[];
}

function withError(estimate: Estimate | null, unit: string): WithError | null {
  return estimate === null ? null : { value: estimate.value, unit, se: estimate.se };
}

function withLimits(estimate: Estimate | null, unit: string): WithLimits | null {
  return estimate === null
    ? null
    : { value: estimate.value, unit, low: estimate.low, high: estimate.high };
}

function withBoth(estimate: Estimate | null, unit: string | null): WithErrorAndLimits | null {
  if (estimate === null || unit === null) return null;
  const { value, se, low, high } = estimate;
  return { value, unit, se, low, high };
}

function inKilojoules(estimate: Estimate | null): WithErrorAndLimits | null {
  if (estimate === null) return null;
  const kilo = (value: number | null) => (value === null ? null : value / 1000);
  return {
    value: estimate.value / 1000,
    unit: 'kJ/mol',
    se: kilo(estimate.se),
    low: kilo(estimate.low),
    high: kilo(estimate.high),
  };
}

function fitOf(fit: LawFit): BatchFit {
  const { k, kSe, kRel, kRelSe, c0, c0Se, rss, aicc, weight, saturation } = fit;
  const own = { k, kSe, kRel, kRelSe, c0, c0Se, rss, aicc, weight };
  return saturation === null ? own : { ...own, K: saturation.K, KSe: saturation.KSe };
}

function fitsOf(fits: SeriesAnalysis['fits']): BatchSeriesResult['fits'] {
  return Object.fromEntries(Object.entries(fits).map(([name, fit]) => [name, fitOf(fit)]));
}

/** A well's result as the batch contract answers it. */
export function batchSeriesResult(analysis: SeriesAnalysis): BatchSeriesResult {
  const { dimension } = analysis;
  const order = analysis.apparentOrder;
  return {
    id: analysis.id,
    verdict: analysis.verdict,
    order: analysis.order,
    law: analysis.law,
    k: withBoth(analysis.k, analysis.kUnit),
    kRel: withError(analysis.kRel, 's^-1'),
    K: withError(analysis.adsorptionConstant, reciprocalUnit(dimension)),
    c0: withError(analysis.c0, baseUnit(dimension)),
    net:
      analysis.net === null
        ? null
        : {
            k: withBoth(analysis.net.k, analysis.kUnit),
            initialRate: withLimits(analysis.net.initialRate, rateUnit(dimension)),
          },
    conversion: analysis.conversion,
    initialRate: withLimits(analysis.initialRate, rateUnit(dimension)),
    apparentOrder: order === null ? null : { value: order.value, low: order.low, high: order.high },
    fits: fitsOf(analysis.fits),
    points: { used: analysis.pointsUsed, excluded: analysis.pointsExcluded },
    warnings: analysis.warnings,
  };
}

/** A catalyst's result as the batch contract answers it. */
export function batchCatalyst(result: CatalystAnalysis): BatchCatalystResult {
  const kRef = result.kUnit === null ? null : withLimits(result.kRef, result.kUnit);
  const at = result.kRefTemperatureK;
  return {
    catalyst: result.catalyst,
    verdict: result.verdict,
    order: result.order,
    basis: result.basis,
    activationEnergy: inKilojoules(result.activationEnergy),
    initialRateActivationEnergy: inKilojoules(result.initialRateActivationEnergy),
    lnA: result.kUnit === null ? null : withError(result.lnA, result.kUnit),
    kRef: kRef === null || at === null ? null : { ...kRef, temperature: { value: at, unit: 'K' } },
    rateRef: withLimits(result.rateRef, rateUnit(result.dimension)),
    timeToTarget: withLimits(result.timeToTarget, 's'),
    temperatures: result.temperatures,
    wells: result.wells,
    warnings: result.warnings,
  };
}

/** The engine's results as the batch contract answers them: base units, null for what is not. */
export function batchResponse(analysis: ScreenAnalysis): BatchResponse {
  return {
    engine: analysis.engine,
    series: analysis.series.map(batchSeriesResult),
    catalysts: analysis.catalysts.map(batchCatalyst),
  };
}

import type { AnalysedWell } from '../analyseWell';
import { rateLawOf, requestedLaw } from '../rateLaws/registry';
import type {
  CatalystAnalysis,
  LawFit,
  LawRequest,
  RateLawName,
  ReadingDimension,
  ReferenceConditions,
  Verdict,
  WarningCode,
} from '../types';
import { activationParameters } from './eyring';
import type { BlankModel } from '../blanks/blankModel';
import { blanksReact, type BlankRate } from './blanksReact';
import { fitOneStep } from './fitOneStep';
import { describeByInitialRate } from './initialRateBasis';
import { anyDecay } from './jointDecay';
import { describeByLaw } from './lawBasis';
import { growsTooLittle, massOrder } from './massOrder';
import { poolEvidence, type PooledVerdict } from './poolEvidence';
import { fitUnder, type BasisResult, type PooledWell } from './pooledWell';
import { poolLoading } from './poolLoading';
import { describeBySaturation } from './saturatingBasis';
import { countTemperatures } from './temperatures';
import { warnOfTemperatures } from './temperatureWarnings';

const NOTHING: BasisResult = {
  kUnit: null,
  kRef: null,
  kRefTemperatureK: null,
  rateRef: null,
  timeToTarget: null,
  bracket: false,
  arrhenius: null,
  activationEnergy: null,
  initialRateActivationEnergy: null,
  lnA: null,
  adsorption: null,
  net: false,
};

/**
 * Analyses one catalyst over all its wells: the law they share, the rate constant at the reference
 * conditions, and the apparent activation energy.
 *
 * @param wells its samples (or benchmarks), at least one; wells whose results have another
 *   dimension than the first usable one's are left out
 * @param blanks what reacts without the catalyst, anywhere in the screen
 * @param model of the blanks of the catalyst's dimension, to take their rate off
 */
export function analyseCatalyst(
  catalyst: string,
  wells: readonly AnalysedWell[],
  reference: ReferenceConditions,
  blanks: readonly BlankRate[] = [],
  model: BlankModel | null = null,
): CatalystAnalysis {
  const usable = wells.filter((well) => well.analysis.verdict !== 'unusable');
  const dimension = (usable[0] ?? wells[0])?.analysis.dimension ?? 'concentration';
  const same = usable.filter((well) => well.analysis.dimension === dimension);
  const decays = anyDecay(same);
  const reacting = decays ? same.filter((well) => well.analysis.verdict !== 'no-reaction') : [];
  const loading = poolLoading(
    reacting.map((well) => well.series.loadingGPerL),
    reference.loadingGPerL,
  );
  const pooled = reacting.flatMap((well, i): PooledWell[] => {
    const factor = loading.factors[i]!;
    return factor === null ? [] : [{ ...well, factor }];
  });
  const warnings: WarningCode[] = [];
  const decided = decide(wells, pooled, decays, warnings);

  let basis: BasisResult = NOTHING;
  if (pooled.length > 0) {
    warnings.push(...loading.warnings);
    basis = describeBasis(decided, pooled, dimension, reference, model, loading.loadingGPerL);
    if (pooled.some(({ series }) => series.level === true)) {
      // What stays is not known at the reference, so neither are rate and time.
      basis = { ...basis, rateRef: null, timeToTarget: null, bracket: false };
      warnings.push('level-by-request');
    }
    warnings.push(...warnOfTemperatures(pooled, basis.arrhenius, reference));
    if (blanksReact(blanks, pooled)) {
      warnings.push(basis.net ? 'blank-subtracted' : 'blank-reacts');
    }
    if (basis.net && basis.arrhenius === null && basis.kRef === null && basis.rateRef === null) {
      warnings.push('not-above-blank');
    }
  }
  const byMass = massOrder(pooled);
  if (growsTooLittle(byMass)) warnings.push('rate-below-mass');
  const { net, ...figures } = basis;
  const oneStep = net
    ? null
    : fitOneStep(pooled, { ...decided, ...basis, kKnown: basis.kUnit !== null });
  if (oneStep?.disagreesWithTwoStep) warnings.push('one-step-disagrees');
  const rateRefPerMass = perMass(
    basis.rateRef,
    dimension === 'concentration' ? loading.loadingGPerL : null,
  );
  const fits = pooled.map((well) => fitUnder(well, decided.law)).filter((fit) => fit !== null);
  return {
    catalyst,
    dimension,
    verdict: decided.verdict,
    order: decided.order,
    basis: decided.law === null ? 'initial-rate' : 'law',
    ...figures,
    rateRefPerMass,
    turnoverFrequency: perSite(rateRefPerMass, pooled),
    eyring: decided.law === 'first' ? perSiteActivation(basis, loading.loadingGPerL, pooled) : null,
    massOrder: byMass,
    loadingGPerL: pooled.length > 0 ? loading.loadingGPerL : null,
    conversion: largest(same.map((well) => well.analysis.conversion)),
    relativeResidualSd: relativeResidualSd(fits),
    wellsWithLackOfFit: pooled.filter((well) => well.analysis.lackOfFit?.significant === true)
      .length,
    temperatures: countTemperatures(same.map((well) => well.series.temperatureK)),
    wells: same.length,
    seriesIds: wells.map((well) => well.series.id),
    weights: decided.weights,
    warnings: [...new Set(warnings)],
    oneStep,
  };
}

/** What the wells come to: the law to rank by, if any. */
interface Decided {
  verdict: Verdict;
  law: RateLawName | null;
  /** Null for the saturating law. */
  order: number | null;
  weights: PooledVerdict['weights'];
}

const withoutLaw = (verdict: Verdict): Decided => ({
  verdict,
  law: null,
  order: null,
  weights: {},
});

function describeBasis(
  { law, order }: Decided,
  wells: readonly PooledWell[],
  dimension: ReadingDimension,
  reference: ReferenceConditions,
  model: BlankModel | null,
  loadingGPerL: number | null,
): BasisResult {
  if (law === 'saturating') return describeBySaturation(wells, dimension, reference);
  const powerLaw = law === null ? null : rateLawOf(law, order);
  return powerLaw === null
    ? describeByInitialRate(wells, dimension, reference)
    : describeByLaw(wells, powerLaw, dimension, reference, model, loadingGPerL);
}

function decide(
  wells: readonly AnalysedWell[],
  pooled: readonly PooledWell[],
  decays: boolean,
  warnings: WarningCode[],
): Decided {
  const forced = sharedRequest(wells.map((well) => well.series.law));
  if (forced === 'mixed') warnings.push('mixed-forced-laws');
  if (wells.every((well) => well.analysis.verdict === 'unusable')) {
    warnings.push(...wells.flatMap((well) => well.analysis.warnings.filter(saysUnusable)));
    return withoutLaw('unusable');
  }
  if (pooled.length === 0) {
    if (decays && (forced === null || forced === 'mixed')) {
      warnings.push('reacts-only-together');
      return withoutLaw('undetermined');
    }
    warnings.push('no-reacting-wells');
    return withoutLaw('no-reaction');
  }
  if (pooled.length < 2) warnings.push('few-wells');
  const joint = poolEvidence(pooled);
  if (forced === null || forced === 'mixed') {
    warnings.push(...joint.warnings);
    return joint;
  }
  const { shownLaw, order } = pooled[0]!.analysis;
  return { verdict: 'forced', law: shownLaw, order, weights: joint.weights };
}

const saysUnusable = (code: WarningCode) =>
  code === 'too-few-readings' || code === 'too-few-distinct-times';

/** The law that every well forces; null when none does, `mixed` when they disagree. */
function sharedRequest(requests: readonly LawRequest[]): LawRequest | null | 'mixed' {
  // First order and order 1 are one law, however they are asked for.
  const keys = new Set(
    requests.map((request) => {
      const asked = requestedLaw(request);
      return asked === null ? 'auto' : `${asked.name} ${asked.law?.order}`;
    }),
  );
  if (keys.size > 1) return 'mixed';
  return requests[0] === undefined || requests[0] === 'auto' ? null : requests[0];
}

/** Per kilogram of catalyst: mol L⁻¹ s⁻¹ over g/L is mol g⁻¹ s⁻¹. */
function perMass(rate: CatalystAnalysis['rateRef'], loadingGPerL: number | null) {
  return loadingGPerL === null ? null : scaled(rate, 1000 / loadingGPerL);
}

/** ΔH‡ and ΔS‡ of k over the sites at the pooled loading. */
function perSiteActivation(
  { arrhenius, kRef }: BasisResult,
  loadingGPerL: number | null,
  wells: readonly PooledWell[],
): CatalystAnalysis['eyring'] {
  const density = siteDensityOf(wells);
  if (arrhenius === null || kRef === null || loadingGPerL === null || density === null) return null;
  return activationParameters(arrhenius, (loadingGPerL * density) / 1000);
}

function siteDensityOf(wells: readonly PooledWell[]): number | null {
  return (
    wells.find(({ series }) => (series.siteDensityMolPerKg ?? 0) > 0)?.series.siteDensityMolPerKg ??
    null
  );
}

/** Per active site, as a rate of reaction: the coefficient of the reactant divides. */
function perSite(rate: CatalystAnalysis['rateRef'], wells: readonly PooledWell[]) {
  const density = siteDensityOf(wells);
  return density === null ? null : scaled(rate, 1 / (density * wells[0]!.series.nu));
}

function scaled(rate: CatalystAnalysis['rateRef'], factor: number): CatalystAnalysis['rateRef'] {
  if (rate === null) return null;
  const times = (value: number | null) => (value === null ? null : value * factor);
  return {
    value: rate.value * factor,
    se: times(rate.se),
    low: times(rate.low),
    high: times(rate.high),
  };
}

function largest(values: readonly (number | null)[]): number | null {
  const known = values.filter((value) => value !== null);
  return known.length > 0 ? Math.max(...known) : null;
}

function relativeResidualSd(fits: readonly LawFit[]): number | null {
  let [squares, dof] = [0, 0];
  for (const fit of fits) {
    if (fit.c0 === null || !(fit.c0 > 0) || fit.dof < 1) continue;
    squares += fit.rss / fit.c0 ** 2;
    dof += fit.dof;
  }
  return dof > 0 && Number.isFinite(squares) ? Math.sqrt(squares / dof) : null;
}

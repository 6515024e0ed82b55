/**
 * The vocabulary of the numerical engine. Everything is in SI-derived base units: seconds, kelvin,
 * and the base unit of the reading's dimension (mol/L, Pa, or 1 for a ratio).
 */

/** The dimension of a reading; its base unit is mol/L, Pa or 1. */
export type ReadingDimension = 'concentration' | 'pressure' | 'ratio';

/**
 * What the reading follows. `reactant`: C(t). `product`: P(t) = s (C0 − C(t)), s product per
 * reactant. `conversion`: X(t) = 1 − C(t)/C0. `signal`: proportional to C(t).
 */
export type ReadingKind = 'reactant' | 'product' | 'conversion' | 'signal';

export type WellRole = 'sample' | 'blank' | 'support-blank' | 'control' | 'benchmark';

/** A rate law that can be fitted. `order` is the apparent order n, −dC/dt = k Cⁿ. */
export type RateLawName = 'zero' | 'first' | 'second' | 'saturating' | 'order';

/** What the caller asks for: the machine's choice, or one law by force. */
export type LawRequest = 'auto' | 'zero' | 'first' | 'second' | 'saturating' | { order: number };

export type Verdict =
  | 'zero'
  | 'first'
  | 'second'
  | 'saturating'
  | 'other'
  | 'undetermined'
  | 'no-reaction'
  | 'unusable'
  | 'forced';

/** Standard deviation of a reading: σ² = absolute² + (relative · reading)²; base unit, and a share. */
export interface Precision {
  absolute: number;
  relative: number;
}

/** A well's readings as measured, ready for the engine. */
export interface DecaySeries {
  /** Unique within one run of the engine. */
  id: string;
  /** Null for blanks and controls without one. */
  catalyst: string | null;
  role: WellRole;
  /** What shares one temperature error (plate run at one set temperature); null when unknown. */
  block: string | null;
  /** K, above 0; the measured temperature where there is one. */
  temperatureK: number;
  /** s; any order, duplicates allowed; same length as `values`. */
  timesS: readonly number[];
  /** Base unit of `dimension`; null marks an excluded or missing reading. */
  values: readonly (number | null)[];
  dimension: ReadingDimension;
  kind: ReadingKind;
  /** Base unit; only used where readings do not carry it (conversion). */
  initialConcentration: number | null;
  /** mol product per mol reactant, above 0; only used for `product`. */
  productPerReactant: number;
  /** g/L: catalyst mass over liquid volume; null when either is missing. */
  loadingGPerL: number | null;
  /** mol/kg active sites; null when unknown. */
  siteDensityMolPerKg: number | null;
  /** Stoichiometric coefficient of the reactant followed, above 0. */
  nu: number;
  law: LawRequest;
  /** Declared precision of the readings; without it their noise is constant and estimated. */
  precision?: Precision | null;
  /**
   * True where the reading is only known to lie below its value, a limit of quantification; same
   * length as `values`.
   */
  belowLimit?: readonly boolean[] | null;
  /** Fits a level that stays: C∞, or the baseline of a signal. */
  level?: boolean;
}

/** A number with its 95 % interval; null where it cannot be given. */
export interface Estimate {
  value: number;
  se: number | null;
  low: number | null;
  high: number | null;
}

/** What only the saturating law has, at the fit's `originS`. */
export interface SaturatingConstants {
  /** Adsorption constant, reciprocal base unit; null at a limit of the law. */
  K: number | null;
  KSe: number | null;
  /** σ = K C0/(1 + K C0): 0 is first order, 1 zero order. */
  coverage: number;
  coverageSe: number | null;
  /** Of (c0, kRel, coverage), row by row; null at a limit of the law. */
  covariance: number[] | null;
}

/** A level that the curve approaches instead of 0. */
export interface FittedLevel {
  /** C∞, or the baseline of a signal, base unit; null for product, which does not tell it. */
  value: number | null;
  se: number | null;
  /** The curve, in the unit of the readings: amplitude × shape + offset. */
  amplitude: number;
  offset: number;
  /** Of (amplitude, kRel, offset), row by row. */
  covariance: number[] | null;
}

/** One law fitted to one well. All keys are always present; what does not exist is null. */
export interface LawFit {
  /** In the law's own unit (see `rateConstantUnit`). Null where the readings cannot give it. */
  k: number | null;
  kSe: number | null;
  /** r0/C0 = k C0^(n−1) at `originS`, s⁻¹. Null for growth that shows neither C0 nor curvature. */
  kRel: number | null;
  kRelSe: number | null;
  /** At `originS`, base unit. */
  c0: number | null;
  c0Se: number | null;
  /**
   * s on the clock of the readings, where `c0` and `kRel` hold: 0, or the first reading where the
   * curve cannot be continued back to 0.
   */
  originS: number;
  /** Covariance of c0 and kRel, for bands; null where either is not estimated. */
  covariance: number | null;
  rss: number;
  /** Null when rss is 0 or the readings are too few (n < K + 2). */
  aicc: number | null;
  /** Akaike weight among the laws tried. */
  weight: number | null;
  /** sqrt(rss/dof), the reading's base unit; null when dof < 1. */
  residualSd: number | null;
  dof: number;
  /** Null for every law but the saturating one. */
  saturation: SaturatingConstants | null;
  /** Null unless a level that stays, or a baseline, was asked for. */
  level: FittedLevel | null;
}

/** Evidence that the best law still misses the readings. */
export interface LackOfFit {
  /** Two-sided p of the runs test on the residuals' signs (exact or normal), null when too few. */
  runsP: number | null;
  /** True when the misfit is beyond chance at the engine's level. */
  significant: boolean;
}

/** Machine-readable warning; `explanations.ts` holds the sentence for each. */
export type WarningCode =
  | 'unsorted-times'
  | 'too-few-readings'
  | 'too-few-distinct-times'
  | 'too-few-for-order'
  | 'low-conversion'
  | 'laws-equally-good'
  | 'no-simple-order'
  | 'order-uncertain'
  | 'lack-of-fit'
  | 'outlier'
  | 'rising'
  | 'initial-concentration-needed'
  | 'exact-fit'
  | 'loading-unknown'
  | 'loading-mixed'
  | 'mixed-forced-laws'
  | 'one-temperature'
  | 'two-temperatures'
  | 'order-changes-with-temperature'
  | 'arrhenius-curved'
  | 'arrhenius-bends-down'
  | 'arrhenius-bends-up'
  | 'pore-diffusion'
  | 'hot-wells-deactivate'
  | 'one-step-disagrees'
  | 'low-activation-energy'
  | 'negative-activation-energy'
  | 'blank-reacts'
  | 'blank-subtracted'
  | 'not-above-blank'
  | 'rate-below-mass'
  | 'level-by-request'
  | 'extrapolated-temperature'
  | 'extrapolated-concentration'
  | 'few-wells'
  | 'no-reacting-wells'
  | 'reacts-only-together';

/** What is left of a well's figures after the blank, in the same units. */
export interface NetOfBlank {
  k: Estimate | null;
  initialRate: Estimate | null;
}

/** The engine's answer for one well. Serialisable: no NaN, no undefined. */
export interface SeriesAnalysis {
  id: string;
  catalyst: string | null;
  role: WellRole;
  block: string | null;
  temperatureK: number;
  dimension: ReadingDimension;
  kind: ReadingKind;
  /** As given; curves of `product` need it. */
  productPerReactant: number;
  loadingGPerL: number | null;
  law: LawRequest;
  verdict: Verdict;
  /** 0, 1, 2, or a forced order; null otherwise. */
  order: number | null;
  /** Of the asserted or forced law; gross, at the well's own loading. */
  k: Estimate | null;
  kUnit: string | null;
  /** s⁻¹. */
  kRel: Estimate | null;
  /** Adsorption constant of the saturating law, reciprocal base unit. */
  adsorptionConstant: Estimate | null;
  /** Base unit. */
  c0: Estimate | null;
  /** C∞ or baseline, base unit; only where it was asked for. */
  level: Estimate | null;
  /** 1 − C_fit(t_last)/C_fit(t_first), not clamped; null when unusable. */
  conversion: number | null;
  /** Base unit s⁻¹ at the first reading; kept for undetermined wells too. */
  initialRate: Estimate | null;
  /** Null where no blank covers the temperature, and for blanks and controls. */
  net: NetOfBlank | null;
  /** Free order n of −dC/dt = k Cⁿ; null when the readings do not hold it. */
  apparentOrder: Estimate | null;
  fits: Partial<Record<RateLawName, LawFit>>;
  /** The law drawn as the well's curve: the asserted one, else the one with the highest weight. */
  shownLaw: RateLawName | null;
  residualSd: number | null;
  lackOfFit: LackOfFit | null;
  /** Indices into the series as given, whose studentised residual stands out. */
  outliers: number[];
  pointsUsed: number;
  pointsExcluded: number;
  warnings: WarningCode[];
}

/** Reference conditions at which candidates are compared. */
export interface ReferenceConditions {
  /** K. */
  temperatureK: number | null;
  /** Base unit of the readings. */
  concentration: number | null;
  /**
   * Dimension of `concentration`; without it, that of each catalyst. A catalyst of another
   * dimension gets no rate and no time at the reference.
   */
  concentrationDimension?: ReadingDimension | null;
  loadingGPerL: number | null;
  /** 0 < X < 1. */
  targetConversion: number | null;
}

/** One well's point on the Arrhenius plot. */
export interface ArrheniusPoint {
  seriesId: string;
  temperatureK: number;
  /** ln of k (law basis) or of the initial rate (initial-rate basis), at the pooled loading. */
  lnK: number;
  se: number;
  block: string;
}

/** The straight line ln k = lnKc − (Ea/R)(1/T − 1/Tc) with its covariance, for bands. */
export interface ArrheniusLine {
  /** K, weighted harmonic mean. */
  centreK: number;
  lnKc: number;
  lnKcSe: number | null;
  /** J/mol. */
  activationEnergy: number;
  activationEnergySe: number | null;
  covariance: number | null;
  /** Degrees of freedom of the t quantile. */
  dof: number;
  /** Between-block standard deviation of ln k (random effect). */
  tau: number;
  points: ArrheniusPoint[];
}

/** How strongly a saturating catalyst holds the reactant. */
export interface Adsorption {
  /** Adsorption constant at `temperatureK`, reciprocal base unit. */
  K: Estimate;
  temperatureK: number;
  /** Apparent ΔH_ads, J/mol, from ln K = ln K_c − (ΔH_ads/R)(1/T − 1/T_c). */
  enthalpy: Estimate | null;
}

/** All readings of a catalyst fitted at once, ln k on a straight line against 1/T. */
export interface OneStep {
  /** J/mol; the interval allows for the scatter of wells and blocks. */
  activationEnergy: Estimate;
  /** J/mol: standard error from the noise of the readings alone. */
  readingSe: number | null;
  /** ln of k (of kRel where k is not known) at `centreK`, at the pooled loading. */
  lnKc: number;
  lnKcSe: number | null;
  /** K. */
  centreK: number;
  /** J/mol; only of the saturating law. */
  adsorptionEnthalpy: Estimate | null;
  /** ln of K at `centreK`; only of the saturating law. */
  lnAdsorptionConstant: number | null;
  wells: number;
  readings: number;
  /** This energy or that of the single wells lies outside the other's interval. */
  disagreesWithTwoStep: boolean;
}

/** Apparent activation parameters of a first-order constant per site. */
export interface ActivationParameters {
  /** ΔH‡, J/mol. */
  enthalpy: Estimate;
  /** ΔS‡, J mol⁻¹ K⁻¹, standard state 1 mol/L. */
  entropy: Estimate;
  /** K, where both hold. */
  temperatureK: number;
}

/** The engine's answer for one catalyst over all its wells. */
export interface CatalystAnalysis {
  catalyst: string;
  dimension: ReadingDimension;
  verdict: Verdict;
  order: number | null;
  basis: 'law' | 'initial-rate';
  /** J/mol. */
  activationEnergy: Estimate | null;
  /** J/mol, of initial rates; only with basis `initial-rate`. */
  initialRateActivationEnergy: Estimate | null;
  /** ln of A in the unit of k. */
  lnA: Estimate | null;
  kUnit: string | null;
  kRef: Estimate | null;
  /** K at which kRef holds. */
  kRefTemperatureK: number | null;
  /** Base unit s⁻¹; a bracket (value null-free midpoint) when undetermined. */
  rateRef: Estimate | null;
  /** mol kg⁻¹ s⁻¹ (concentration only): rateRef over the loading. */
  rateRefPerMass: Estimate | null;
  /** s⁻¹: turnover frequency, where the site density is known. */
  turnoverFrequency: Estimate | null;
  /** s. */
  timeToTarget: Estimate | null;
  /** Null unless the saturating law holds and K is known. */
  adsorption: Adsorption | null;
  /** Null unless first order, with known loading and site density. */
  eyring: ActivationParameters | null;
  /** True when rateRef and timeToTarget are brackets between orders 0 and 2. */
  bracket: boolean;
  /** m of rate ∝ loadingᵐ, where a screen varied it; 1 in the kinetic regime. */
  massOrder: Estimate | null;
  /** g/L that k was brought to; null when per well. */
  loadingGPerL: number | null;
  arrhenius: ArrheniusLine | null;
  /** Largest conversion reached by its wells. */
  conversion: number | null;
  /** Pooled over wells, as a share of each well's C0 span; dimensionless. */
  relativeResidualSd: number | null;
  /** Wells of this catalyst with significant lack of fit under its law. */
  wellsWithLackOfFit: number;
  temperatures: number;
  wells: number;
  seriesIds: string[];
  /** Evidence over all its wells: Akaike weights of the laws fitted jointly. */
  weights: Partial<Record<RateLawName, number>>;
  warnings: WarningCode[];
  /** Null without a law, below 2 temperatures, and where a blank was taken off. */
  oneStep: OneStep | null;
}

/** One run of the engine. */
export interface ScreenAnalysis {
  engine: string;
  series: SeriesAnalysis[];
  catalysts: CatalystAnalysis[];
}

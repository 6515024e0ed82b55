/** What transport criteria are made of; SI units, null where the card does not say. */
export interface ParticleConditions {
  /** mol kg⁻¹ s⁻¹: the observed rate per mass of catalyst, at the highest temperature. */
  rate: number;
  /** Apparent order of the rate in the reactant. */
  order: number;
  /** mol/m³ in the bulk, where the criterion is hardest: see `worstConcentration`. */
  concentration: number;
  /** m. */
  particleRadius: number;
  /** kg/m³, of the particle with its pores. */
  particleDensity: number | null;
  /** m²/s, of the reactant in the pores. */
  poreDiffusivity: number | null;
  /** m²/s, of the reactant in the liquid or gas. */
  bulkDiffusivity: number | null;
}

/** A dimensionless criterion and the value below which transport does not matter. */
export interface TransportCriterion {
  value: number;
  limit: number;
  limited: boolean;
}

/** Limits of the Weisz–Prater number by order (from memory). */
const PORE_LIMITS: readonly (readonly [order: number, limit: number])[] = [
  [0, 6],
  [1, 0.6],
  [2, 0.3],
];
/** Mears' limit for external transport (Mears 1971). */
const FILM_LIMIT = 0.15;

const judged = (value: number, limit: number): TransportCriterion | null =>
  Number.isFinite(value) ? { value, limit, limited: value >= limit } : null;

/**
 * Φ = r ρ_p R²/(D_eff C_s), pore diffusion (Weisz & Prater 1954). Between whole orders the limit is
 * read off a straight line through its logarithm.
 *
 * @returns null where density or diffusivity is not known
 */
export function weiszPrater(given: ParticleConditions): TransportCriterion | null {
  const { rate, concentration, particleRadius, particleDensity, poreDiffusivity } = given;
  if (particleDensity === null || poreDiffusivity === null) return null;
  const value = (rate * particleDensity * particleRadius ** 2) / (poreDiffusivity * concentration);
  return judged(value, poreLimit(given.order));
}

function poreLimit(order: number): number {
  const n = Math.min(Math.max(order, 0), 2);
  const [low, high] =
    n < 1 ? [PORE_LIMITS[0]!, PORE_LIMITS[1]!] : [PORE_LIMITS[1]!, PORE_LIMITS[2]!];
  const share = n - low[0];
  return low[1] ** (1 - share) * high[1] ** share;
}

/**
 * External mass transfer: r ρ R n/(k_c C_b) < 0.15 (Mears 1971), with the particle density, as for a
 * slurry; zero order, which that form calls safe at any rate, by r ρ R/(3 k_c C_b) < 1: the film
 * delivers what reacts. k_c from Sh = 2, what diffusion to a sphere at rest gives: a lower bound.
 *
 * @returns null where density or diffusivity is not known
 */
export function mears(given: ParticleConditions): TransportCriterion | null {
  const { bulkDiffusivity, particleRadius, particleDensity } = given;
  if (bulkDiffusivity === null || particleDensity === null) return null;
  return mearsOf(given, particleDensity, bulkDiffusivity / particleRadius);
}

/** The same with a mass transfer coefficient k_c in m/s and the density that belongs to it. */
export function mearsOf(
  { rate, order, concentration, particleRadius }: ParticleConditions,
  density: number,
  transferCoefficient: number,
): TransportCriterion | null {
  const reach = (rate * density * particleRadius) / (transferCoefficient * concentration);
  return order === 0 ? judged(reach / 3, 1) : judged(reach * Math.abs(order), FILM_LIMIT);
}

/**
 * The concentration at which a criterion is hardest, of those that a run passes through: the lowest
 * for an order below 1, where the rate falls less than the concentration, the first above.
 */
export function worstConcentration(order: number, first: number, last: number): number {
  return order < 1 ? Math.min(first, last) : Math.max(first, last);
}

/** Effectiveness factor of a sphere at first order, φ = R √(k/D_eff) (Thiele 1939). */
export function effectiveness(thiele: number): number {
  if (thiele < 1e-2) return 1 - thiele ** 2 / 15;
  return (3 / thiele ** 2) * (thiele / Math.tanh(thiele) - 1);
}

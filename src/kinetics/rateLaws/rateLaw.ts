import { shapeFillOf, shapeSumsOf, type ShapeFill, type ShapeSums } from '../fitting/shapeSums';
import type { RateLawName, ReadingDimension } from '../types';
import { rateConstantUnit } from './rateConstantUnit';

/** The two numbers that fix a decay curve of a power law. */
export interface PowerLawParameters {
  /** Concentration at t = 0, base unit. */
  c0: number;
  /** Rate constant in the law's own unit. */
  k: number;
}

/**
 * What a law has to say for itself. Everything is written in the relative form
 * C(t) = C0 g(u), u = kRel t, kRel = r0/C0, so that g(0) = 1 and g'(0) = −1.
 */
export interface RelativeForm {
  name: RateLawName;
  /** Apparent order n of −dC/dt = k Cⁿ. */
  order: number;
  /** g(u); for u < 0 the curve continued backwards, as far as `lowestU`. */
  relative(u: number): number;
  /** 1 − g(u) without cancellation at small u. */
  converted(u: number): number;
  /** u at which the conversion reaches X, 0 < X < 1. */
  reach(conversion: number): number;
  /** Below this u the curve does not exist (a pole); −Infinity where it always does. */
  lowestU: number;
  /** The coordinate that is linear in t under this law, for eyes and starting values. */
  straighten(c: number): number;
  /** A decay over all readings, where the law has a quicker way than its relative form. */
  decaySums?: ShapeSums;
  decayFill?: ShapeFill;
}

/** A rate law of the registry: its relative form and what follows from it. */
export interface RateLaw extends RelativeForm {
  /** g'(u), at most 0; the left-hand value where the reactant runs out. */
  slope(u: number): number;
  /** g''(u), from g' = −gⁿ. */
  bend(u: number): number;
  /** The shapes g and 1 − g over all readings, for fits. */
  decaySums: ShapeSums;
  growthSums: ShapeSums;
  decayFill: ShapeFill;
  growthFill: ShapeFill;
  /** The curve as a function of time in s. */
  concentration(parameters: PowerLawParameters): (timeS: number) => number;
  /** −dC/dt at a concentration, base unit s⁻¹. */
  rate(k: number, c: number): number;
  /** kRel = k C0^(n−1), s⁻¹. */
  kRelOf(k: number, c0: number): number;
  /** k = kRel C0^(1−n). */
  kOf(kRel: number, c0: number): number;
  kUnit(dimension: ReadingDimension): string;
  /** Time in s from C0 to conversion X, 0 < X < 1. */
  timeToConversion(conversion: number, parameters: PowerLawParameters): number;
}

const KINK_TOLERANCE = 1e-12;

/**
 * Completes a relative form to a rate law −dC/dt = k Cⁿ.
 *
 * @throws RangeError from `timeToConversion` when the conversion is not inside (0, 1).
 */
export function definePowerLaw(form: RelativeForm): RateLaw {
  const n = form.order;
  // For n < 1 the reactant is used up at u = 1/(1−n); a reading exactly there still carries slope.
  const exhaustedAt = n < 1 ? (1 + KINK_TOLERANCE) / (1 - n) : Infinity;
  const kRelOf = (k: number, c0: number) => k * c0 ** (n - 1);
  const shape = {
    relative: (u: number) => form.relative(u),
    converted: (u: number) => form.converted(u),
    slope(u: number) {
      if (u > exhaustedAt) return 0;
      if (n === 0) return -1;
      const g = form.relative(u);
      if (g <= 0) return 0;
      return n === 1 ? -g : n === 2 ? -g * g : -(g ** n);
    },
    bend(u: number) {
      if (n === 0 || u > exhaustedAt) return 0;
      const g = form.relative(u);
      if (g <= 0) return 0;
      return n === 1 ? g : n === 2 ? 2 * g * g * g : n * g ** (2 * n - 1);
    },
  };
  return {
    ...form,
    ...shape,
    decaySums: form.decaySums ?? shapeSumsOf(shape, false),
    growthSums: shapeSumsOf(shape, true),
    decayFill: form.decayFill ?? shapeFillOf(shape, false),
    growthFill: shapeFillOf(shape, true),
    concentration({ c0, k }) {
      const kRel = kRelOf(k, c0);
      return (timeS) => c0 * form.relative(kRel * timeS);
    },
    rate: (k, c) => (c > 0 ? k * c ** n : 0),
    kRelOf,
    kOf: (kRel, c0) => kRel * c0 ** (1 - n),
    kUnit: (dimension) => rateConstantUnit(n, dimension),
    timeToConversion(conversion, { c0, k }) {
      if (!(conversion > 0 && conversion < 1)) {
        throw new RangeError(`conversion must lie between 0 and 1, got ${conversion}`);
      }
      return form.reach(conversion) / kRelOf(k, c0);
    },
  };
}

import type { RateLaw } from '../../rateLaws/rateLaw';
import { saturatingShape } from '../../rateLaws/saturating';

/** g = C/C0 of one reading and its derivatives. */
export interface RelativePoint {
  g: number;
  /** By the logarithm of each constant. */
  byConstant: number[];
  /** By ln C0. */
  byLnC: number;
}

/** A law as a fit over all temperatures needs it: C/C0 from the logarithms of its constants. */
export interface OneStepLaw {
  /** 1 with k alone, 2 with k and the adsorption constant K. */
  constants: 1 | 2;
  /**
   * C/C0 as a function of time in s; the point returned is filled anew at every call.
   *
   * @param lnConstants ln k, or ln k and ln K, base units
   * @param lnC ln C0, base unit; 0 where constants are relative to C0
   */
  curve(lnConstants: readonly number[], lnC: number): (timeS: number) => RelativePoint;
}

/** −dC/dt = k Cⁿ: u = k C0^(n−1) t, g follows from u alone, and g' = −gⁿ. */
export function oneStepOrder(law: RateLaw): OneStepLaw {
  const n = law.order;
  const e = n - 1;
  const slopeOf = (g: number) => (n === 1 ? -g : n === 2 ? -g * g : -(g ** n));
  return {
    constants: 1,
    curve([lnK], lnC) {
      const kRel = Math.exp(lnK! + e * lnC);
      const point: RelativePoint = { g: 1, byConstant: [0], byLnC: 0 };
      return (timeS) => {
        const u = kRel * timeS;
        const g = law.relative(u);
        // An infinite u has used everything up; a negative power of 0 is no slope.
        const rise = u > 0 && g > 0 ? u * (n === 0 ? -1 : slopeOf(g)) : 0;
        point.g = g;
        point.byConstant[0] = rise;
        point.byLnC = e * rise;
        return point;
      };
    },
  };
}

/**
 * −dC/dt = k K C/(1 + K C): kRel = k K/(1 + K C0), coverage σ = K C0/(1 + K C0). From
 * (1 − σ) ln g + σ g = σ − u follows ∂g/∂σ = g (1 − g + ln g)/((1 − σ) + σ g) at fixed u.
 */
export const oneStepSaturating: OneStepLaw = {
  constants: 2,
  curve([lnK, lnAdsorption], lnC) {
    const load = Math.exp(lnAdsorption! + lnC);
    const free = 1 / (1 + load);
    const coverage = load === Infinity ? 1 : load * free;
    const kRel = Math.exp(lnK! + lnAdsorption!) * free;
    const shape = saturatingShape(Math.min(coverage, 1));
    const point: RelativePoint = { g: 1, byConstant: [0, 0], byLnC: 0 };
    return (timeS) => {
      const u = kRel * timeS;
      const lnG = shape.lnRelative(u);
      const g = Math.exp(lnG);
      const byRate = g === 0 ? 0 : (-u * g) / (free + coverage * g);
      const byCoverage = g === 0 ? 0 : (g * (1 - g + lnG)) / (free + coverage * g);
      const coverageSlope = coverage * free * byCoverage;
      point.g = g;
      point.byConstant[0] = byRate;
      point.byConstant[1] = free * byRate + coverageSlope;
      point.byLnC = -coverage * byRate + coverageSlope;
      return point;
    };
  },
};

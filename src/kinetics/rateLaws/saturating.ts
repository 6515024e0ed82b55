import { lnWrightOmega } from '../statistics/wrightOmega';

/**
 * The saturating law (Langmuir–Hinshelwood, one site): −dC/dt = k K C/(1 + K C).
 *
 * Relative form w = C/C0 with u = kRel t, kRel = r0/C0, and the coverage at the start
 * σ = K C0/(1 + K C0), which stays inside [0, 1] where k and K alone run away:
 * (1 − σ) ln w + σ w = σ − u. σ = 0 is first order, σ = 1 zero order that runs out.
 *
 * Integrated by Schnell & Mendoza, J. Theor. Biol. 1997, 187, 207, through Lambert's W; here through
 * the Wright omega function, so that no exponential overflows. Breaks first where the product
 * competes for the surface.
 */
export interface SaturatingShape {
  /** ln w at u. */
  lnRelative(u: number): number;
  /** w = C/C0 at u; for u < 0 the curve continued backwards. */
  relative(u: number): number;
  /** dw/du, at most 0. */
  slope(u: number): number;
  /** d²w/du². */
  bend(u: number): number;
  /** u at which the conversion reaches X, 0 < X < 1. */
  reach(conversion: number): number;
}

/**
 * @param coverage σ, 0 to 1
 * @throws RangeError outside this range
 */
export function saturatingShape(coverage: number): SaturatingShape {
  if (!(coverage >= 0 && coverage <= 1)) {
    throw new RangeError(`coverage must lie between 0 and 1, got ${coverage}`);
  }
  const free = 1 - coverage;
  const ratio = coverage / free;
  const lnRelative = (u: number): number => {
    if (coverage === 0) return -u;
    if (free === 0) return u < 1 ? Math.log1p(-u) : -Infinity;
    const lnRatio = Math.log(ratio);
    return lnWrightOmega(lnRatio + ratio - u / free) - lnRatio;
  };
  const relative = (u: number) => Math.exp(lnRelative(u));
  return {
    lnRelative,
    relative,
    slope(u) {
      const w = relative(u);
      return w === 0 ? 0 : -w / (free + coverage * w);
    },
    bend(u) {
      const w = relative(u);
      return w === 0 ? 0 : (free * w) / (free + coverage * w) ** 3;
    },
    reach: (conversion) => coverage * conversion - free * Math.log1p(-conversion),
  };
}

/** σ = K C0/(1 + K C0). */
export const coverageOf = (adsorptionConstant: number, c0: number): number => {
  const load = adsorptionConstant * c0;
  return load === Infinity ? 1 : load / (1 + load);
};

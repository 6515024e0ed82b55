import { definePowerLaw } from './rateLaw';

/**
 * First order: −dC/dt = k C, C(t) = C0 e^(−k t), k in s⁻¹.
 *
 * Laidler, Chemical Kinetics (1987). Breaks first where the surface saturates or the catalyst
 * loses activity.
 */
export const firstOrder = definePowerLaw({
  name: 'first',
  order: 1,
  relative: (u) => Math.exp(-u),
  converted: (u) => -Math.expm1(-u),
  reach: (conversion) => -Math.log1p(-conversion),
  lowestU: -Infinity,
  straighten: (c) => Math.log(c),
  decayFill(kRel, t, f, byRate) {
    for (let i = 0; i < t.length; i += 1) {
      const value = Math.exp(-kRel * t[i]!);
      f[i] = value;
      byRate[i] = -t[i]! * value;
    }
  },
  decaySums(kRel, t, y, sums) {
    let p = 0;
    let p1 = 0;
    let p2 = 0;
    let q = 0;
    let q1 = 0;
    let q2 = 0;
    for (let i = 0; i < t.length; i += 1) {
      const ti = t[i]!;
      const f = Math.exp(-kRel * ti);
      const fy = f * y[i]!;
      const ff = f * f;
      p += fy;
      p1 += ti * fy;
      p2 += ti * ti * fy;
      q += ff;
      q1 += ti * ff;
      q2 += ti * ti * ff;
    }
    sums[0] = p;
    sums[1] = -p1;
    sums[2] = p2;
    sums[3] = q;
    sums[4] = -2 * q1;
    sums[5] = 4 * q2;
  },
});

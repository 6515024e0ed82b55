import { definePowerLaw } from './rateLaw';

/**
 * Second order: −dC/dt = k C², C(t) = C0 / (1 + k C0 t), k in L mol⁻¹ s⁻¹.
 *
 * Laidler, Chemical Kinetics (1987). Breaks first at high conversion, where its long tail is
 * easily confused with a level that stays or with a catalyst that loses activity.
 */
export const secondOrder = definePowerLaw({
  name: 'second',
  order: 2,
  relative: (u) => 1 / (1 + u),
  converted: (u) => u / (1 + u),
  reach: (conversion) => conversion / (1 - conversion),
  lowestU: -1,
  straighten: (c) => 1 / c,
  decayFill(kRel, t, f, byRate) {
    for (let i = 0; i < t.length; i += 1) {
      const value = 1 / (1 + kRel * t[i]!);
      f[i] = value;
      byRate[i] = -t[i]! * value * value;
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
      const f = 1 / (1 + kRel * t[i]!);
      const tf = t[i]! * f;
      const fy = f * y[i]!;
      const ff = f * f;
      p += fy;
      p1 += tf * fy;
      p2 += tf * tf * fy;
      q += ff;
      q1 += tf * ff;
      q2 += tf * tf * ff;
    }
    sums[0] = p;
    sums[1] = -p1;
    sums[2] = 2 * p2;
    sums[3] = q;
    sums[4] = -2 * q1;
    sums[5] = 6 * q2;
  },
});

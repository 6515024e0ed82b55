import { definePowerLaw } from './rateLaw';

/**
 * Zero order: −dC/dt = k while C > 0, C(t) = max(C0 − k t, 0), k in mol L⁻¹ s⁻¹.
 *
 * The saturated surface, but also a supply-limited reaction; the curve stops when the reactant is
 * used up. Laidler, Chemical Kinetics (1987). Breaks first where adsorption stops being saturated,
 * near the end of the curve.
 */
export const zerothOrder = definePowerLaw({
  name: 'zero',
  order: 0,
  relative: (u) => Math.max(1 - u, 0),
  converted: (u) => Math.min(u, 1),
  reach: (conversion) => conversion,
  lowestU: -Infinity,
  straighten: (c) => c,
  decayFill(kRel, t, f, byRate) {
    // A reading just where the reactant runs out still carries slope.
    const exhausted = 1 + 1e-12;
    for (let i = 0; i < t.length; i += 1) {
      const u = kRel * t[i]!;
      f[i] = u < 1 ? 1 - u : 0;
      byRate[i] = u <= exhausted ? -t[i]! : 0;
    }
  },
});

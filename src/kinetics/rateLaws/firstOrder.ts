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
});

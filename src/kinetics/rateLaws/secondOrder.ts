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
});

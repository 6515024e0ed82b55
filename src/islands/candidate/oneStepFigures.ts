import type { OneStep } from '../../kinetics/types';
import { figureOf } from './figures';

/** One energy as printed: what it is, value and unit, interval. */
export interface OneStepFigure {
  name: string;
  text: string;
  interval: string | null;
}

/** The energies of the fit of all readings at once. */
export function oneStepFigures({
  activationEnergy,
  adsorptionEnthalpy,
  wells,
  readings,
}: OneStep): OneStepFigure[] {
  const energies = [
    [`One-step fit of all ${readings} readings of ${wells} wells`, activationEnergy],
    ['adsorption enthalpy', adsorptionEnthalpy],
  ] as const;
  return energies.flatMap(([name, energy]) => {
    if (energy === null) return [];
    const { text, unit, interval } = figureOf(energy, 'kJ/mol', 1e-3);
    return [{ name, text: `${text} ${unit}`, interval }];
  });
}

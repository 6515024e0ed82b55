import { describe, expect, it } from 'vitest';
import { oneStepFigures } from '@/islands/candidate/oneStepFigures';
import type { OneStep } from '@/kinetics/types';

const oneStep: OneStep = {
  activationEnergy: { value: 52_130, se: 1310, low: 48_900, high: 55_360 },
  readingSe: 500,
  lnKc: -6.9,
  lnKcSe: 0.02,
  centreK: 328,
  adsorptionEnthalpy: null,
  lnAdsorptionConstant: null,
  wells: 8,
  readings: 96,
  disagreesWithTwoStep: false,
};

describe('oneStepFigures', () => {
  it('prints the energy with its error, in kJ/mol', () => {
    expect(oneStepFigures(oneStep)).toEqual([
      {
        name: 'One-step fit of all 96 readings of 8 wells',
        text: '52.1 ± 1.3 kJ/mol',
        interval: '48.9 to 55.4',
      },
    ]);
  });

  it('adds the adsorption enthalpy of a saturating law', () => {
    const adsorptionEnthalpy = { value: -24_000, se: 2000, low: -28_500, high: -19_500 };
    const [, enthalpy] = oneStepFigures({ ...oneStep, adsorptionEnthalpy });
    expect(enthalpy?.text).toBe('−24.0 ± 2.0 kJ/mol');
  });
});

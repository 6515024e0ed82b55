import { describe, expect, it } from 'vitest';
import { GAS_CONSTANT } from '../../../../../src/kinetics';
import {
  oneStepOrder,
  oneStepSaturating,
} from '../../../../../src/kinetics/catalyst/oneStep/oneStepLaw';
import { solveOneStep } from '../../../../../src/kinetics/catalyst/oneStep/solveOneStep';
import type { OneStepWell } from '../../../../../src/kinetics/catalyst/oneStep/wellTerms';
import { MODE } from '../../../../../src/kinetics/fitting/problem';
import { apparentOrder } from '../../../../../src/kinetics/rateLaws/apparentOrder';
import type { ReadingKind } from '../../../../../src/kinetics/types';
import { sharedDigits } from '../../../../fixtures/decaySeries';
import reference from '../../../../reference/oneStepFits.json';

type Catalyst = (typeof reference.catalysts)[number];

function fit(catalyst: Catalyst, shift: number) {
  const { centreK, order, start, wells } = catalyst;
  const reach = Math.max(...wells.map((well) => Math.abs(1 / well.temperatureK - 1 / centreK)));
  const toEnergy = GAS_CONSTANT / reach;
  const mode = MODE[catalyst.kind as ReadingKind];
  const fitted = wells.map((well): OneStepWell => {
    const largest = Math.max(...well.values);
    return {
      ...well,
      mode,
      x: (1 / well.temperatureK - 1 / centreK) / reach,
      lnFactor: Math.log(well.factor),
      perReactant: catalyst.productPerReactant,
      lnC: well.c0 === null ? null : Math.log(well.c0),
      lnAmplitude: mode === 'fraction' ? 0 : Math.log(largest / catalyst.productPerReactant),
    };
  });
  const law = order === null ? oneStepSaturating : oneStepOrder(apparentOrder(order));
  const solution = solveOneStep(
    law,
    fitted,
    start.map((value, i) => (i % 2 === 0 ? value + shift : (-value * 1e4) / toEnergy)),
  );
  return { solution, toEnergy };
}

const rows = reference.catalysts.map((catalyst) => [catalyst.id, catalyst] as const);

describe('one-step fits against SciPy (tests/reference/oneStepFits.json)', () => {
  for (const shift of [0, 0.2]) {
    // The end of a zero order makes hollows of its own: there the start has to be near.
    const near = rows.filter(([, { law }]) => shift === 0 || law !== 'zero');
    it.each(near)(`%s: values and errors, start moved by ${shift}`, (_, catalyst) => {
      const { solution, toEnergy } = fit(catalyst, shift);
      const { expected } = catalyst;
      expect(solution.converged).toBe(true);
      expect(sharedDigits(solution.chi2, expected.chi2)).toBeGreaterThan(9);
      const { shared } = solution;
      expect(sharedDigits(-shared[1]! * toEnergy, expected.activationEnergy)).toBeGreaterThan(6);
      expect(sharedDigits(shared[0]!, expected.lnKc)).toBeGreaterThan(6);
      const dof = solution.readings - solution.parameters;
      expect(dof).toBe(expected.dof);
      const scale = catalyst.variances === 'equal' ? solution.chi2 / dof : 1;
      const se = (i: number) => Math.sqrt(solution.covariance![i]![i]! * scale);
      expect(sharedDigits(se(1) * toEnergy, expected.activationEnergySe)).toBeGreaterThan(6);
      expect(sharedDigits(se(0), expected.lnKcSe)).toBeGreaterThan(6);
      if (expected.adsorptionEnthalpy !== undefined) {
        const { adsorptionEnthalpy, adsorptionEnthalpySe, lnAdsorptionConstant } = expected;
        expect(sharedDigits(-shared[3]! * toEnergy, adsorptionEnthalpy)).toBeGreaterThan(6);
        expect(sharedDigits(se(3) * toEnergy, adsorptionEnthalpySe)).toBeGreaterThan(6);
        expect(sharedDigits(shared[2]!, lnAdsorptionConstant)).toBeGreaterThan(6);
      }
    });
  }
});

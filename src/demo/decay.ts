import type { CatalystTruth } from './types';

const R = 8.31446261815324;

/** Conditions inside one well. */
export interface WellConditions {
  /** K, what the liquid really has. */
  temperatureK: number;
  referenceTemperatureK: number;
  /** Loading over the reference loading. */
  relativeLoading: number;
  /** mol/L. */
  initialConcentration: number;
  /** s⁻¹, first-order reaction without catalyst. */
  blankRate: number;
}

/**
 * Concentrations (mol/L) at the given times (s), by stepping −dC/dt with Runge and Kutta's fourth
 * order (Kutta 1901): no closed form of a rate law is used, so that an analysis can be checked
 * against it.
 */
export function simulateDecay(
  truth: CatalystTruth,
  conditions: WellConditions,
  timesS: readonly number[],
): number[] {
  const rate = rateFunction(truth, conditions);
  const largestStep = Math.max(...timesS) / 4000;
  let time = 0;
  let concentration = conditions.initialConcentration;
  return timesS.map((target) => {
    const steps = Math.max(Math.ceil((target - time) / largestStep), 1);
    const step = (target - time) / steps;
    for (let index = 0; index < steps && step > 0; index += 1) {
      const first = rate(concentration, time);
      const second = rate(concentration - (step / 2) * first, time + step / 2);
      const third = rate(concentration - (step / 2) * second, time + step / 2);
      const fourth = rate(concentration - step * third, time + step);
      concentration -= (step / 6) * (first + 2 * second + 2 * third + fourth);
      concentration = Math.max(concentration, 0);
      time += step;
    }
    time = target;
    return concentration;
  });
}

/** −dC/dt as a function of concentration and time. */
function rateFunction(
  truth: CatalystTruth,
  conditions: WellConditions,
): (concentration: number, timeS: number) => number {
  const inverse = 1 / conditions.temperatureK - 1 / conditions.referenceTemperatureK;
  const k =
    truth.k * conditions.relativeLoading * Math.exp((-truth.activationEnergy / R) * inverse);
  const adsorption =
    (truth.adsorptionConstant ?? 0) * Math.exp((-(truth.adsorptionEnthalpy ?? 0) / R) * inverse);
  const decayRate = truth.deactivationRate ?? 0;
  return (concentration, timeS) => {
    const c = Math.max(concentration, 0);
    return conditions.blankRate * c + catalysed(truth.law, k, adsorption, decayRate, c, timeS);
  };
}

function catalysed(
  law: CatalystTruth['law'],
  k: number,
  adsorption: number,
  decayRate: number,
  c: number,
  timeS: number,
): number {
  switch (law) {
    case 'zero':
      return c > 0 ? k : 0;
    case 'first':
      return k * c;
    case 'second':
      return k * c * c;
    case 'saturating':
      return (k * adsorption * c) / (1 + adsorption * c);
    case 'deactivating':
      return k * Math.exp(-decayRate * timeS) * c;
    case 'none':
      return 0;
  }
}

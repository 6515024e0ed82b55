import { BOLTZMANN_CONSTANT, GAS_CONSTANT, PLANCK_CONSTANT } from '../constants';
import { estimate } from '../statistics/estimate';
import type { ActivationParameters, ArrheniusLine } from '../types';

/** ln of kB T/h, s⁻¹. */
const lnFrequency = (temperatureK: number) =>
  Math.log((BOLTZMANN_CONSTANT * temperatureK) / PLANCK_CONSTANT);

/** k in s⁻¹ of −ΔG‡ = TΔS‡ − ΔH‡ (Eyring 1935), J/mol and J mol⁻¹ K⁻¹, transmission 1. */
export function eyringRate(enthalpy: number, entropy: number, temperatureK: number): number {
  return Math.exp(
    lnFrequency(temperatureK) + entropy / GAS_CONSTANT - enthalpy / (GAS_CONSTANT * temperatureK),
  );
}

/** Ea = ΔH‡ + RT, J/mol. */
export const activationEnergyFrom = (enthalpy: number, temperatureK: number) =>
  enthalpy + GAS_CONSTANT * temperatureK;

/**
 * Apparent ΔH‡ and ΔS‡ from an Arrhenius line of first-order constants, at its centre: ΔH‡ = Ea − RT
 * and ΔS‡ = R [ln(k h/kB T) + ΔH‡/RT]. Standard state 1 mol/L of sites.
 *
 * @param line ln k of the wells, s⁻¹, at one loading
 * @param sitesMolPerL active sites at that loading
 * @returns null where the line has no interval
 */
export function activationParameters(
  line: ArrheniusLine,
  sitesMolPerL: number,
): ActivationParameters | null {
  const { centreK, lnKc, lnKcSe, activationEnergy, activationEnergySe, dof } = line;
  if (lnKcSe === null || activationEnergySe === null || !(sitesMolPerL > 0)) return null;
  const enthalpy = activationEnergy - GAS_CONSTANT * centreK;
  const lnPerSite = lnKc - Math.log(sitesMolPerL);
  const entropy = GAS_CONSTANT * (lnPerSite - lnFrequency(centreK)) + enthalpy / centreK;
  // At the centre ln k and Ea are uncorrelated.
  const entropySe = Math.hypot(GAS_CONSTANT * lnKcSe, activationEnergySe / centreK);
  return {
    enthalpy: estimate(enthalpy, activationEnergySe, dof)!,
    entropy: estimate(entropy, entropySe, dof)!,
    temperatureK: centreK,
  };
}

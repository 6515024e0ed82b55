import { GAS_CONSTANT } from '../constants';

/** A catalyst on the compensation plot. */
export interface CompensationPoint {
  catalyst: string;
  /** J/mol. */
  activationEnergy: number;
  /** ln k at the harmonic mean temperature, where errors of Ea and ln k do not go together. */
  lnK: number;
}

/** Harmonic mean of temperatures in K. */
export function harmonicMeanK(temperaturesK: readonly number[]): number {
  return temperaturesK.length / temperaturesK.reduce((sum, t) => sum + 1 / t, 0);
}

/**
 * ln k at the harmonic mean temperature against Ea, where ln A against Ea would show a line from
 * errors alone (Krug, Hunter & Grieger, J. Phys. Chem. 1976, 80, 2335).
 *
 * @param lines ln A and Ea of each catalyst
 * @param temperaturesK all temperatures of the campaign
 */
export function compensationPlot(
  lines: readonly { catalyst: string; lnA: number; activationEnergy: number }[],
  temperaturesK: readonly number[],
): { harmonicMeanK: number; points: CompensationPoint[] } {
  const mean = harmonicMeanK(temperaturesK);
  return {
    harmonicMeanK: mean,
    points: lines.map(({ catalyst, lnA, activationEnergy }) => ({
      catalyst,
      activationEnergy,
      lnK: lnA - activationEnergy / (GAS_CONSTANT * mean),
    })),
  };
}

/** Correlation of ln A and Ea that errors alone give: x̄/√(mean x²), x = 1/T. */
export function errorCorrelation(temperaturesK: readonly number[]): number {
  const n = temperaturesK.length;
  const mean = temperaturesK.reduce((sum, t) => sum + 1 / t, 0) / n;
  const square = temperaturesK.reduce((sum, t) => sum + 1 / t ** 2, 0) / n;
  return mean / Math.sqrt(square);
}

import type { ReadingDimension } from '../types';

const BASE_UNIT: Record<ReadingDimension, string> = {
  concentration: 'mol/L',
  pressure: 'Pa',
  ratio: '1',
};

/** The base unit of a dimension as a string: `mol/L`, `Pa` or `1`. */
export function baseUnit(dimension: ReadingDimension): string {
  return BASE_UNIT[dimension];
}

/** Unit of −dC/dt, for example `mol L^-1 s^-1`. */
export function rateUnit(dimension: ReadingDimension): string {
  return rateConstantUnit(0, dimension);
}

/** Unit of the adsorption constant, for example `L mol^-1`. */
export function reciprocalUnit(dimension: ReadingDimension): string {
  return { concentration: 'L mol^-1', pressure: 'Pa^-1', ratio: '1' }[dimension];
}

/**
 * Unit string of k in −dC/dt = k Cⁿ, for example `L mol^-1 s^-1` or `(mol/L)^(-0.5) s^-1`.
 *
 * @param order apparent order n
 */
export function rateConstantUnit(order: number, dimension: ReadingDimension): string {
  if (order === 1 || dimension === 'ratio') return 's^-1';
  if (order === 0) return dimension === 'concentration' ? 'mol L^-1 s^-1' : 'Pa s^-1';
  if (order === 2) return dimension === 'concentration' ? 'L mol^-1 s^-1' : 'Pa^-1 s^-1';
  // Twelve digits hide the rounding of 1 − n (1 − 0.9 is 0.09999999999999998).
  const exponent = Number((1 - order).toPrecision(12));
  const base = dimension === 'concentration' ? '(mol/L)' : 'Pa';
  return `${base}^(${exponent}) s^-1`;
}

import { describe, expect, it } from 'vitest';
import {
  dimensionOf,
  toBaseReading,
  toGrams,
  toGramsPerLitre,
  toKelvin,
  toLitres,
  toMolPerKg,
  toSeconds,
} from '../../../src/kinetics/units';

describe('units', () => {
  it.each([
    [toKelvin(60, 'degC'), 333.15],
    [toKelvin(333.15, 'K'), 333.15],
    [toSeconds(250, 'ms'), 0.25],
    [toSeconds(7, 's'), 7],
    [toSeconds(1.5, 'min'), 90],
    [toSeconds(2, 'h'), 7200],
    [toSeconds(1, 'd'), 86_400],
    [toGrams(5, 'mg'), 0.005],
    [toGrams(0.002, 'kg'), 2],
    [toLitres(2, 'mL'), 0.002],
    [toLitres(250, 'uL'), 0.00025],
    [toMolPerKg(120, 'umol/g'), 0.12],
    [toMolPerKg(0.12, 'mol/kg'), 0.12],
    [toGramsPerLitre(2.5, 'mg/mL'), 2.5],
    [toBaseReading(10, 'mmol/L'), 0.01],
    [toBaseReading(25, 'umol/L'), 2.5e-5],
    [toBaseReading(1.2, 'kPa'), 1200],
    [toBaseReading(1.5, 'bar'), 150_000],
    [toBaseReading(3, 'mbar'), 300],
    [toBaseReading(45, '%'), 0.45],
  ])('%d is %d in the base unit', (found, expected) => {
    expect(found).toBeCloseTo(expected, 12);
  });

  it('knows the dimension of every reading unit', () => {
    expect(dimensionOf('umol/L')).toBe('concentration');
    expect(dimensionOf('mbar')).toBe('pressure');
    expect(dimensionOf('%')).toBe('ratio');
  });
});

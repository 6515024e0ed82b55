import { describe, expect, it } from 'vitest';
import { formatWithUncertainty, superscript } from '../../../src/kinetics/significantFigures';

describe('significant figures', () => {
  it.each([
    [3.4213e-3, 8e-5, '(3.42 ± 0.08) × 10⁻³'],
    [52.312, 1.18, '52.3 ± 1.2'],
    [52_312, 1180, '(5.23 ± 0.12) × 10⁴'],
    [9.996, 0.01, '9.996 ± 0.010'],
    [-5.5, 0.4, '−5.5 ± 0.4'],
    [1e-9, 2e-8, '(0.1 ± 2.0) × 10⁻⁸'],
    [0.0999, 0.0003, '0.0999 ± 0.0003'],
    [1, 0.0967, '1.00 ± 0.10'],
    [12.3456, null, '12.3'],
    [6.02214e23, null, '6.02 × 10²³'],
    [0, null, '0.00'],
    [2, 0, '2.00'],
  ])('%d with error %d reads %s', (value, se, text) => {
    expect(formatWithUncertainty(value, se).text).toBe(text);
  });

  it('refuses what is no number', () => {
    expect(() => formatWithUncertainty(NaN, 1)).toThrow('value must be finite, got NaN');
  });

  it('raises whole numbers', () => {
    expect(superscript(-12)).toBe('⁻¹²');
  });
});

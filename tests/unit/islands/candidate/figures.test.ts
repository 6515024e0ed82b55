import { describe, expect, it } from 'vitest';
import { bracketFigure, durationFigure, figureOf } from '@/islands/candidate/figures';

const estimate = { value: 1.049e-3, se: 2.1e-5, low: 1.006e-3, high: 1.092e-3 };

describe('a figure', () => {
  it('has the digits that its standard error leaves, and one power of ten', () => {
    expect(figureOf(estimate, 's^-1')).toEqual({
      text: '(1.049 ± 0.021) × 10⁻³',
      unit: 's⁻¹',
      interval: '(1.006 to 1.092) × 10⁻³',
    });
  });

  it('is said in the unit that a person would use', () => {
    expect(durationFigure({ value: 3816, se: 84, low: 3618, high: 4026 })).toMatchObject({
      text: '63.6 ± 1.4',
      unit: 'min',
    });
  });
});

describe('a figure in a bracket', () => {
  it('shows its bounds and no middle that nobody measured', () => {
    const bracket = figureOf({ value: 1.98e-6, se: null, low: 1.53e-6, high: 2.38e-6 }, 's^-1');
    expect(bracketFigure(bracket)).toEqual({
      text: '(1.53 to 2.38) × 10⁻⁶',
      unit: 's⁻¹',
      interval: null,
    });
  });

  it('stays as it is without bounds', () => {
    const alone = figureOf({ value: 2, se: null, low: null, high: null }, 's^-1');
    expect(bracketFigure(alone)).toEqual(alone);
  });
});

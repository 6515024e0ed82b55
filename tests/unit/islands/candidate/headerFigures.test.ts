import { describe, expect, it } from 'vitest';
import { compositionOf, headerFigures } from '@/islands/candidate/headerFigures';
import { candidateView } from '../../../fixtures/candidateView';

const named = (view: ReturnType<typeof candidateView>, name: string) =>
  headerFigures(view).find((figure) => figure.name === name);

describe('the figures of a candidate', () => {
  it('have their unit, their uncertainty and the conditions that they hold at', () => {
    const view = candidateView();
    expect(named(view, 'Rate')).toMatchObject({
      at: '60 °C, 10 mmol/L, 2.5 g/L',
      figure: { text: '(1.050 ± 0.021) × 10⁻⁵', unit: 'mol L⁻¹ s⁻¹' },
      note: null,
    });
    expect(named(view, 'Apparent activation energy')?.figure).toEqual({
      text: '52.3 ± 1.2',
      unit: 'kJ/mol',
      interval: '49.0 to 55.6',
    });
  });

  it('are bounds where the order is open, and say between what', () => {
    const time = named(candidateView({ verdict: 'undetermined' }), 'Time to 90 % conversion');
    expect(time?.figure).toMatchObject({ unit: 'min', interval: null });
    expect(time?.figure?.text).toMatch(/^\d+ to \d+$/);
    expect(time?.note).toBe('a bracket between zero and second order');
  });

  it('say why a number is missing', () => {
    const view = candidateView({ verdict: 'no-reaction' });
    view.result = {
      ...view.result,
      initialRateActivationEnergy: null,
      rateRef: null,
      rateRefPerMass: null,
      turnoverFrequency: null,
      timeToTarget: null,
      bracket: false,
    };
    const notes = headerFigures(view).map(({ figure, note }) => [figure, note]);
    expect(notes).toContainEqual([null, 'no reaction was seen']);
    expect(notes.every(([figure, note]) => figure === null && note !== null)).toBe(true);
    view.catalyst.siteDensityMolPerKg = null;
    expect(named(view, 'Turnover frequency')?.note).toBe('the card has no site density');
  });
});

describe('the composition', () => {
  const card = candidateView().catalyst;
  it.each([
    ['2 % Ru/Al2O3', 'Al2O3', '2 % Ru/Al₂O₃'],
    ['Pd 1.9 %', 'γ-alumina', 'Pd 1.9 % on γ-alumina'],
    [null, 'SiO2', 'SiO₂'],
    [null, null, ''],
  ])('of %s and support %s reads %s', (composition, support, words) => {
    expect(compositionOf({ ...card, composition, support })).toBe(words);
  });
});

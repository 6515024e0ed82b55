import { describe, expect, it } from 'vitest';
import { formulaText } from '@/islands/formula';

describe('a formula in text', () => {
  it.each([
    ['2 % Ru/Al2O3', '2 % Ru/Al₂O₃'],
    ['Co3(PO4)2', 'Co₃(PO₄)₂'],
    ['1 % Pt on CeO2', '1 % Pt on CeO₂'],
  ])('lowers the numbers of %s', (given, written) => {
    expect(formulaText(given)).toBe(written);
  });

  it.each(['P25', 'ZSM-5', 'MB-14', 'lot 24', '5 % Pd/C', 'SBA-15'])('leaves %s alone', (text) => {
    expect(formulaText(text)).toBe(text);
  });
});

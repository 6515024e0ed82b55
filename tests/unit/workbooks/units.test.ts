import { describe, expect, it } from 'vitest';
import { recogniseHeader } from '@/workbooks/headers';
import { decimalEvidence, parseNumberText } from '@/workbooks/parseNumber';
import { findUnit, toBase } from '@/workbooks/units';
import { guessFormat, normalisePosition } from '@/workbooks/wellPosition';

describe('headers and their units', () => {
  it.each([
    ['T / °C', 'temperature', '°C'],
    ['Temperature (K)', 'temperature', 'K'],
    ['temperature [degC]', 'temperature', '°C'],
    ['Temp, °C', 'temperature', '°C'],
    ['temperature_K', 'temperature', 'K'],
    ['T in K', 'temperature', 'K'],
    ['Measured temperature / °C', 'measuredTemperature', '°C'],
    ['m / mg', 'mass', 'mg'],
    ['Catalyst mass (g)', 'mass', 'g'],
    ['mass_mg', 'mass', 'mg'],
    ['V / mL', 'volume', 'mL'],
    ['volume (µL)', 'volume', 'µL'],
    ['volume (μL)', 'volume', 'µL'],
    ['t / min', 'time', 'min'],
    ['T / MIN', 'time', 'min'],
    ['time [s]', 'time', 's'],
    ['Elapsed time (h)', 'time', 'h'],
    ['c / mmol/L', 'reading', 'mmol/L'],
    ['c/(mmol L⁻¹)', 'reading', 'mmol/L'],
    ['c / mmol·L^-1', 'reading', 'mmol/L'],
    ['concentration (mol/L)', 'reading', 'mol/L'],
    ['concentration (mol dm-3)', 'reading', 'mol/L'],
    ['Conc. / mM', 'reading', 'mmol/L'],
    ['c / µM', 'reading', 'µmol/L'],
    ['conversion / %', 'reading', '%'],
    ['% conversion', 'reading', '%'],
    ['p / kPa', 'reading', 'kPa'],
    ['reading (mmol/L)', 'reading', 'mmol/L'],
    ['product / mmol/L', 'reading', 'mmol/L'],
  ])('%s', (text, key, symbol) => {
    const header = recogniseHeader(text);
    expect(header?.key).toBe(key);
    expect(header?.unit?.symbol).toBe(symbol);
  });

  it('leaves unknown words alone', () => {
    for (const text of ['Colour', 'comment', '', 'pH', 'MB-07', 'Room temperature / °C']) {
      expect(recogniseHeader(text)).toBeNull();
    }
  });

  it('never takes mPa for MPa or m for mol/L', () => {
    expect(findUnit('mPa')).toBeNull();
    expect(findUnit('m', ['concentration'])).toBeNull();
  });
});

describe('conversion to base units', () => {
  // Exact by definition of the SI prefixes, °C, the atmosphere (101 325 Pa) and the torr.
  it.each([
    ['°C', 60, 333.15],
    ['K', 300, 300],
    ['min', 2.5, 150],
    ['h', 2, 7200],
    ['mg', 5, 0.005],
    ['µL', 250, 0.00025],
    ['mmol/L', 3, 0.003],
    ['kmol/m3', 3, 3],
    ['%', 30, 0.3],
    ['kPa', 12, 12_000],
    ['bar', 1, 100_000],
    ['atm', 1, 101_325],
    ['torr', 760, 101_325],
  ])('%s', (symbol, written, base) => {
    expect(toBase(written, findUnit(symbol)!)).toBeCloseTo(base, 12);
  });
});

describe('numbers in text', () => {
  it.each([
    ['300', '.', 300],
    [' 300 ', '.', 300],
    ['-0.5', '.', -0.5],
    ['−0.5', '.', -0.5],
    ['1e-3', '.', 0.001],
    ['.5', '.', 0.5],
    ['300,5', ',', 300.5],
    ['1,5E-3', ',', 0.0015],
  ] as const)('%j with the sign %j', (text, sign, value) => {
    expect(parseNumberText(text, sign)).toEqual({ kind: 'number', value });
  });

  it.each([
    ['300,5', '.', 'wrong-decimal-sign'],
    ['300.5', ',', 'wrong-decimal-sign'],
    ['1,234.5', '.', 'thousands'],
    ["1'234", '.', 'thousands'],
    ['1 234', '.', 'thousands'],
    ['1.234.567', ',', 'thousands'],
    ['300 K', '.', 'with-unit'],
    ['5min', '.', 'with-unit'],
    ['2026-12-01', '.', 'date'],
    ['1/2', '.', 'not-a-number'],
    ['0x10', '.', 'with-unit'],
    ['1E999', '.', 'out-of-range'],
    ['12 13', '.', 'not-a-number'],
  ] as const)('refuses %j with the sign %j as %s', (text, sign, kind) => {
    expect(parseNumberText(text, sign).kind).toBe(kind);
  });

  it('knows which numbers say what the decimal sign is', () => {
    const evidence = ['300,5', '0.123', '1.234', '1,234', '12', 'MB-1,5'].map(decimalEvidence);
    expect(evidence).toEqual(['comma', 'point', 'either', 'either', null, null]);
  });
});

describe('well positions', () => {
  it('normalises the ways to write a well', () => {
    expect(['a1', 'A01', 'A 1', ' h12 ', 'P24'].map(normalisePosition)).toEqual([
      'A01',
      'A01',
      'A01',
      'H12',
      'P24',
    ]);
    expect(['A0', 'A25', 'Q1', 'AA1', '1A', '', 'A1.5'].map(normalisePosition)).toEqual(
      Array(7).fill(null),
    );
  });

  it('takes the smallest plate that holds the wells', () => {
    expect(guessFormat(['A01', 'D06'])).toBe(24);
    expect(guessFormat(['F08'])).toBe(48);
    expect(guessFormat(['H12'])).toBe(96);
    expect(guessFormat(['H13'])).toBe(384);
  });
});

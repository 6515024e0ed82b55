import { describe, expect, it } from 'vitest';
import type { CellValue } from '@/workbooks/safeCell';
import { issuesOf, screenOf, summary, withCell, goodRows, xlsxOf } from '../../fixtures/workbooks';

type Case = [
  what: string,
  sheet: 'Wells' | 'Readings',
  cell: string,
  value: CellValue,
  issue: string,
];

const STOPS: Case[] = [
  ['a temperature below absolute zero', 'Wells', 'C2', -300, 'temperature-impossible'],
  ['a temperature beyond any reactor', 'Wells', 'C2', 3000, 'temperature-impossible'],
  ['a missing temperature', 'Wells', 'C2', null, 'temperature-missing'],
  ['a temperature below a limit', 'Wells', 'C2', '<60', 'not-a-number'],
  ['a mass of zero in a sample', 'Wells', 'D2', 0, 'mass-not-positive'],
  ['a negative mass', 'Wells', 'D2', -5, 'mass-not-positive'],
  ['a volume of zero', 'Wells', 'E2', 0, 'volume-not-positive'],
  ['an unknown role', 'Wells', 'F2', 'referee', 'unknown-role'],
  ['a sample without catalyst', 'Wells', 'B2', null, 'well-without-catalyst'],
  ['a well of no plate', 'Wells', 'A2', 'A25', 'unknown-well'],
  ['a row below 384 wells', 'Wells', 'A2', 'Q1', 'unknown-well'],
  ['a half replicate', 'Wells', 'G2', 1.5, 'replicate-not-whole'],
  ['a name of 10,000 letters', 'Wells', 'B2', 'x'.repeat(10_000), 'text-too-long'],
  ['a control character', 'Wells', 'B2', 'MB\u000101', 'control-character'],
  ['a unit beside a number', 'Readings', 'C3', '3 mmol/L', 'unit-in-cell'],
  ['a temperature with its unit', 'Wells', 'C2', '300 K', 'unit-in-cell'],
  ['thousands separators', 'Readings', 'C3', '1,234.5', 'thousands-separator'],
  ['a decimal comma in text', 'Readings', 'C3', '3,5', 'decimal-sign'],
  ['a number beyond any range', 'Readings', 'C3', 1e308, 'out-of-range'],
  ['an overflowing number in text', 'Readings', 'C3', '1E999', 'out-of-range'],
  ['a word among numbers', 'Readings', 'C3', 'fine', 'not-a-number'],
  ['a truth value', 'Readings', 'C3', true, 'not-a-number'],
  ['an error in text', 'Readings', 'C3', '#DIV/0!', 'error-cell'],
  ['a clock time in text', 'Readings', 'B3', '00:05', 'is-date'],
  ['a missing time', 'Readings', 'B3', null, 'time-missing'],
  ['a time before the start', 'Readings', 'B3', -1, 'time-negative'],
  ['the same time twice', 'Readings', 'B3', 0, 'reading-twice'],
  ['a reading far below zero', 'Readings', 'C3', -2, 'negative-reading'],
  ['a totals row', 'Readings', 'A11', 'Total', 'totals-row'],
];

describe('a fault in a cell stops the import and is named at that cell', () => {
  it.each(STOPS)('%s', async (_what, sheet, cell, value, code) => {
    const issues = await issuesOf(withCell(sheet, cell, value));
    expect(issues.map(summary)).toContain(`stop ${code} ${sheet}!${cell}`);
    const issue = issues.find((one) => one.code === code)!;
    expect(issue.message).toMatch(/^[A-Z“].*\.$/su);
    expect(issue.found?.length ?? 0).toBeLessThanOrEqual(60);
  });
});

const CAUTIONS: Case[] = [
  ['298 under °C', 'Wells', 'C2', 298, 'temperature-unit-doubtful'],
  ['a number stored as text', 'Readings', 'C3', '3 ', 'number-as-text'],
  ['a reading below a limit', 'Readings', 'C3', '<0.001', 'censored-reading'],
  ['a reading below the quantification limit', 'Readings', 'C3', 'below LOQ', 'censored-reading'],
  ['n.d.', 'Readings', 'C3', 'n.d.', 'missing-readings'],
  ['NaN', 'Readings', 'C3', 'NaN', 'missing-readings'],
  ['a blank reading', 'Readings', 'C3', null, 'missing-readings'],
  ['a reading just below zero', 'Readings', 'C4', -0.02, 'negative-kept'],
  ['times that go back', 'Readings', 'B3', 20, 'times-backwards'],
  ['a missing mass', 'Wells', 'D2', null, 'mass-missing'],
  ['an unknown column', 'Wells', 'H1', 'Colour', 'extra-columns'],
  ['a blank that names a catalyst', 'Wells', 'B4', 'MB-01', 'blank-with-catalyst'],
];

describe('what can be read all the same is read, with a caution', () => {
  it.each(CAUTIONS)('%s', async (_what, sheet, cell, value, code) => {
    const { cautions } = await screenOf(withCell(sheet, cell, value));
    const expected = code === 'times-backwards' ? 'B4' : cell;
    expect(cautions.map(summary)).toContain(`caution ${code} ${sheet}!${expected}`);
  });

  it('takes a missing, unreadable or censored reading as missing, never as zero', async () => {
    for (const value of [null, 'n.d.', 'inf', '<0.001', 'BDL']) {
      const { wells } = await screenOf(withCell('Readings', 'C3', value));
      expect(wells[0]!.readings.values).toEqual([0.004, null, 0.0022]);
    }
  });
});

describe('faults that take two cells', () => {
  it('names both rows of a well that is described twice', async () => {
    const [issue] = await issuesOf(withCell('Wells', 'A3', 'a01'));
    expect(issue).toMatchObject({ code: 'well-twice', cell: 'A3' });
    expect(issue!.message).toContain('A2 and A3');
  });

  it('names both cells of two readings at one time', async () => {
    const issues = await issuesOf(withCell('Readings', 'B4', 5));
    const twice = issues.find((issue) => issue.code === 'reading-twice')!;
    expect(twice.message).toContain('B3 and B4');
  });

  it('stops for readings of a well that is not described, once for the well', async () => {
    const { wells, readings } = goodRows();
    const issues = await issuesOf(xlsxOf(wells.slice(0, 3), readings));
    expect(issues.map(summary)).toEqual(['stop readings-without-well Readings!C8']);
  });

  it('keeps a well without readings, with a caution', async () => {
    const { wells, readings } = goodRows();
    const screen = await screenOf(xlsxOf(wells, readings.slice(0, 7)));
    expect(screen.cautions.map(summary)).toEqual(['caution well-without-readings Wells!A4']);
    expect(screen.wells[2]!.readings.values).toEqual([]);
  });

  it('reports all faults of a file at once', async () => {
    const { wells, readings } = goodRows();
    wells[1]![2] = -300;
    wells[2]![5] = 'referee';
    readings[4]![2] = 'fine';
    const issues = await issuesOf(xlsxOf(wells, readings));
    expect(issues.map((issue) => issue.cell)).toEqual(['C2', 'F3', 'C5']);
  });

  it('lists 500 faults by name and counts the others', async () => {
    const { wells, readings } = goodRows();
    for (let row = 0; row < 620; row += 1) readings.push(['A1', 100 + row, 'bad']);
    const issues = await issuesOf(xlsxOf(wells, readings));
    expect(issues).toHaveLength(501);
    expect(issues.at(-1)).toMatchObject({ code: 'more-issues', found: '120' });
  });
});

describe('catalyst codes', () => {
  const codesIn = async (second: string) => {
    const { wells, cautions } = await screenOf(withCell('Wells', 'B3', second));
    return {
      codes: wells.map((well) => well.catalyst),
      alike: cautions.some((caution) => caution.code === 'codes-look-alike'),
    };
  };

  it.each(['MB 01', 'MB01', 'mb-01', 'MB-O1', 'MB-0l', 'МB-01', 'MB–01'])(
    'warns that MB-01 and %s look alike, and keeps them apart',
    async (code) => {
      expect(await codesIn(code)).toEqual({ codes: ['MB-01', code, null], alike: true });
    },
  );

  it('does not warn of codes that differ in plain sight', async () => {
    expect(await codesIn('MB-07')).toEqual({ codes: ['MB-01', 'MB-07', null], alike: false });
  });

  it('keeps Co and CO apart without a word', async () => {
    const { wells, readings } = goodRows();
    wells[1]![1] = 'Co';
    wells[2]![1] = 'CO';
    const screen = await screenOf(xlsxOf(wells, readings));
    expect(screen.wells.map((well) => well.catalyst)).toEqual(['Co', 'CO', null]);
    expect(screen.cautions).toEqual([]);
  });

  it('stores hostile text as text', async () => {
    for (const code of [
      '=HYPERLINK("x")',
      '<script>alert(1)</script>',
      '__proto__',
      'constructor',
    ]) {
      const { wells } = await screenOf(withCell('Wells', 'B2', code));
      expect(wells[0]!.catalyst).toBe(code);
    }
    expect(({} as Record<string, unknown>)['catalyst']).toBeUndefined();
  });
});

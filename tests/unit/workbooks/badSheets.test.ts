import * as XLSX from 'xlsx';
import { describe, expect, it } from 'vitest';
import { edited, goodRows, issuesOf, screenOf, summary, xlsxOf } from '../../fixtures/workbooks';
import { writeWorkbook } from '@/workbooks/writeWorkbook';

const date = new Date('2026-01-01T00:00:00Z');

describe('cells as a spreadsheet program stores them', () => {
  it('uses the stored result of a formula, with a caution', async () => {
    const screen = await screenOf(
      edited(({ readings }) => void (readings.C3 = { t: 'n', f: '6/2', v: 3 })),
    );
    expect(screen.wells[0]!.readings.values[1]).toBe(0.003);
    expect(screen.cautions.map(summary)).toContain('caution formula-value Readings!C3');
  });

  it('stops for a date where a number belongs', async () => {
    const issues = await issuesOf(
      edited(({ readings }) => void (readings.B3 = { t: 'n', v: 45000, z: 'yyyy-mm-dd' })),
    );
    expect(issues.map(summary)).toEqual(['stop is-date Readings!B3']);
  });

  it('stops for a code that was turned into a date', async () => {
    const issues = await issuesOf(
      edited(({ wells }) => void (wells.B2 = { t: 'n', v: 45659, z: 'd-mmm' })),
    );
    expect(issues.map(summary)).toContain('stop is-date Wells!B2');
  });

  it('stops for an error value and names it', async () => {
    const [issue] = await issuesOf(
      edited(({ readings }) => void (readings.C3 = { t: 'e', v: 0x07 })),
    );
    expect(issue).toMatchObject({ code: 'error-cell', cell: 'C3', found: '#DIV/0!' });
  });

  it('reads 30 % in a conversion column as 0.3, and stops for it in another', async () => {
    const { wells, readings } = goodRows();
    readings[0]![2] = 'conversion / %';
    const book = XLSX.utils.book_new();
    const sheet = XLSX.utils.aoa_to_sheet(readings.map((row) => [...row]));
    for (let row = 2; row <= readings.length; row += 1)
      sheet[`C${row}`] = { t: 'n', v: 0.3, z: '0 %' };
    XLSX.utils.book_append_sheet(book, XLSX.utils.aoa_to_sheet(wells), 'W');
    XLSX.utils.book_append_sheet(book, sheet, 'R');
    const bytes = new Uint8Array(XLSX.write(book, { type: 'array' }) as ArrayBuffer);
    const screen = await screenOf(bytes);
    expect(screen).toMatchObject({ kind: 'conversion', dimension: 'ratio' });
    expect(screen.wells[0]!.readings.values[0]).toBe(0.3);
    const issues = await issuesOf(
      edited((sheets) => void (sheets.wells.D2 = { t: 'n', v: 0.05, z: '0 %' })),
    );
    expect(issues.map(summary)).toContain('stop is-percent Wells!D2');
  });

  it('stops for merged cells in the data, not for a merged title above it', async () => {
    const merge = { s: { r: 1, c: 1 }, e: { r: 2, c: 1 } };
    const issues = await issuesOf(edited(({ wells }) => void (wells['!merges'] = [merge])));
    expect(issues.map(summary)).toContain('stop merged-cells Wells!B2');

    const { wells, readings } = goodRows();
    const titled = [['Screen of the week', null, null], [], ...wells];
    expect((await screenOf(xlsxOf(titled, readings))).wells).toHaveLength(3);
  });

  it('reads hidden rows and says so', async () => {
    const screen = await screenOf(
      edited(({ readings }) => void (readings['!rows'] = [{}, {}, { hidden: true }])),
    );
    expect(screen.cautions.map(summary)).toEqual(['caution hidden-rows Readings!A3']);
    expect(screen.wells[0]!.readings.values).toHaveLength(3);
  });
});

describe('choosing sheets', () => {
  it('finds the sheets by their headers, in any order and case, with a unit row', async () => {
    const { wells, readings } = goodRows();
    wells[0] = ['WELL', 'catalyst', 'Temperature', 'MASS', 'volume', 'ROLE', 'rep'];
    wells.splice(1, 0, [null, null, '°C', 'mg', 'mL', null, null]);
    const bytes = writeWorkbook(
      [
        { name: 'b', rows: readings.map((row) => [row[2]!, row[0]!, row[1]!]) },
        { name: 'a', rows: wells },
      ],
      date,
    );
    const screen = await screenOf(bytes);
    expect(screen.wells[0]).toMatchObject({
      catalyst: 'MB-01',
      temperatureK: 333.15,
      massG: 0.005,
    });
    expect(screen.wells[0]!.readings).toMatchObject({ column: 'A', rows: [2, 3, 4] });
    expect(screen.cautions.map((caution) => caution.code)).toEqual(['unit-row']);
  });

  it('stops when several sheets fit and names them', async () => {
    const { wells, readings } = goodRows();
    const sheets = [wells, readings, readings].map((rows, at) => ({ name: `S${at}`, rows }));
    const [issue] = await issuesOf(writeWorkbook(sheets, date));
    expect(issue).toMatchObject({ code: 'several-sheets', found: '“S0”, “S1”, “S2”' });
  });

  it('stops for a hidden sheet of readings, and passes over another with a caution', async () => {
    const hide = (index: number) =>
      edited((_sheets, book) => {
        XLSX.utils.book_append_sheet(book, XLSX.utils.aoa_to_sheet([['notes']]), 'Notes');
        book.Workbook!.Sheets!.push({ Hidden: 0 });
        book.Workbook!.Sheets![index]!.Hidden = 1;
      });
    expect((await issuesOf(hide(1))).map(summary)).toEqual(['stop hidden-table Readings!']);
    expect((await screenOf(hide(2))).cautions.map(summary)).toEqual([
      'caution hidden-sheet Notes!',
    ]);
  });

  it('names the headers it looks for when nothing fits', async () => {
    const [issue] = await issuesOf(writeWorkbook([{ name: 'S', rows: [['a', 'b']] }], date));
    expect(issue).toMatchObject({ severity: 'stop', code: 'no-layout' });
    expect(issue!.message).toContain('T / °C');
  });

  it('survives sheets named __proto__ and constructor', async () => {
    for (const name of ['__proto__', 'constructor']) {
      const { wells, readings } = goodRows();
      const sheets = [
        { name: 'Wells', rows: wells },
        { name, rows: readings },
      ];
      const issues = await issuesOf(writeWorkbook(sheets, date));
      expect(
        issues.every((issue) => issue.code === 'sheet-name' || issue.code === 'no-layout'),
      ).toBe(true);
    }
  });
});

describe('headers', () => {
  const withHeaders = (change: (headers: unknown[]) => void, sheet: 'wells' | 'readings') => {
    const rows = goodRows();
    change(rows[sheet][0]!);
    return issuesOf(xlsxOf(rows.wells, rows.readings));
  };

  it('stops for a missing header and says which', async () => {
    const issues = await withHeaders((headers) => (headers[1] = 'x1'), 'wells');
    const missing = issues.find((issue) => issue.code === 'missing-header')!;
    expect(missing).toMatchObject({ severity: 'stop', sheet: 'Wells' });
    expect(missing.message).toContain('catalyst');
  });

  it('stops for a header that comes twice, at the second', async () => {
    const issues = await withHeaders((headers) => (headers[6] = 'Catalyst code'), 'wells');
    expect(issues.map(summary)).toContain('stop duplicate-header Wells!G1');
  });

  it.each([
    ['a missing unit', 'c', 'unit-missing'],
    ['an unknown unit', 'c / furlong', 'unit-unknown'],
    ['a mass concentration', 'c / g/L', 'unit-unknown'],
    ['a total pressure', 'total pressure / kPa', 'total-pressure'],
    ['a nameless reading without unit', 'reading', 'unit-missing'],
  ])('stops for %s', async (_what, header, code) => {
    const issues = await withHeaders((headers) => (headers[2] = header), 'readings');
    expect(issues.map(summary)).toEqual([`stop ${code} Readings!C1`]);
  });

  it('asks about 40 under K', async () => {
    const issues = await withHeaders((headers) => (headers[2] = 'T / K'), 'wells');
    expect(issues.map(summary)).toEqual(['caution temperature-unit-doubtful Wells!C2']);
  });

  it('passes over a header repeated in the middle', async () => {
    const { wells, readings } = goodRows();
    readings.splice(4, 0, [...readings[0]!]);
    const screen = await screenOf(xlsxOf(wells, readings));
    expect(screen.cautions.map(summary)).toEqual(['caution repeated-header Readings!A5']);
  });
});

describe('plates', () => {
  const twelve = Array.from({ length: 12 }, (_, at) => `A${at + 1}`);
  const plateOf = (positions: string[], format?: number) =>
    xlsxOf(
      [
        ['Well', 'Catalyst', 'T / °C', ...(format ? ['plate format'] : [])],
        ...positions.map((well) => [well, 'MB-01', 60, ...(format ? [format] : [])]),
      ],
      [['Well', 't / min', 'c / mmol/L'], ...positions.map((well) => [well, 0, 4])],
    );

  it('stops for I1 on a plate that is otherwise a 96-well plate', async () => {
    const issues = await issuesOf(plateOf([...twelve, 'I1']));
    expect(issues.map(summary)).toContain('stop well-off-plate Wells!A14');
  });

  it('takes the declared format', async () => {
    const screen = await screenOf(plateOf([...twelve, 'I1'], 384));
    expect(screen.plates).toEqual([{ name: 'Plate 1', format: 384 }]);
  });

  it('reads a1, A01 and A 1 as one well', async () => {
    const { wells, readings } = goodRows();
    readings[1]![0] = 'a01';
    readings[2]![0] = 'A 1';
    expect((await screenOf(xlsxOf(wells, readings))).wells[0]!.readings.values).toHaveLength(3);
  });
});

describe('readings as a whole', () => {
  it('asks about a reactant that rises in most wells', async () => {
    const { wells, readings } = goodRows();
    for (const well of ['A1', 'A2', 'B1']) readings.push([well, 15, 9]);
    const screen = await screenOf(xlsxOf(wells, readings));
    expect(screen.cautions.map((caution) => caution.code)).toEqual(['readings-rise']);
  });

  it('asks about a well a thousand times the others', async () => {
    const { wells, readings } = goodRows();
    for (const row of readings.slice(4, 7)) row[2] = (row[2] as number) * 1000;
    const screen = await screenOf(xlsxOf(wells, readings));
    expect(screen.cautions.map(summary)).toEqual(['caution magnitude-differs Readings!C5']);
  });
});

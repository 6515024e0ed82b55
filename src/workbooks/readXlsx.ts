import * as XLSX from 'xlsx';
import type { IssueList } from './issueList';
import type { WorkbookLimits } from './limits';
import { scanZip } from './scanZip';
import { EMPTY_CELL, textCell, type Cell, type Sheet } from './sheet';

/** Reads the cells of an .xlsx (or .xlsm) file; empty with a stop when it cannot be read. */
export async function readXlsx(
  bytes: Uint8Array,
  fileName: string,
  limits: WorkbookLimits,
  issues: IssueList,
): Promise<Sheet[]> {
  const { names, refusal } = await scanZip(bytes, limits);
  const refuse = (code: string, found: string, expected: string, message: string): Sheet[] => {
    issues.stop({ code, sheet: fileName, found, expected, message });
    return [];
  };
  if (refusal) return refuse(refusal.code, refusal.found, refusal.expected, refusal.message);
  if (!names.has('xl/workbook.xml')) {
    const other = otherContainer(names);
    return refuse(
      'not-a-workbook',
      other,
      'an .xlsx or .csv file',
      `This is ${other}. Save it as an Excel workbook (.xlsx) or as .csv and upload that.`,
    );
  }
  noteParts(names, fileName, issues);
  const book = readBook(bytes, limits);
  if (!book) {
    return refuse(
      'broken-workbook',
      'a damaged workbook',
      'a complete .xlsx file',
      'The workbook could not be read. Open it in a spreadsheet program, save it again and upload the new copy.',
    );
  }
  return book.SheetNames.flatMap((name, index) => {
    const worksheet = Object.hasOwn(book.Sheets, name) ? book.Sheets[name] : undefined;
    if (!worksheet) {
      issues.stop({
        code: 'sheet-name',
        sheet: name,
        found: name,
        expected: 'an ordinary sheet name',
        message: `The sheet “${name}” has a name that cannot be read. Rename it and upload the file again.`,
      });
      return [];
    }
    const sheet = asSheet(name, worksheet, (book.Workbook?.Sheets?.[index]?.Hidden ?? 0) !== 0);
    return withinLimits(sheet, limits, issues) ? [sheet] : [];
  });
}

function readBook(bytes: Uint8Array, limits: WorkbookLimits): XLSX.WorkBook | null {
  try {
    return XLSX.read(bytes, {
      type: 'array',
      dense: true,
      nodim: true,
      sheetRows: limits.rows + 1,
      cellFormula: true,
      cellNF: true,
      cellText: false,
      cellHTML: false,
      // Hidden rows are only reported together with styles, unfinished formulas only as stubs.
      cellStyles: true,
      sheetStubs: true,
    });
  } catch {
    return null;
  }
}

function otherContainer(names: Set<string>): string {
  if (names.has('xl/workbook.bin')) return 'a binary workbook (.xlsb)';
  if (names.has('content.xml')) return 'an OpenDocument file (.ods)';
  if (names.has('word/document.xml')) return 'a text document';
  return 'a zip archive without a workbook';
}

function noteParts(names: Set<string>, fileName: string, issues: IssueList): void {
  const parts = [...names];
  if (parts.some((name) => /vbaProject/iu.test(name))) {
    issues.caution({
      code: 'macros-ignored',
      sheet: fileName,
      expected: 'a workbook without macros',
      message: 'The workbook holds macros. They are ignored and never run.',
    });
  }
  if (parts.some((name) => name.startsWith('xl/externalLinks/'))) {
    issues.caution({
      code: 'external-links',
      sheet: fileName,
      expected: 'a workbook that stands alone',
      message:
        'The workbook links to other files. The values stored in it are read; no link is followed.',
    });
  }
}

function withinLimits(sheet: Sheet, limits: WorkbookLimits, issues: IssueList): boolean {
  if (sheet.rowCount <= limits.rows && sheet.columnCount <= limits.columns) return true;
  issues.stop({
    code: 'beyond-limit',
    sheet: sheet.name,
    found:
      sheet.rowCount > limits.rows
        ? `more than ${limits.rows} rows`
        : `${sheet.columnCount} columns`,
    expected: `at most ${limits.rows} rows and ${limits.columns} columns`,
    message: `The sheet “${sheet.name}” is larger than ${limits.rows} rows or ${limits.columns} columns. Split the screen over several files.`,
  });
  return false;
}

type DenseSheet = XLSX.WorkSheet & { '!data'?: (XLSX.CellObject | null | undefined)[][] };

function asSheet(name: string, worksheet: XLSX.WorkSheet, hidden: boolean): Sheet {
  const rows = (worksheet as DenseSheet)['!data'] ?? [];
  let columnCount = 0;
  for (const row of rows) columnCount = Math.max(columnCount, row?.length ?? 0);
  const hiddenRows = (worksheet['!rows'] ?? []).flatMap((row, index) =>
    row?.hidden ? [index] : [],
  );
  return {
    name,
    origin: 'xlsx',
    hidden,
    rowCount: rows.length,
    columnCount,
    hiddenRows,
    merges: (worksheet['!merges'] ?? []).map(({ s, e }) => ({
      firstRow: s.r,
      lastRow: e.r,
      firstColumn: s.c,
      lastColumn: e.c,
    })),
    decimalSign: '.',
    cell: (row, column) => asCell(rows[row]?.[column]),
  };
}

const ERROR_NAMES = new Map([
  [0x00, '#NULL!'],
  [0x07, '#DIV/0!'],
  [0x0f, '#VALUE!'],
  [0x17, '#REF!'],
  [0x1d, '#NAME?'],
  [0x24, '#NUM!'],
  [0x2a, '#N/A'],
]);

const { is_date: isDateFormat } = XLSX.SSF as {
  is_date: (format: string) => boolean;
};

function asCell(cell: XLSX.CellObject | null | undefined): Cell {
  if (!cell) return EMPTY_CELL;
  const formula = cell.f !== undefined;
  const plain = { number: NaN, percent: false, formula };
  switch (cell.t) {
    case 'n': {
      const number = cell.v as number;
      const format = typeof cell.z === 'string' ? cell.z : '';
      if (format !== '' && format !== 'General' && isDateFormat(format)) {
        return { ...plain, kind: 'date', text: `${number} (date)` };
      }
      const percent = /%/u.test(format.replace(/"[^"]*"/gu, ''));
      const text = percent ? `${+(number * 100).toPrecision(12)} %` : String(number);
      return { kind: 'number', number, text, percent, formula };
    }
    case 'd':
      return { ...plain, kind: 'date', text: String(cell.v) };
    case 's':
      return textCell(String(cell.v ?? ''), formula);
    case 'b':
      return { ...plain, kind: 'boolean', text: cell.v ? 'TRUE' : 'FALSE' };
    case 'e':
      return { ...plain, kind: 'error', text: ERROR_NAMES.get(cell.v as number) ?? '#ERROR' };
    default:
      return formula ? { ...plain, kind: 'uncalculated', text: `=${cell.f}` } : EMPTY_CELL;
  }
}

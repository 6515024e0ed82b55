import { checkScreen } from './checkScreen';
import { IssueList } from './issueList';
import { LAYOUTS } from './sheetLayouts/registry';
import type { Layout } from './sheetLayouts/layout';
import { DEFAULT_LIMITS, type WorkbookLimits } from './limits';
import { readCsv } from './readCsv';
import type { ReadingContext, ScreenRows, WellReadings, WellRow } from './reading';
import { readXlsx } from './readXlsx';
import type { Sheet } from './sheet';
import { sniffFormat, type SniffedFormat } from './sniffFormat';
import { findTable, type Table } from './table';
import { Tally } from './tally';
import type { ParsedPlate, ParsedScreen, ParsedWell, ParsedWorkbook } from './types';

/**
 * Reads an uploaded screening workbook (.xlsx, .csv) into wells and readings in SI units. The
 * format is told from the content. All faults are reported at once; with any stop there is no
 * screen. Never throws for what a file holds.
 *
 * @param fileName as the user named it; only for messages and to notice a wrong ending.
 */
export async function parseWorkbook(
  bytes: Uint8Array,
  fileName: string,
  limits: WorkbookLimits = DEFAULT_LIMITS,
): Promise<ParsedWorkbook> {
  const issues = new IssueList(limits.issues);
  const tally = new Tally();
  const context: ReadingContext = { issues, tally, limits };
  const sheets = await readSheets(bytes, fileName, context);
  const rows = issues.stopped ? null : readRows(sheets, fileName, context);
  const plates = rows ? checkScreen(rows, context) : [];
  tally.report(issues);
  if (!rows || issues.stopped) return { ok: false, issues: issues.list() };
  return { ok: true, screen: assemble(rows, plates, issues) };
}

async function readSheets(
  bytes: Uint8Array,
  fileName: string,
  { issues, limits }: ReadingContext,
): Promise<Sheet[]> {
  if (bytes.length > limits.fileBytes) {
    issues.stop({
      code: 'too-large',
      sheet: fileName,
      found: `${bytes.length} bytes`,
      expected: `at most ${limits.fileBytes} bytes`,
      message: `The file is larger than ${Math.round(limits.fileBytes / 1e6)} MB. Split the screen over several files.`,
    });
    return [];
  }
  const format = sniffFormat(bytes);
  if (format === 'zip') return readXlsx(bytes, fileName, limits, issues);
  const namedWorkbook = /\.(?:xlsx|xlsm|xlsb|xls|ods)$/iu.test(fileName);
  if (format === 'text' && !namedWorkbook) return readCsv(bytes, limits, issues);
  const { code, found, message } = REFUSALS[format];
  issues.stop({ code, sheet: fileName, found, expected: 'an .xlsx or .csv file', message });
  return [];
}

const REFUSALS: Record<
  Exclude<SniffedFormat, 'zip'>,
  { code: string; found: string | null; message: string }
> = {
  empty: {
    code: 'empty-file',
    found: null,
    message: 'The file is empty. Save it again and upload the new copy.',
  },
  encrypted: {
    code: 'encrypted',
    found: 'an encrypted file',
    message: 'The workbook is protected by a password. Remove the password and upload it again.',
  },
  'legacy-workbook': {
    code: 'legacy-workbook',
    found: 'an older workbook format (.xls)',
    message: 'Workbooks of the older .xls kind are not read. Save it as .xlsx and upload that.',
  },
  markup: {
    code: 'not-a-workbook',
    found: 'a web page or XML',
    message:
      'The file holds a web page or XML, whatever its name says. Open it, save it as .xlsx or .csv and upload that.',
  },
  binary: {
    code: 'not-a-workbook',
    found: 'something other than a table',
    message:
      'The file is neither a workbook nor text. Save the screen as .xlsx or .csv and upload that.',
  },
  text: {
    code: 'not-a-workbook',
    found: 'plain text',
    message:
      'The file is named like a workbook but holds plain text. Rename it to .csv, or save it as .xlsx again.',
  },
};

function readRows(sheets: Sheet[], fileName: string, context: ReadingContext): ScreenRows | null {
  const found = sheets.flatMap((sheet) => findTable(sheet) ?? []);
  const tables = found.filter((table) => !table.sheet.hidden);
  reportHidden(sheets, found, context);
  if (context.issues.stopped) return null;
  const fitting = LAYOUTS.flatMap((layout) => {
    const recognised = layout.recognise(tables);
    return recognised ? [{ layout, ...recognised }] : [];
  });
  const [only, ...others] = fitting;
  if (!only) {
    reportNoLayout(sheets, tables, fileName, context);
    return null;
  }
  const rivals = [...only.rivals, ...others.flatMap((other) => other.tables)];
  if (rivals.length > 0) {
    reportRivals(only.tables, rivals, context);
    return null;
  }
  reportUnread(sheets, only.tables, context);
  return readWith(only.layout, only.tables, context);
}

function readWith(layout: Layout, tables: Table[], context: ReadingContext): ScreenRows | null {
  const rows = layout.read(tables, context);
  if (rows || context.issues.stopped) return rows;
  throw new Error(`The layout ${layout.name} returned nothing and reported nothing.`);
}

/** Hidden sheets are never read in silence: one that would be read has to be shown first. */
function reportHidden(sheets: Sheet[], found: Table[], { issues }: ReadingContext): void {
  for (const sheet of sheets) {
    if (!sheet.hidden) continue;
    const fits = found.some((table) => table.sheet === sheet && table.columns.has('well'));
    issues.add({
      severity: fits ? 'stop' : 'caution',
      code: fits ? 'hidden-table' : 'hidden-sheet',
      sheet: sheet.name,
      found: 'a hidden sheet',
      expected: 'sheets that are shown',
      message: fits
        ? `The hidden sheet “${sheet.name}” holds wells or readings. Show it if it belongs to the screen, or delete it.`
        : `The hidden sheet “${sheet.name}” is not read.`,
    });
  }
}

function reportNoLayout(
  sheets: Sheet[],
  tables: Table[],
  fileName: string,
  { issues }: ReadingContext,
): void {
  const seen = tables
    .map(
      (table) =>
        `“${table.sheet.name}”: ${[...table.columns.values()].map(({ text }) => text).join(', ')}`,
    )
    .join('; ');
  issues.stop({
    code: 'no-layout',
    sheet: tables[0]?.sheet.name ?? sheets[0]?.name ?? fileName,
    found: seen === '' ? 'no header row' : seen,
    expected:
      'headers well, catalyst, temperature, mass, volume, role, replicate; and well, time, reading',
    message: `No layout fits. One sheet names the wells (headers such as well, catalyst, T / °C, m / mg, V / mL, role, replicate) and another the readings (well, t / min, c / mmol/L); or one table has all of these in every row. ${seen === '' ? 'No header row was found in the first 50 rows.' : `Found in ${seen}.`}`,
  });
}

function reportRivals(tables: Table[], rivals: Table[], { issues }: ReadingContext): void {
  const names = [...new Set([...tables, ...rivals].map((table) => `“${table.sheet.name}”`))];
  issues.stop({
    code: 'several-sheets',
    sheet: rivals[0]!.sheet.name,
    found: names.join(', '),
    expected: 'one sheet of wells and one of readings, or one table with both',
    message: `Several sheets fit: ${names.join(', ')}. Keep the ones that belong to this screen and delete or move the others.`,
  });
}

function reportUnread(sheets: Sheet[], tables: Table[], { issues }: ReadingContext): void {
  for (const sheet of sheets) {
    if (sheet.hidden || sheet.rowCount === 0 || tables.some((table) => table.sheet === sheet))
      continue;
    issues.caution({
      code: 'sheet-not-read',
      sheet: sheet.name,
      expected: 'sheets of wells and readings',
      message: `The sheet “${sheet.name}” is not read; it holds neither wells nor readings.`,
    });
  }
}

function assemble(rows: ScreenRows, plates: ParsedPlate[], issues: IssueList): ParsedScreen {
  const wells = [...rows.wells].map(([key, well]) => asWell(rows, well, rows.readings.get(key)));
  const { dimension, kind, readingUnit, timeUnit } = rows;
  return { dimension, kind, readingUnit, timeUnit, plates, wells, cautions: issues.list() };
}

function asWell(rows: ScreenRows, well: WellRow, readings: WellReadings | undefined): ParsedWell {
  const { role, temperatureK } = well;
  if (temperatureK === null || (role === null && well.catalyst === null)) {
    throw new Error(`Well ${well.position} is not complete and was not reported.`);
  }
  return {
    plate: well.plate,
    position: well.position,
    catalyst: well.catalyst,
    role: role ?? 'sample',
    temperatureK,
    measuredTemperatureK: well.measuredTemperatureK,
    massG: well.massG,
    volumeL: well.volumeL,
    replicate: well.replicate,
    source: well.source,
    readings: {
      timesS: readings?.timesS ?? [],
      values: readings?.values ?? [],
      rows: readings?.rows ?? [],
      sheet: readings?.sheet ?? rows.readingSheet,
      column: readings?.column ?? 'A',
    },
  };
}

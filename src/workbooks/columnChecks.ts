import type { ReadingDimension, ReadingKind } from '../kinetics/types';
import { meaningOf, quantitiesOf, type ColumnKey } from './headers';
import type { ReadingContext } from './reading';
import { cellOf, type Column, type Table } from './table';
import { unitSymbols } from './units';

/** Columns of a part of a layout, and what follows when one is missing. */
export interface WantedColumn {
  key: ColumnKey;
  /** A header that would be recognised, for messages. */
  example: string;
  /** Null when the column has to be there. */
  without: string | null;
}

export const WELL_COLUMNS: readonly WantedColumn[] = [
  { key: 'well', example: 'well', without: null },
  { key: 'catalyst', example: 'catalyst', without: null },
  { key: 'temperature', example: 'T / °C', without: null },
  { key: 'mass', example: 'm / mg', without: 'Rates cannot be brought to one catalyst loading.' },
  { key: 'volume', example: 'V / mL', without: 'Rates cannot be brought to one catalyst loading.' },
  { key: 'role', example: 'role', without: 'Every well with a catalyst is taken as a sample.' },
];

export const READING_COLUMNS: readonly WantedColumn[] = [
  { key: 'well', example: 'well', without: null },
  { key: 'time', example: 't / min', without: null },
  { key: 'reading', example: 'c / mmol/L', without: null },
];

export interface ReadingUnits {
  dimension: ReadingDimension;
  kind: ReadingKind;
  readingUnit: string;
  /** Base unit over the unit as written, to show readings as they stand in the file. */
  readingFactor: number;
  timeUnit: string;
}

/**
 * Checks the headers of a table: missing, repeated and unknown columns, and units. Null when the
 * table cannot be read; `reading` is null for a table without readings.
 */
export function checkColumns(
  table: Table,
  wanted: readonly WantedColumn[],
  context: ReadingContext,
): { reading: ReadingUnits | null } | null {
  const missing = reportMissing(table, wanted, context);
  reportRepeated(table, context);
  reportExtras(table, context);
  reportMerges(table, context);
  reportHiddenRows(table, context);
  const unitsKnown = [...table.columns.values()].map((column) =>
    unitIsKnown(table, column, context),
  );
  if (table.unitRow !== null) reportUnitRow(table, table.unitRow, context);
  const readings = wanted.some(({ key }) => key === 'reading');
  const reading = readings ? readingUnits(table, context) : null;
  const readable = !missing && unitsKnown.every(Boolean) && (!readings || reading !== null);
  return readable ? { reading } : null;
}

function reportMissing(
  table: Table,
  wanted: readonly WantedColumn[],
  context: ReadingContext,
): boolean {
  let stopped = false;
  for (const { key, example, without } of new Map(
    wanted.map((want) => [want.key, want]),
  ).values()) {
    if (table.columns.has(key)) continue;
    const issue = {
      code: 'missing-header',
      sheet: table.sheet.name,
      cell: cellOf(table, [...table.columns.values()][0]!),
      expected: `a header such as “${example}”`,
    };
    if (without === null) {
      stopped = true;
      context.issues.stop({
        ...issue,
        message: `The table with its headers in row ${table.headerRow + 1} has no column for the ${key}. Add one with a header such as “${example}”.`,
      });
    } else {
      context.issues.caution({
        ...issue,
        message: `There is no column for the ${key}. ${without} Add one with a header such as “${example}” if it is known.`,
      });
    }
  }
  return stopped;
}

function reportRepeated(table: Table, context: ReadingContext): void {
  for (const column of table.repeated) {
    const first = table.columns.get(column.key)!;
    context.issues.stop({
      code: 'duplicate-header',
      sheet: table.sheet.name,
      cell: cellOf(table, column),
      found: column.text,
      expected: `one column for the ${column.key}`,
      message: `“${first.text}” in ${cellOf(table, first)} and “${column.text}” in ${cellOf(table, column)} name the same column. Rename or delete one of them.`,
    });
  }
}

function reportExtras(table: Table, context: ReadingContext): void {
  if (table.extras.length === 0) return;
  const names = table.extras.map(({ text }) => `“${text}”`).join(', ');
  context.issues.caution({
    code: 'extra-columns',
    sheet: table.sheet.name,
    cell: cellOf(table, { index: table.extras[0]!.index } as Column),
    found: names,
    expected: 'columns that are known',
    message: `Not read: ${names}. The original file is kept, with these columns.`,
  });
}

function reportMerges(table: Table, context: ReadingContext): void {
  const indices = [...table.columns.values()].map((column) => column.index);
  for (const merge of table.sheet.merges) {
    const inTable =
      merge.lastRow >= table.headerRow &&
      indices.some((index) => index >= merge.firstColumn && index <= merge.lastColumn);
    if (!inTable) continue;
    const column = { index: merge.firstColumn } as Column;
    context.issues.stop({
      code: 'merged-cells',
      sheet: table.sheet.name,
      cell: cellOf(table, column, merge.firstRow),
      expected: 'one value in every cell',
      message: `The cells from ${cellOf(table, column, merge.firstRow)} to ${cellOf(table, { index: merge.lastColumn } as Column, merge.lastRow)} are merged. Unmerge them and write the value in every row.`,
    });
  }
}

function reportHiddenRows(table: Table, context: ReadingContext): void {
  const rows = table.sheet.hiddenRows.filter((row) => row >= table.firstRow);
  if (rows.length === 0) return;
  const column = [...table.columns.values()][0]!;
  const few = rows.slice(0, 5).map((row) => row + 1);
  context.issues.caution({
    code: 'hidden-rows',
    sheet: table.sheet.name,
    cell: cellOf(table, column, rows[0]),
    found: `${rows.length} hidden`,
    expected: 'no hidden rows',
    message: `${rows.length} hidden row${rows.length === 1 ? ' is' : 's are'} read like the others (row ${few.join(', ')}${rows.length > few.length ? ' and more' : ''}). Delete them if they should not count.`,
  });
}

function reportUnitRow(table: Table, unitRow: number, context: ReadingContext): void {
  context.issues.caution({
    code: 'unit-row',
    sheet: table.sheet.name,
    cell: cellOf(table, [...table.columns.values()][0]!, unitRow),
    expected: 'units in the headers, or in a row of their own below them',
    message: `Row ${unitRow + 1} is read as the units of the headers above it.`,
  });
}

function unitIsKnown(table: Table, column: Column, context: ReadingContext): boolean {
  const quantities = quantitiesOf(column.key, column.readingName);
  const unitless = column.readingName === 'signal' || column.readingName === 'total-pressure';
  if (quantities.length === 0 || column.unit !== null || unitless) return true;
  if (column.readingName === 'conversion' && allPercent(table, column)) return true;
  const symbols = quantities.map(unitSymbols).join(', ');
  context.issues.stop({
    code: column.unitText === null ? 'unit-missing' : 'unit-unknown',
    sheet: table.sheet.name,
    cell: cellOf(table, column),
    found: column.text,
    expected: `a unit in the header: ${symbols}`,
    message:
      column.unitText === null
        ? `The header “${column.text}” names no unit. Write it as “${column.text} / ${symbols.split(',')[0]}”, with the unit that was used.`
        : `“${column.unitText}” is no known unit for “${column.text}”. Use one of ${symbols}.`,
  });
  return false;
}

/** True when every number of the column is formatted as a percentage, which is a unit too. */
function allPercent(table: Table, column: Column): boolean {
  let numbers = 0;
  for (let row = table.firstRow; row < table.sheet.rowCount; row += 1) {
    const cell = table.sheet.cell(row, column.index);
    if (cell.kind !== 'number') continue;
    if (!cell.percent) return false;
    numbers += 1;
  }
  return numbers > 0;
}

function readingUnits(table: Table, context: ReadingContext): ReadingUnits | null {
  const column = table.columns.get('reading');
  const time = table.columns.get('time');
  if (!column || !time) return null;
  const meaning = column.readingName && meaningOf(column.readingName, column.unit);
  if (meaning) {
    const readingUnit = column.unitText ?? (meaning.kind === 'conversion' ? '%' : 'signal');
    return {
      ...meaning,
      readingUnit: column.unit?.symbol ?? readingUnit,
      readingFactor: column.unit?.factor ?? 1,
      timeUnit: time.unit?.symbol ?? '',
    };
  }
  if (column.readingName === 'total-pressure') {
    context.issues.stop({
      code: 'total-pressure',
      sheet: table.sheet.name,
      cell: cellOf(table, column),
      found: column.text,
      expected: 'the partial pressure of the reactant',
      message:
        'A total pressure says nothing about the reactant without the change in moles. Enter the partial pressure of the reactant, under a header such as “p / kPa”.',
    });
  }
  return null;
}

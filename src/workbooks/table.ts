import { a1 } from './a1';
import { recogniseHeader, quantitiesOf, type ColumnKey, type Header } from './headers';
import { isBlankRow, type Sheet } from './sheet';
import { findUnit } from './units';

export interface Column extends Header {
  /** 0-based. */
  index: number;
}

/** A table found in a sheet by its header row. */
export interface Table {
  sheet: Sheet;
  /** 0-based. */
  headerRow: number;
  /** 0-based row of the first data row. */
  firstRow: number;
  /** Row that carries the units under the headers; null when the headers carry them. */
  unitRow: number | null;
  columns: Map<ColumnKey, Column>;
  /** Headers that repeat a column already seen. */
  repeated: Column[];
  /** Headers that are not known. */
  extras: { index: number; text: string }[];
}

const HEADER_SEARCH_ROWS = 50;

/** Finds the row that names most columns; null when no row names at least two. */
export function findTable(sheet: Sheet): Table | null {
  let best: Table | null = null;
  const lastRow = Math.min(sheet.rowCount, HEADER_SEARCH_ROWS);
  for (let row = 0; row < lastRow; row += 1) {
    const table = tableAt(sheet, row);
    if (table.columns.size > (best?.columns.size ?? 1)) best = table;
  }
  return best && withUnitRow(best);
}

function tableAt(sheet: Sheet, headerRow: number): Table {
  const columns = new Map<ColumnKey, Column>();
  const repeated: Column[] = [];
  const extras: Table['extras'] = [];
  for (let index = 0; index < sheet.columnCount; index += 1) {
    const cell = sheet.cell(headerRow, index);
    if (cell.kind !== 'text') continue;
    const header = recogniseHeader(cell.text);
    if (!header) extras.push({ index, text: cell.text.trim() });
    else if (columns.has(header.key)) repeated.push({ ...header, index });
    else columns.set(header.key, { ...header, index });
  }
  return { sheet, headerRow, firstRow: headerRow + 1, unitRow: null, columns, repeated, extras };
}

/** Takes units from the row below the headers where that row holds nothing else. */
function withUnitRow(table: Table): Table {
  const row = table.firstRow;
  if (row >= table.sheet.rowCount || isBlankRow(table.sheet, row)) return table;
  const columns = new Map<ColumnKey, Column>();
  let units = 0;
  for (const [key, column] of table.columns) {
    const cell = table.sheet.cell(row, column.index);
    columns.set(key, column);
    if (cell.kind === 'empty') continue;
    const unitText = cell.text.trim().replace(/^[([]|[)\]]$/gu, '');
    const unit = findUnit(unitText, quantitiesOf(key, column.readingName));
    if (cell.kind !== 'text' || unit === null) return table;
    units += 1;
    if (column.unitText === null) columns.set(key, { ...column, unitText, unit });
  }
  return units === 0 ? table : { ...table, columns, unitRow: row, firstRow: row + 1 };
}

const LAYOUT_KEYS = ['catalyst', 'temperature', 'mass', 'volume', 'role'] as const;

/** True when the table says what stands in the wells. */
export function describesWells(table: Table): boolean {
  return LAYOUT_KEYS.filter((key) => table.columns.has(key)).length >= 2;
}

/** True when the table holds readings. */
export function holdsReadings(table: Table): boolean {
  return table.columns.has('time') || table.columns.has('reading');
}

/** A1 address of a column's cell in a row; the header row by default. */
export function cellOf(table: Table, column: Column, row = table.headerRow): string {
  return a1(row, column.index);
}

/** True when a data row repeats the header row word for word. */
export function repeatsHeader(table: Table, row: number): boolean {
  for (const column of table.columns.values()) {
    const cell = table.sheet.cell(row, column.index);
    if (cell.kind !== 'text' || cell.text.trim().replace(/\s+/gu, ' ') !== column.text)
      return false;
  }
  return true;
}

import * as XLSX from 'xlsx';
import { storable, type CellValue } from './safeCell';

/** A sheet to write; the first row is the header row. */
export interface SheetToWrite {
  name: string;
  rows: readonly (readonly CellValue[])[];
  /** Column widths in characters. */
  widths?: readonly number[];
}

/**
 * Writes sheets as .xlsx. Every cell is a typed value, never a formula; the same sheets and date
 * give the same bytes.
 *
 * @param writtenOn kept in the document properties.
 */
export function writeWorkbook(sheets: readonly SheetToWrite[], writtenOn: Date): Uint8Array {
  const book = XLSX.utils.book_new();
  book.Props = { CreatedDate: writtenOn, ModifiedDate: writtenOn };
  for (const { name, rows, widths } of sheets) {
    XLSX.utils.book_append_sheet(book, asWorksheet(rows, widths), name);
  }
  const bytes = XLSX.write(book, {
    type: 'array',
    bookType: 'xlsx',
    compression: true,
  }) as ArrayBuffer;
  return new Uint8Array(bytes);
}

function asWorksheet(
  rows: SheetToWrite['rows'],
  widths: readonly number[] | undefined,
): XLSX.WorkSheet {
  const cells = rows.map((row) => row.map(asCell));
  const sheet = XLSX.utils.aoa_to_sheet(cells, { dense: true });
  if (widths) sheet['!cols'] = widths.map((wch) => ({ wch }));
  return sheet;
}

function asCell(raw: CellValue): XLSX.CellObject | null {
  const value = storable(raw);
  switch (typeof value) {
    case 'string':
      return { t: 's', v: value };
    case 'number':
      return { t: 'n', v: value };
    case 'boolean':
      return { t: 'b', v: value };
    default:
      return null;
  }
}

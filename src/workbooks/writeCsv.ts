import { guardedText, storable, type CellValue } from './safeCell';

/** Writes rows as csv: commas, text in quotation marks, decimal points, CRLF, no formulas. */
export function writeCsv(rows: readonly (readonly CellValue[])[]): string {
  return rows.map((row) => `${row.map(field).join(',')}\r\n`).join('');
}

function field(raw: CellValue): string {
  const value = storable(raw);
  if (value === null) return '';
  return typeof value === 'string'
    ? `"${guardedText(value).replaceAll('"', '""')}"`
    : String(value);
}

import type { CandidateWell } from '../../contracts/candidate';

/** Rows as ranges of cells in one column: `D2:D18`, or `D2:D9, D11:D18` around a gap. */
export function cellRanges(column: string, rows: readonly number[]): string {
  const sorted = [...new Set(rows)].sort((a, b) => a - b);
  const ranges: [number, number][] = [];
  for (const row of sorted) {
    const last = ranges.at(-1);
    if (last && row === last[1] + 1) last[1] = row;
    else ranges.push([row, row]);
  }
  return ranges
    .map(([from, to]) => (from === to ? `${column}${from}` : `${column}${from}:${column}${to}`))
    .join(', ');
}

/** Where a well's readings stand in the uploaded file, as one sentence without its full stop. */
export function sourceSentence({ sheet, column, rows }: CandidateWell['source'], fileName: string) {
  if (rows.length === 0) return `Readings of ${fileName}`;
  return `Readings from sheet ${sheet}, cells ${cellRanges(column, rows)} of ${fileName}`;
}

/** The cell of one reading. */
export function cellOf({ sheet, column, rows }: CandidateWell['source'], index: number): string {
  const row = rows[index];
  return row === undefined ? sheet : `${sheet}, ${column}${row}`;
}

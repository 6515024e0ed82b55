import { checkColumns, READING_COLUMNS, WELL_COLUMNS } from '../columnChecks';
import { readReadings } from '../readingRows';
import { wellKey, type ReadingContext, type ScreenRows, type WellRow } from '../reading';
import { parseNumberText } from '../parseNumber';
import { cellOf, describesWells, holdsReadings, type Column, type Table } from '../table';
import { readWellRow } from '../wellRows';
import type { Layout } from './layout';

/** One table with a row for each reading, which repeats what stands in the well. */
export const tidyTable: Layout = {
  name: 'tidy-table',
  recognise(tables) {
    const fitting = tables.filter((table) => describesWells(table) && holdsReadings(table));
    const [first, ...rivals] = fitting;
    return first ? { tables: [first], rivals } : null;
  },
  read([table], context) {
    if (!table) return null;
    const found = checkColumns(table, [...WELL_COLUMNS, ...READING_COLUMNS], context);
    if (!found?.reading) return null;
    const wells = new Map<string, WellRow>();
    const firstRows = new Map<string, number>();
    const described = DESCRIBING.flatMap((key) => table.columns.get(key) ?? []);
    const readings = readReadings(table, found.reading, context, {
      onlyPlate: null,
      onRow(row, place) {
        const key = wellKey(place.plate, place.position);
        const firstRow = firstRows.get(key);
        if (firstRow !== undefined) {
          stopDisagreement(table, described, firstRow, row, place, context);
          return;
        }
        firstRows.set(key, row);
        wells.set(key, readWellRow(table, row, place, context));
      },
    });
    const { name } = table.sheet;
    return {
      ...found.reading,
      wells,
      readings,
      wellSheet: name,
      readingSheet: name,
    } satisfies ScreenRows;
  },
};

const DESCRIBING = [
  'catalyst',
  'temperature',
  'measuredTemperature',
  'mass',
  'volume',
  'role',
  'replicate',
  'plateFormat',
] as const;

function stopDisagreement(
  table: Table,
  columns: readonly Column[],
  firstRow: number,
  row: number,
  place: { plate: string; position: string },
  context: ReadingContext,
): void {
  for (const column of columns) {
    const first = content(table, column, firstRow);
    const here = content(table, column, row);
    if (first === here) continue;
    const at = cellOf(table, column, row);
    const firstAt = cellOf(table, column, firstRow);
    context.issues.stop({
      code: 'well-disagrees',
      sheet: table.sheet.name,
      cell: at,
      found: here === '' ? null : here,
      expected: first === '' ? 'an empty cell' : first,
      message: `Well ${place.position} of ${place.plate} has “${first}” in ${firstAt} and “${here}” in ${at} under “${column.text}”. Every row of a well repeats the same value.`,
    });
  }
}

/** A cell's content for comparison, so that 5 and 5.0 agree. */
function content(table: Table, column: Column, row: number): string {
  const cell = table.sheet.cell(row, column.index);
  if (cell.kind !== 'text') return cell.text;
  const parsed = parseNumberText(cell.text, table.sheet.decimalSign);
  return parsed.kind === 'number' ? String(parsed.value) : cell.text.trim();
}

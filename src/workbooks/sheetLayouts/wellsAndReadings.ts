import { checkColumns, READING_COLUMNS, WELL_COLUMNS } from '../columnChecks';
import { readReadings } from '../readingRows';
import { wellKey, type ReadingContext, type ScreenRows, type WellRow } from '../reading';
import { isBlankRow } from '../sheet';
import { cellOf, describesWells, holdsReadings, type Table } from '../table';
import { readWellPlace, skipRepeatedHeader } from '../wellPlace';
import { readWellRow } from '../wellRows';
import type { Layout } from './layout';

/** One sheet describes the wells, a row each; another lists the readings, a row each. */
export const wellsAndReadings: Layout = {
  name: 'wells-and-readings',
  recognise(tables) {
    const wells = tables.filter((table) => describesWells(table) && !holdsReadings(table));
    const readings = tables.filter((table) => holdsReadings(table) && !describesWells(table));
    if (wells[0] === undefined || readings[0] === undefined) return null;
    return { tables: [wells[0], readings[0]], rivals: [...wells.slice(1), ...readings.slice(1)] };
  },
  read([wellTable, readingTable], context) {
    if (!wellTable || !readingTable) return null;
    const meaning = checkColumns(readingTable, READING_COLUMNS, context);
    const complete = checkColumns(wellTable, WELL_COLUMNS, context);
    if (!complete || !meaning?.reading) return null;
    const wells = readWells(wellTable, context);
    const readings = readReadings(readingTable, meaning.reading, context, {
      onlyPlate: onlyPlateOf(wellTable, readingTable, wells, context),
    });
    return {
      ...meaning.reading,
      wells,
      readings,
      wellSheet: wellTable.sheet.name,
      readingSheet: readingTable.sheet.name,
    } satisfies ScreenRows;
  },
};

function readWells(table: Table, context: ReadingContext): Map<string, WellRow> {
  const wells = new Map<string, WellRow>();
  for (let row = table.firstRow; row < table.sheet.rowCount; row += 1) {
    if (isBlankRow(table.sheet, row) || skipRepeatedHeader(table, row, context)) continue;
    const place = readWellPlace(table, row, context);
    if (!place) continue;
    const key = wellKey(place.plate, place.position);
    const known = wells.get(key);
    const column = table.columns.get('well')!;
    if (known) {
      context.issues.stop({
        code: 'well-twice',
        sheet: table.sheet.name,
        cell: cellOf(table, column, row),
        found: place.position,
        expected: 'one row for each well',
        message: `Well ${place.position} of ${place.plate} is described twice, in ${known.source.cell} and ${cellOf(table, column, row)}. Delete one row, or correct its well or plate.`,
      });
      continue;
    }
    wells.set(key, readWellRow(table, row, place, context));
  }
  return wells;
}

/** Readings without a plate column belong to the one plate of the wells, if there is one. */
function onlyPlateOf(
  wellTable: Table,
  readingTable: Table,
  wells: Map<string, WellRow>,
  context: ReadingContext,
): string | null {
  if (readingTable.columns.has('plate')) return null;
  const plates = new Set([...wells.values()].map((well) => well.plate));
  if (plates.size > 1) {
    context.issues.stop({
      code: 'plate-column-missing',
      sheet: readingTable.sheet.name,
      expected: 'a plate column beside the readings',
      message: `The sheet “${wellTable.sheet.name}” names ${plates.size} plates, but “${readingTable.sheet.name}” does not say which plate a reading belongs to. Add a column “plate” there.`,
    });
  }
  return [...plates][0] ?? null;
}

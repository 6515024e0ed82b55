import { columnLetters } from './a1';
import { readNumber } from './cellValues';
import type { ReadingUnits } from './columnChecks';
import { wellKey, type ReadingContext, type WellReadings } from './reading';
import { isBlankRow } from './sheet';
import { cellOf, type Table } from './table';
import { counted } from './tally';
import { readWellPlace, skipRepeatedHeader, stopAt } from './wellPlace';

export interface ReadingRowOptions {
  /** The plate of rows that name none. */
  onlyPlate: string | null;
  /** Called for every row with a known well, before its reading is read. */
  onRow?: (row: number, place: { plate: string; position: string }) => void;
}

/** Reads a table with one reading in each row, grouped by well in the order of the file. */
export function readReadings(
  table: Table,
  units: ReadingUnits,
  context: ReadingContext,
  options: ReadingRowOptions,
): Map<string, WellReadings> {
  const readings = new Map<string, WellReadings>();
  const seenTimes = new Map<string, Map<number, number>>();
  for (let row = table.firstRow; row < table.sheet.rowCount; row += 1) {
    if (isBlankRow(table.sheet, row) || skipRepeatedHeader(table, row, context)) continue;
    const place = readWellPlace(table, row, context, options.onlyPlate);
    const timeS = readTime(table, row, context);
    const value = readValue(table, row, units, context);
    if (!place) continue;
    options.onRow?.(row, place);
    if (timeS === null || value === 'fault') continue;
    const key = wellKey(place.plate, place.position);
    const well = readings.get(key) ?? startWell(table, place);
    readings.set(key, well);
    const times = seenTimes.get(key) ?? new Map<number, number>();
    seenTimes.set(key, times);
    const earlier = times.get(timeS);
    if (earlier !== undefined) {
      stopSameTime(table, earlier, row, place, context);
      continue;
    }
    times.set(timeS, row);
    noteBackwards(table, row, timeS, well, context);
    well.timesS.push(timeS);
    well.values.push(value);
    well.rows.push(row + 1);
  }
  return readings;
}

function startWell(table: Table, place: { plate: string; position: string }): WellReadings {
  const column = columnLetters(table.columns.get('reading')!.index);
  return { ...place, sheet: table.sheet.name, column, timesS: [], values: [], rows: [] };
}

function readTime(table: Table, row: number, context: ReadingContext): number | null {
  const column = table.columns.get('time')!;
  const cell = readNumber(table, column, row, context);
  if (cell.state === 'number') {
    if (cell.value >= 0) return cell.value;
    stopAt(table, column, row, context, {
      code: 'time-negative',
      found: String(cell.written),
      expected: 'a time from 0',
      message: `a reading at ${cell.written} ${column.unit?.symbol ?? ''} lies before the start. Count times from the start of the reaction.`,
    });
  } else if (cell.state !== 'fault') {
    stopAt(table, column, row, context, {
      code: 'time-missing',
      expected: `a time in ${column.unit?.symbol ?? 'a known unit'}`,
      message: 'the time of the reading is missing. Enter it, or delete the row.',
    });
  }
  return null;
}

function readValue(
  table: Table,
  row: number,
  units: ReadingUnits,
  context: ReadingContext,
): number | null | 'fault' {
  const column = table.columns.get('reading')!;
  const cell = readNumber(table, column, row, context);
  const at = cellOf(table, column, row);
  const found = table.sheet.cell(row, column.index).text;
  switch (cell.state) {
    case 'fault':
      return 'fault';
    case 'missing':
      context.tally.count('reading', {
        code: 'missing-readings',
        sheet: table.sheet.name,
        cell: at,
        found,
        expected: `a number in ${units.readingUnit}`,
        message: (count) =>
          `${counted(count, 'reading')} missing, from ${at} on. They are left out of the fits and never taken as zero.`,
      });
      return null;
    case 'censored':
      context.issues.caution({
        code: 'censored-reading',
        sheet: table.sheet.name,
        cell: at,
        found,
        expected: `a number in ${units.readingUnit}`,
        message: `${at}: “${found.trim()}” is a reading below a limit. Such readings are not taken yet; it counts as missing.`,
      });
      return null;
    case 'number':
      if (units.kind !== 'conversion' || (cell.value <= 1.05 && cell.value >= -0.05)) {
        return cell.value;
      }
      stopAt(table, column, row, context, {
        code: 'conversion-impossible',
        found,
        expected: 'a conversion between 0 and 100 %',
        message: `a conversion of ${+(100 * cell.value).toPrecision(4)} % is not possible. Correct the cell or the unit in the header.`,
      });
      return 'fault';
  }
}

function stopSameTime(
  table: Table,
  earlier: number,
  row: number,
  place: { plate: string; position: string },
  context: ReadingContext,
): void {
  const time = table.columns.get('time')!;
  context.issues.stop({
    code: 'reading-twice',
    sheet: table.sheet.name,
    cell: cellOf(table, time, row),
    found: table.sheet.cell(row, time.index).text,
    expected: 'one reading for each well and time',
    message: `Well ${place.position} of ${place.plate} has two readings at the same time, in ${cellOf(table, time, earlier)} and ${cellOf(table, time, row)}. Delete one, or give repeats a well or plate of their own.`,
  });
}

function noteBackwards(
  table: Table,
  row: number,
  timeS: number,
  well: WellReadings,
  context: ReadingContext,
): void {
  if (timeS > (well.timesS.at(-1) ?? -1)) return;
  const at = cellOf(table, table.columns.get('time')!, row);
  context.tally.count(wellKey(well.plate, well.position), {
    code: 'times-backwards',
    sheet: table.sheet.name,
    cell: at,
    found: table.sheet.cell(row, table.columns.get('time')!.index).text,
    expected: 'times that increase',
    message: (count) =>
      `The times of well ${well.position} of ${well.plate} go back ${count === 1 ? 'once' : `${count} times`}, first in ${at}. The readings are used in the order of their times.`,
  });
}

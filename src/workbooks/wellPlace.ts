import { readText } from './cellValues';
import type { IssueInput } from './issueList';
import type { ReadingContext } from './reading';
import { cellOf, repeatsHeader, type Column, type Table } from './table';
import { normalisePosition } from './wellPosition';

/** The name given to the plate of a file that names none. */
export const DEFAULT_PLATE = 'Plate 1';

/** Plate and well of a row, or null after reporting why not. */
export function readWellPlace(
  table: Table,
  row: number,
  context: ReadingContext,
  onlyPlate: string | null = null,
): { plate: string; position: string } | null {
  const plate = readPlate(table, row, context, onlyPlate);
  const position = readPosition(table, row, context);
  return plate !== null && position !== null ? { plate, position } : null;
}

function readPlate(
  table: Table,
  row: number,
  context: ReadingContext,
  onlyPlate: string | null,
): string | null {
  const column = table.columns.get('plate');
  if (!column) return onlyPlate ?? DEFAULT_PLATE;
  const cell = readText(table, column, row, context);
  if (cell.state === 'text') return cell.text;
  if (cell.state === 'missing') {
    stopAt(table, column, row, context, {
      code: 'plate-missing',
      expected: 'a plate name in every row',
      message:
        'the plate is missing. Name it in every row, or remove the column when there is one plate.',
    });
  }
  return null;
}

function readPosition(table: Table, row: number, context: ReadingContext): string | null {
  const column = table.columns.get('well');
  if (!column) return null;
  const cell = readText(table, column, row, context);
  const expected = 'a well such as B07';
  if (cell.state === 'missing') {
    stopAt(table, column, row, context, {
      code: 'well-missing',
      expected,
      message: 'the row names no well. Fill it in, or delete the row.',
    });
  }
  if (cell.state !== 'text') return null;
  const position = normalisePosition(cell.text);
  if (position !== null) return position;
  const totals = /^(?:grand )?(?:totals?|sums?|means?|averages?|count|std|sd|min|max)\b/iu.test(
    cell.text,
  );
  stopAt(table, column, row, context, {
    code: totals ? 'totals-row' : 'unknown-well',
    found: cell.text,
    expected,
    message: totals
      ? `row ${row + 1} sums up other rows. Delete it; only wells are read.`
      : `“${cell.text}” is no well of a 24, 48, 96 or 384-well plate. Correct it.`,
  });
  return null;
}

/** Reports a fault at a cell of a table; the sentence begins with the cell. */
export function stopAt(
  table: Table,
  column: Column,
  row: number,
  context: ReadingContext,
  issue: Pick<IssueInput, 'code' | 'found' | 'expected' | 'message'>,
): void {
  const cell = cellOf(table, column, row);
  const message = `${cell}: ${issue.message}`;
  context.issues.stop({ ...issue, sheet: table.sheet.name, cell, message });
}

/** A header repeated word for word inside the data is passed over, with a caution. */
export function skipRepeatedHeader(table: Table, row: number, context: ReadingContext): boolean {
  if (!repeatsHeader(table, row)) return false;
  const cell = cellOf(table, [...table.columns.values()][0]!, row);
  context.issues.caution({
    code: 'repeated-header',
    sheet: table.sheet.name,
    cell,
    expected: 'one header row',
    message: `Row ${row + 1} repeats the header row and is passed over.`,
  });
  return true;
}

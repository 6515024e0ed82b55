import type { WellRole } from '../kinetics/types';
import { readNumber, readText } from './cellValues';
import type { ReadingContext, WellRow } from './reading';
import { cellOf, type Column, type Table } from './table';
import { stopAt } from './wellPlace';

const ROLES = new Map<string, WellRole>([
  ['sample', 'sample'],
  ['blank', 'blank'],
  ['no catalyst', 'blank'],
  ['support blank', 'support-blank'],
  ['bare support', 'support-blank'],
  ['support', 'support-blank'],
  ['control', 'control'],
  ['benchmark', 'benchmark'],
]);
const NO_CATALYST = new Set(['-', '–', '—', 'none', 'blank', 'n/a', 'no catalyst']);

/** Reads what a row says about its well; cells at fault become null after they are reported. */
export function readWellRow(
  table: Table,
  row: number,
  place: { plate: string; position: string },
  context: ReadingContext,
): WellRow {
  const role = readRole(table, row, context);
  const catalyst = readCatalyst(table, row, role.value, context);
  const well = table.columns.get('well')!;
  const catalystColumn = table.columns.get('catalyst') ?? well;
  // A blank role cell beside a catalyst is the ordinary case of a sample.
  const effectiveRole = role.value ?? (role.given || catalyst === null ? null : 'sample');
  return {
    ...place,
    catalyst,
    role: effectiveRole,
    temperatureK: readTemperature(table, 'temperature', row, context),
    measuredTemperatureK: readTemperature(table, 'measuredTemperature', row, context),
    massG: readAmount(table, 'mass', row, effectiveRole, context),
    volumeL: readAmount(table, 'volume', row, effectiveRole, context),
    replicate: readWhole(table, 'replicate', row, context),
    plateFormat: readWhole(table, 'plateFormat', row, context),
    source: { sheet: table.sheet.name, cell: cellOf(table, well, row) },
    catalystCell: cellOf(table, catalystColumn, row),
  };
}

function readRole(
  table: Table,
  row: number,
  context: ReadingContext,
): { given: boolean; value: WellRole | null } {
  const column = table.columns.get('role');
  const cell = column ? readText(table, column, row, context) : null;
  if (!column || cell?.state !== 'text') return { given: cell?.state === 'fault', value: null };
  const role = ROLES.get(cell.text.toLowerCase().replace(/[-_\s]+/gu, ' '));
  if (role) return { given: true, value: role };
  stopAt(table, column, row, context, {
    code: 'unknown-role',
    found: cell.text,
    expected: 'sample, blank, support blank, control or benchmark',
    message: `“${cell.text}” is no role of a well. Use sample, blank, support blank, control or benchmark.`,
  });
  return { given: true, value: null };
}

function readCatalyst(
  table: Table,
  row: number,
  role: WellRole | null,
  context: ReadingContext,
): string | null {
  const column = table.columns.get('catalyst');
  const cell = column ? readText(table, column, row, context) : null;
  const blank = role === 'blank' || role === 'support-blank';
  if (cell?.state === 'text') {
    if (blank && NO_CATALYST.has(cell.text.toLowerCase())) return null;
    if (column && role === 'blank') noteBlankWithCatalyst(table, column, row, cell.text, context);
    return cell.text;
  }
  if (column && cell?.state === 'missing' && !blank && role !== 'control') {
    stopAt(table, column, row, context, {
      code: 'well-without-catalyst',
      expected: 'a catalyst code, or the role blank',
      message: 'the well has no catalyst. Enter its code, or give the well the role blank.',
    });
  }
  return null;
}

function noteBlankWithCatalyst(
  table: Table,
  column: Column,
  row: number,
  found: string,
  context: ReadingContext,
): void {
  const cell = cellOf(table, column, row);
  context.issues.caution({
    code: 'blank-with-catalyst',
    sheet: table.sheet.name,
    cell,
    found,
    expected: 'no catalyst in a blank',
    message: `${cell}: the blank names the catalyst “${found}”. It is kept as a blank; use the role support blank for a bare support.`,
  });
}

function readTemperature(
  table: Table,
  key: 'temperature' | 'measuredTemperature',
  row: number,
  context: ReadingContext,
): number | null {
  const column = table.columns.get(key);
  if (!column?.unit) return null;
  const cell = readNumber(table, column, row, context);
  if (cell.state === 'missing' && key === 'temperature') {
    stopAt(table, column, row, context, {
      code: 'temperature-missing',
      expected: `a temperature in ${column.unit.symbol}`,
      message: 'the temperature is missing. Enter it; no rate constant can be compared without it.',
    });
  }
  if (cell.state !== 'number') return null;
  const shown = `${cell.written} ${column.unit.symbol}`;
  if (cell.value <= 0 || cell.value > 2000) {
    stopAt(table, column, row, context, {
      code: 'temperature-impossible',
      found: shown,
      expected: 'a temperature above absolute zero and below 2000 K',
      message: `${shown} cannot be a temperature of a well. Correct the cell or the unit in the header.`,
    });
    return null;
  }
  const kelvin = column.unit.symbol === 'K';
  const doubtful = kelvin
    ? cell.written >= 15 && cell.written <= 100
    : cell.written >= 273.15 && cell.written <= 400;
  if (doubtful) {
    const at = cellOf(table, column, row);
    context.tally.count(column.text, {
      code: 'temperature-unit-doubtful',
      sheet: table.sheet.name,
      cell: at,
      found: shown,
      expected: `a temperature in ${column.unit.symbol}`,
      message: (count) =>
        `${at}: ${shown} looks like a temperature in ${kelvin ? '°C' : 'K'}${count === 1 ? '' : `, as do ${count - 1} more cells`}. It is read as written; correct the header if the unit is wrong.`,
    });
  }
  return cell.value;
}

function readAmount(
  table: Table,
  key: 'mass' | 'volume',
  row: number,
  role: WellRole | null,
  context: ReadingContext,
): number | null {
  const column = table.columns.get(key);
  if (!column?.unit) return null;
  const cell = readNumber(table, column, row, context);
  const needed = key === 'volume' || (role !== 'blank' && role !== null);
  if (cell.state === 'missing' && needed) {
    context.tally.count(key, {
      code: `${key}-missing`,
      sheet: table.sheet.name,
      cell: cellOf(table, column, row),
      expected: `a ${key} in ${column.unit.symbol}`,
      message: (count) =>
        `${count} well${count === 1 ? ' has' : 's have'} no ${key}: rates cannot be brought to one catalyst loading there.`,
    });
  }
  if (cell.state !== 'number') return null;
  if (cell.written > 0) return cell.value;
  if (cell.written === 0 && key === 'mass' && role === 'blank') return null;
  stopAt(table, column, row, context, {
    code: `${key}-not-positive`,
    found: String(cell.written),
    expected: `a ${key} above 0 ${column.unit.symbol}`,
    message: `a ${key} of ${cell.written} ${column.unit.symbol} is not possible${key === 'mass' ? ' for a well with a solid' : ''}. Correct it, or clear the cell when it is not known.`,
  });
  return null;
}

function readWhole(
  table: Table,
  key: 'replicate' | 'plateFormat',
  row: number,
  context: ReadingContext,
): number | null {
  const column = table.columns.get(key);
  if (!column) return null;
  const cell = readNumber(table, column, row, context);
  if (cell.state !== 'number') return null;
  const allowed =
    key === 'replicate'
      ? Number.isInteger(cell.written) && cell.written > 0 && cell.written < 10_000
      : [24, 48, 96, 384].includes(cell.written);
  if (allowed) return cell.written;
  stopAt(table, column, row, context, {
    code: key === 'replicate' ? 'replicate-not-whole' : 'plate-format-unknown',
    found: String(cell.written),
    expected: key === 'replicate' ? 'a whole number from 1' : '24, 48, 96 or 384',
    message:
      key === 'replicate'
        ? 'replicates are numbered 1, 2, 3. Correct the number.'
        : 'the plate format is the number of wells: 24, 48, 96 or 384. Correct it.',
  });
  return null;
}

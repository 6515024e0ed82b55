import { toBase } from './units';
import { LARGEST_NUMBER, parseNumberText, type NumberText } from './parseNumber';
import type { ReadingContext } from './reading';
import type { Cell } from './sheet';
import { cellOf, type Column, type Table } from './table';
import { counted } from './tally';

export type NumberCell =
  | { state: 'number'; /** As written. */ written: number; /** In the base unit. */ value: number }
  | { state: 'missing' | 'censored' | 'fault' };

const FAULT: NumberCell = { state: 'fault' };

/** Reads one cell of a number column, reporting everything that is wrong with it. */
export function readNumber(
  table: Table,
  column: Column,
  row: number,
  context: ReadingContext,
): NumberCell {
  const cell = table.sheet.cell(row, column.index);
  if (cell.kind === 'empty') return { state: 'missing' };
  const refuse = (code: string, expected: string, message: string): NumberCell => {
    const at = cellOf(table, column, row);
    const place = { sheet: table.sheet.name, cell: at, found: cell.text };
    context.issues.stop({ code, ...place, expected, message: `${at}: ${message}` });
    return FAULT;
  };
  const unitName = column.unit ? ` in ${column.unit.symbol}` : '';
  const expected = `a number${unitName}`;
  switch (cell.kind) {
    case 'date':
      return refuse(
        'is-date',
        expected,
        `“${column.text}” holds a date or clock time. Format the column as a number and enter it again.`,
      );
    case 'error':
      return refuse(
        'error-cell',
        expected,
        `the formula gives the error ${cell.text}. Correct it or clear the cell.`,
      );
    case 'uncalculated':
      return refuse(
        'not-calculated',
        expected,
        'the formula was saved without a result. Open the file, let it calculate and save it again.',
      );
    case 'boolean':
      return refuse(
        'not-a-number',
        expected,
        `${cell.text} stands where “${column.text}” needs a number.`,
      );
    case 'text':
      return fromText(table, column, row, cell, context, refuse);
    case 'number':
      return fromNumber(table, column, row, cell, context, refuse);
  }
}

type Refuse = (code: string, expected: string, message: string) => NumberCell;

function fromNumber(
  table: Table,
  column: Column,
  row: number,
  cell: Cell,
  context: ReadingContext,
  refuse: Refuse,
): NumberCell {
  if (!(Math.abs(cell.number) <= LARGEST_NUMBER)) return refuseRange(column, refuse);
  noteFormula(table, column, row, cell, context);
  if (!cell.percent) return asNumber(column, cell.number);
  const ratio = column.key === 'reading' && column.readingName === 'conversion';
  if (!ratio) {
    return refuse(
      'is-percent',
      'a plain number',
      `“${column.text}” is formatted as a percentage. Enter it as a plain number in the unit of the header.`,
    );
  }
  context.tally.count(column.text, {
    code: 'percent-format',
    sheet: table.sheet.name,
    cell: cellOf(table, column, row),
    found: cell.text,
    expected: 'conversions as percentages or as numbers',
    message: (count) =>
      `${counted(count, 'cell')} of “${column.text}” formatted as percentages: a stored 0.3 is read as 30 %.`,
  });
  return { state: 'number', written: cell.number, value: cell.number };
}

function fromText(
  table: Table,
  column: Column,
  row: number,
  cell: Cell,
  context: ReadingContext,
  refuse: Refuse,
): NumberCell {
  const parsed = parseNumberText(cell.text, table.sheet.decimalSign);
  if (parsed.kind === 'missing') return { state: 'missing' };
  if (parsed.kind === 'censored') {
    if (column.key === 'reading') return { state: 'censored' };
    return refuseText({ kind: 'not-a-number' }, column, table.sheet.decimalSign, refuse);
  }
  if (parsed.kind !== 'number') return refuseText(parsed, column, table.sheet.decimalSign, refuse);
  noteFormula(table, column, row, cell, context);
  if (table.sheet.origin === 'xlsx') {
    context.tally.count(column.text, {
      code: 'number-as-text',
      sheet: table.sheet.name,
      cell: cellOf(table, column, row),
      found: cell.text,
      expected: 'numbers stored as numbers',
      message: (count) =>
        `${counted(count, 'number')} in “${column.text}” stored as text, from ${cellOf(table, column, row)} on; read as written.`,
    });
  }
  return asNumber(column, parsed.value);
}

function asNumber(column: Column, written: number): NumberCell {
  return { state: 'number', written, value: column.unit ? toBase(written, column.unit) : written };
}

function refuseRange(column: Column, refuse: Refuse): NumberCell {
  return refuse(
    'out-of-range',
    `a number below ${LARGEST_NUMBER}`,
    `this number is too large to be a value of “${column.text}”. Correct it.`,
  );
}

function refuseText(
  parsed: Exclude<NumberText, { kind: 'number' | 'missing' | 'censored' }>,
  column: Column,
  decimalSign: '.' | ',',
  refuse: Refuse,
): NumberCell {
  const sign = decimalSign === ',' ? 'comma' : 'point';
  const expected = column.unit ? `a number in ${column.unit.symbol}` : 'a number';
  switch (parsed.kind) {
    case 'out-of-range':
      return refuseRange(column, refuse);
    case 'error':
      return refuse(
        'error-cell',
        expected,
        'the cell holds the error of a formula. Correct it or clear the cell.',
      );
    case 'date':
      return refuse(
        'is-date',
        expected,
        `“${column.text}” holds a date or clock time. Enter it as a number.`,
      );
    case 'thousands':
      return refuse(
        'thousands-separator',
        'digits and one decimal sign',
        'the number is written with thousands separators. Write it without them.',
      );
    case 'wrong-decimal-sign':
      return refuse(
        'decimal-sign',
        `numbers with a decimal ${sign}`,
        `the decimal sign of this file is the ${sign}. Write all numbers the same way.`,
      );
    case 'with-unit':
      return refuse(
        'unit-in-cell',
        expected,
        `the cell holds a unit. Keep the unit in the header and leave the number alone in the cell.`,
      );
    case 'not-a-number':
      return refuse(
        'not-a-number',
        expected,
        `“${column.text}” needs a number here. Correct it, or clear the cell if the value is missing.`,
      );
  }
}

function noteFormula(
  table: Table,
  column: Column,
  row: number,
  cell: Cell,
  context: ReadingContext,
): void {
  if (!cell.formula) return;
  const at = cellOf(table, column, row);
  context.tally.count(column.text, {
    code: 'formula-value',
    sheet: table.sheet.name,
    cell: at,
    found: cell.text,
    expected: 'numbers, or formulas with a stored result',
    message: (count) =>
      `${counted(count, 'formula')} in “${column.text}”, from ${at} on: the stored results are read, nothing is calculated again.`,
  });
}

export type TextCell = { state: 'text'; text: string } | { state: 'missing' | 'fault' };

/** Reads one cell of a text column, trimmed; `limit` characters at most. */
export function readText(
  table: Table,
  column: Column,
  row: number,
  context: ReadingContext,
): TextCell {
  const cell = table.sheet.cell(row, column.index);
  if (cell.kind === 'empty') return { state: 'missing' };
  const at = cellOf(table, column, row);
  const place = { sheet: table.sheet.name, cell: at, found: cell.text };
  const refuse = (code: string, expected: string, message: string): TextCell => {
    context.issues.stop({ code, ...place, expected, message: `${at}: ${message}` });
    return { state: 'fault' };
  };
  if (cell.kind === 'date') {
    return refuse(
      'is-date',
      'text',
      `“${column.text}” holds a date; a code such as 1-2 was turned into one. Format the cell as text and enter it again.`,
    );
  }
  if (cell.kind === 'error' || cell.kind === 'uncalculated') {
    return refuse(
      'error-cell',
      'text',
      `the cell holds ${cell.text} instead of a text. Correct it.`,
    );
  }
  noteFormula(table, column, row, cell, context);
  const text = cell.text.trim();
  if (/\p{Cc}/u.test(text)) {
    return refuse(
      'control-character',
      'plain text',
      'the text holds control characters. Type it again.',
    );
  }
  if (text.length > context.limits.textLength) {
    return refuse(
      'text-too-long',
      `at most ${context.limits.textLength} characters`,
      `the text has ${text.length} characters. Shorten it.`,
    );
  }
  return { state: 'text', text };
}

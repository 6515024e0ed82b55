/** One cell as it stood in the file, before anything is made of it. */
export interface Cell {
  kind: 'empty' | 'number' | 'text' | 'boolean' | 'error' | 'date' | 'uncalculated';
  /** The stored number; NaN for every other kind. */
  number: number;
  /** The cell as text, untrimmed; the error's name for an error. */
  text: string;
  /** Shown with a percent sign: 0.3 stands for 30 %. */
  percent: boolean;
  /** The value was stored by a formula. */
  formula: boolean;
}

/** A rectangle of merged cells, 0-based and inclusive. */
export interface MergedRange {
  firstRow: number;
  lastRow: number;
  firstColumn: number;
  lastColumn: number;
}

/** A sheet of plain cells; rows and columns are 0-based. */
export interface Sheet {
  name: string;
  /** `csv` sheets hold text only, and their decimal sign has to be found out. */
  origin: 'xlsx' | 'csv';
  hidden: boolean;
  rowCount: number;
  columnCount: number;
  hiddenRows: number[];
  merges: MergedRange[];
  /** The decimal sign of numbers written as text. */
  decimalSign: '.' | ',';
  cell(row: number, column: number): Cell;
}

export const EMPTY_CELL: Cell = {
  kind: 'empty',
  number: NaN,
  text: '',
  percent: false,
  formula: false,
};

/** A text cell; blank text counts as empty. */
export function textCell(text: string, formula = false): Cell {
  if (text.trim() === '') return EMPTY_CELL;
  return { kind: 'text', number: NaN, text, percent: false, formula };
}

/** True when no cell of the row holds anything. */
export function isBlankRow(sheet: Sheet, row: number): boolean {
  for (let column = 0; column < sheet.columnCount; column += 1) {
    if (sheet.cell(row, column).kind !== 'empty') return false;
  }
  return true;
}

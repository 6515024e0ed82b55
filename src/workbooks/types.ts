import type { ReadingDimension, ReadingKind, WellRole } from '../kinetics/types';

/** Where something stands in the uploaded file, so that every number can be traced back. */
export interface CellPlace {
  /** Sheet name; for csv the word `csv`. */
  sheet: string;
  /** A1-style address (`B7`); null when the whole sheet is meant. */
  cell: string | null;
}

/**
 * A fault or caution found while reading a workbook. A `stop` means that nothing is stored; a
 * `caution` is shown and kept beside the screen.
 */
export interface WorkbookIssue extends CellPlace {
  severity: 'stop' | 'caution';
  /** Stable name, kebab-case, such as `unknown-well`. */
  code: string;
  /** What stood there, as text, shortened to 60 characters; null when nothing did. */
  found: string | null;
  /** What would have been right. */
  expected: string;
  /** One full sentence for a person: what is wrong and what to do. */
  message: string;
}

/** The readings of one well, SI units, in the order of the file. */
export interface ParsedReadings {
  timesS: number[];
  /** Base unit of the screen's dimension; null for a missing reading. */
  values: (number | null)[];
  sheet: string;
  /** 1-based row of each reading in `sheet`. */
  rows: number[];
  /** Column letter of the values, such as `D`. */
  column: string;
}

export interface ParsedWell {
  /** Plate name; `Plate 1` when the file names none. */
  plate: string;
  /** Normalised position: letter(s) and two digits, `B07`. */
  position: string;
  /** Catalyst code exactly as written, trimmed; null for wells without one. */
  catalyst: string | null;
  role: WellRole;
  /** K, set temperature. */
  temperatureK: number;
  /** K, measured in the well; null when the file has none. */
  measuredTemperatureK: number | null;
  massG: number | null;
  volumeL: number | null;
  replicate: number | null;
  /** Sheet and cell of the well's row in the layout. */
  source: CellPlace;
  readings: ParsedReadings;
}

export interface ParsedPlate {
  name: string;
  /** Wells of the standard format the positions fit on: 24, 48, 96 or 384. */
  format: 24 | 48 | 96 | 384;
}

/** A workbook that can be stored: no stop issues are left. */
export interface ParsedScreen {
  dimension: ReadingDimension;
  kind: ReadingKind;
  /** As the file had it, such as `mmol/L`; shown to the user. */
  readingUnit: string;
  timeUnit: string;
  plates: ParsedPlate[];
  wells: ParsedWell[];
  cautions: WorkbookIssue[];
}

export type ParsedWorkbook =
  { ok: true; screen: ParsedScreen } | { ok: false; issues: WorkbookIssue[] };

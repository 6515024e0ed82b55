import type { ReadingDimension, ReadingKind, WellRole } from '../kinetics/types';
import type { IssueList } from './issueList';
import type { WorkbookLimits } from './limits';
import type { Tally } from './tally';
import type { CellPlace } from './types';

/** What every reader of a file shares. */
export interface ReadingContext {
  issues: IssueList;
  tally: Tally;
  limits: WorkbookLimits;
}

/** A well as its row describes it; null where the cell was missing or at fault. */
export interface WellRow {
  plate: string;
  position: string;
  catalyst: string | null;
  role: WellRole | null;
  temperatureK: number | null;
  measuredTemperatureK: number | null;
  massG: number | null;
  volumeL: number | null;
  replicate: number | null;
  /** Declared number of wells of the plate. */
  plateFormat: number | null;
  source: CellPlace;
  /** Where the catalyst stands or should stand. */
  catalystCell: string;
}

/** Readings of one well, in the order of the file. */
export interface WellReadings {
  plate: string;
  position: string;
  sheet: string;
  column: string;
  timesS: number[];
  values: (number | null)[];
  rows: number[];
}

/** What every layout makes of a file, before wells and readings are joined. */
export interface ScreenRows {
  dimension: ReadingDimension;
  kind: ReadingKind;
  readingUnit: string;
  /** Base unit over the unit as written. */
  readingFactor: number;
  timeUnit: string;
  wells: Map<string, WellRow>;
  readings: Map<string, WellReadings>;
  /** Sheet of the wells and of the readings, for issues about a whole. */
  wellSheet: string;
  readingSheet: string;
}

/** Key of a well within one file. */
export function wellKey(plate: string, position: string): string {
  return `${plate}\u0000${position}`;
}

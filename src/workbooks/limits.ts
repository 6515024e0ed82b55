/** Bounds on what one upload may hold; everything beyond is refused, never cut off. */
export interface WorkbookLimits {
  /** Bytes of the file as uploaded. */
  fileBytes: number;
  /** Parts of the zip container. */
  zipEntries: number;
  /** Inflated bytes of one part, and of all parts together. */
  entryBytes: number;
  totalBytes: number;
  /** Inflated over stored size, looked at once a part has inflated to `ratioFloorBytes`. */
  ratio: number;
  ratioFloorBytes: number;
  /** Rows and columns of one sheet. */
  rows: number;
  columns: number;
  /** Characters of one text cell. */
  textLength: number;
  /** Issues listed by name; the rest is counted. */
  issues: number;
}

const MEGABYTE = 1_000_000;

export const DEFAULT_LIMITS: WorkbookLimits = {
  fileBytes: 32 * MEGABYTE,
  zipEntries: 2000,
  entryBytes: 300 * MEGABYTE,
  totalBytes: 400 * MEGABYTE,
  ratio: 200,
  ratioFloorBytes: MEGABYTE,
  rows: 400_100,
  columns: 256,
  textLength: 64,
  issues: 500,
};

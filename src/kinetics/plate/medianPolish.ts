/** A plate taken apart: value = overall + row + column + residual. */
export interface PolishedPlate {
  overall: number;
  rows: number[];
  columns: number[];
  /** Same shape as the plate; null where it has no value. */
  residuals: (number | null)[][];
}

const MOST_ROUNDS = 12;
const SETTLED = 1e-10;

export function median(values: readonly number[]): number {
  if (values.length === 0) return 0;
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[middle]! : (sorted[middle - 1]! + sorted[middle]!) / 2;
}

/**
 * Median polish (Tukey, Exploratory Data Analysis 1977): row and column effects that single wells do
 * not pull.
 *
 * @param plate rows of equal length; null where there is no value
 */
export function medianPolish(plate: readonly (readonly (number | null)[])[]): PolishedPlate {
  const residuals = plate.map((row) => [...row]);
  const rows = plate.map(() => 0);
  const columns = (plate[0] ?? []).map(() => 0);
  let overall = 0;
  const known = (values: readonly (number | null)[]) => values.filter((value) => value !== null);
  for (let round = 0; round < MOST_ROUNDS; round += 1) {
    let moved = 0;
    residuals.forEach((row, i) => {
      const shift = median(known(row));
      rows[i]! += shift;
      moved = Math.max(moved, Math.abs(shift));
      row.forEach((value, j) => (row[j] = value === null ? null : value - shift));
    });
    const ofRows = median(rows);
    overall += ofRows;
    rows.forEach((value, i) => (rows[i] = value - ofRows));
    columns.forEach((_, j) => {
      const shift = median(known(residuals.map((row) => row[j] ?? null)));
      columns[j]! += shift;
      moved = Math.max(moved, Math.abs(shift));
      for (const row of residuals) {
        const value = row[j] ?? null;
        row[j] = value === null ? null : value - shift;
      }
    });
    const ofColumns = median(columns);
    overall += ofColumns;
    columns.forEach((value, j) => (columns[j] = value - ofColumns));
    if (moved < SETTLED) break;
  }
  return { overall, rows, columns, residuals };
}

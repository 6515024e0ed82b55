import type { ScreenWellRow } from '../../contracts/screens';

/** Where a well lies: row 0 is A, column 0 is 1. */
export interface WellPlace {
  row: number;
  column: number;
}

/** One plate as it lay. */
export interface PlateMap {
  plate: string;
  rows: number;
  columns: number;
  /** By row, then column; null where no well was filled. */
  wells: (ScreenWellRow | null)[][];
  /** K, when all wells of the plate have one within half a degree; null otherwise. */
  temperatureK: number | null;
}

const formats: readonly (readonly [rows: number, columns: number])[] = [
  [4, 6],
  [6, 8],
  [8, 12],
  [16, 24],
];

/** Where `B07` lies; null for a name that is no place on a plate. */
export function placeOf(position: string): WellPlace | null {
  const [, letter, number] = /^([A-P])0?(\d{1,2})$/.exec(position) ?? [];
  const column = Number(number) - 1;
  if (letter === undefined || column < 0 || column > 23) return null;
  return { row: letter.charCodeAt(0) - 65, column };
}

/** Wells plate by plate and in each from A01 on; names that are no place come last. */
export function inPlateOrder(wells: readonly ScreenWellRow[]): ScreenWellRow[] {
  const rank = ({ position }: ScreenWellRow) => {
    const place = placeOf(position);
    return place ? place.row * 24 + place.column : Infinity;
  };
  return [...wells].sort(
    (a, b) =>
      a.plate.localeCompare(b.plate, 'en', { numeric: true }) ||
      (rank(a) === rank(b) ? 0 : rank(a) - rank(b)) ||
      a.position.localeCompare(b.position, 'en', { numeric: true }),
  );
}

/** The plates that can be drawn: all their wells have a place. The format is the smallest that fits. */
export function plateMaps(wells: readonly ScreenWellRow[]): PlateMap[] {
  const byPlate = new Map<string, ScreenWellRow[]>();
  for (const well of inPlateOrder(wells)) {
    byPlate.set(well.plate, [...(byPlate.get(well.plate) ?? []), well]);
  }
  return [...byPlate].flatMap(([plate, own]) => plateMap(plate, own) ?? []);
}

function plateMap(plate: string, wells: readonly ScreenWellRow[]): PlateMap | null {
  const places = wells.flatMap(({ position }) => placeOf(position) ?? []);
  if (places.length < wells.length) return null;
  const lastRow = Math.max(...places.map(({ row }) => row));
  const lastColumn = Math.max(...places.map(({ column }) => column));
  const format = formats.find(([rows, columns]) => lastRow < rows && lastColumn < columns);
  if (!format) return null;
  const [rows, columns] = format;
  const map = Array.from({ length: rows }, () => Array<ScreenWellRow | null>(columns).fill(null));
  wells.forEach((well, index) => {
    const place = places[index];
    if (place) map[place.row]![place.column] = well;
  });
  const temperatures = wells.map(({ temperatureK }) => temperatureK);
  const [coldest, hottest] = [Math.min(...temperatures), Math.max(...temperatures)];
  return {
    plate,
    rows,
    columns,
    wells: map,
    temperatureK: hottest - coldest <= 0.5 ? (coldest + hottest) / 2 : null,
  };
}

const steps: Record<string, [row: number, column: number]> = {
  ArrowLeft: [0, -1],
  ArrowRight: [0, 1],
  ArrowUp: [-1, 0],
  ArrowDown: [1, 0],
};

/** The filled well that an arrow key leads to, past empty places; null when there is none. */
export function wellBeside(map: PlateMap, wellId: string, key: string): ScreenWellRow | null {
  const step = steps[key];
  const row = map.wells.findIndex((line) => line.some((well) => well?.wellId === wellId));
  if (!step || row < 0) return null;
  const column = map.wells[row]!.findIndex((well) => well?.wellId === wellId);
  let [r, c] = [row + step[0], column + step[1]];
  for (; map.wells[r]?.[c] !== undefined; r += step[0], c += step[1]) {
    const well = map.wells[r]![c];
    if (well) return well;
  }
  return null;
}

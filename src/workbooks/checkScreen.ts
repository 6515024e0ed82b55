import { findLookAlikes } from './catalystCodes';
import type { ReadingContext, ScreenRows, WellReadings, WellRow } from './reading';
import { counted } from './tally';
import type { ParsedPlate } from './types';
import { fitsOn, guessFormat, lastWell, type PlateFormat } from './wellPosition';

/** Checks that need all wells and readings together; every fault is reported. */
export function checkScreen(rows: ScreenRows, context: ReadingContext): ParsedPlate[] {
  checkPairs(rows, context);
  checkCodes(rows, context);
  checkNegatives(rows, context);
  checkMagnitudes(rows, context);
  checkDirection(rows, context);
  return checkPlates(rows, context);
}

function checkPairs(rows: ScreenRows, { issues }: ReadingContext): void {
  if (rows.wells.size === 0) {
    issues.stop({
      code: 'no-wells',
      sheet: rows.wellSheet,
      expected: 'at least one well',
      message: `The sheet “${rows.wellSheet}” describes no wells below its headers. Fill them in.`,
    });
  }
  if (rows.readings.size === 0) {
    issues.stop({
      code: 'no-readings',
      sheet: rows.readingSheet,
      expected: 'at least one reading',
      message: `The sheet “${rows.readingSheet}” holds no readings below its headers. Fill them in.`,
    });
    return;
  }
  for (const [key, well] of rows.wells) {
    if (rows.readings.has(key)) continue;
    issues.caution({
      code: 'well-without-readings',
      ...well.source,
      found: well.position,
      expected: 'readings for every well',
      message: `Well ${well.position} of ${well.plate}${well.catalyst === null ? '' : ` (${well.catalyst})`} has no readings. It is kept as unusable.`,
    });
  }
  for (const [key, readings] of rows.readings) {
    if (rows.wells.has(key)) continue;
    issues.stop({
      code: 'readings-without-well',
      sheet: readings.sheet,
      cell: `${readings.column}${readings.rows[0]}`,
      found: readings.position,
      expected: 'a well that the layout describes',
      message: `Well ${readings.position} of ${readings.plate} has ${counted(readings.rows.length, 'reading')}, from row ${readings.rows[0]} on, but “${rows.wellSheet}” does not describe it. Add it there, or correct the well or plate.`,
    });
  }
}

function checkCodes(rows: ScreenRows, { issues }: ReadingContext): void {
  const first = new Map<string, WellRow>();
  for (const well of rows.wells.values()) {
    if (well.catalyst !== null && !first.has(well.catalyst)) first.set(well.catalyst, well);
  }
  for (const group of findLookAlikes(first.keys())) {
    const well = first.get(group.at(-1)!)!;
    const places = group.map((code) => `“${code}” in ${first.get(code)!.catalystCell}`).join(', ');
    issues.caution({
      code: 'codes-look-alike',
      sheet: well.source.sheet,
      cell: well.catalystCell,
      found: well.catalyst,
      expected: 'one spelling for each catalyst',
      message: `${places} look alike but are read as different catalysts. Correct the spelling if they are the same.`,
    });
  }
}

/** Share of the screen's largest reading within which a negative reading is noise around zero. */
const NOISE_SHARE = 0.05;

function checkNegatives(rows: ScreenRows, { issues, tally }: ReadingContext): void {
  if (rows.kind === 'conversion') return;
  const tolerance = rows.kind === 'signal' ? Infinity : NOISE_SHARE * largestReading(rows);
  for (const well of rows.readings.values()) {
    for (const [index, value] of well.values.entries()) {
      if (value === null || value >= 0) continue;
      const cell = `${well.column}${well.rows[index]}`;
      const issue = {
        sheet: well.sheet,
        cell,
        found: asWritten(rows, value),
        expected: 'readings of at least 0, within their noise',
      };
      if (value >= -tolerance) {
        tally.count('negative', {
          ...issue,
          code: 'negative-kept',
          message: (count) =>
            `${counted(count, 'reading')} just below zero, from ${cell} on, kept as noise around zero.`,
        });
      } else {
        issues.stop({
          ...issue,
          code: 'negative-reading',
          message: `${cell}: the reading lies further below zero than noise would. Correct it, or clear the cell.`,
        });
      }
    }
  }
}

/** A value of the base unit as it stood in the file. */
function asWritten(rows: ScreenRows, value: number): string {
  return `${Number((value / rows.readingFactor).toPrecision(6))} ${rows.readingUnit}`;
}

function largestReading(rows: ScreenRows): number {
  let largest = 0;
  for (const { values } of rows.readings.values()) {
    for (const value of values) largest = Math.max(largest, value ?? 0);
  }
  return largest;
}

/** Factor above the middle well at which a well's readings look like another unit. */
const MAGNITUDE_FACTOR = 100;

function checkMagnitudes(rows: ScreenRows, { issues }: ReadingContext): void {
  if (rows.kind === 'conversion' || rows.kind === 'product') return;
  const peaks = [...rows.readings.values()].map((well) => ({ well, peak: peakOf(well) }));
  const sorted = peaks.map(({ peak }) => peak).sort((a, b) => a - b);
  const middle = sorted[Math.floor(sorted.length / 2)] ?? 0;
  if (middle <= 0) return;
  for (const { well, peak } of peaks) {
    if (peak < MAGNITUDE_FACTOR * middle && peak > middle / MAGNITUDE_FACTOR) continue;
    issues.caution({
      code: 'magnitude-differs',
      sheet: well.sheet,
      cell: `${well.column}${well.rows[0]}`,
      found: asWritten(rows, peak),
      expected: `readings in ${rows.readingUnit} in every well`,
      message: `The readings of well ${well.position} of ${well.plate} differ from the other wells by more than a factor of ${MAGNITUDE_FACTOR}. Check that they are in ${rows.readingUnit}.`,
    });
  }
}

function peakOf(well: WellReadings): number {
  return well.values.reduce<number>((peak, value) => Math.max(peak, value ?? 0), 0);
}

/** A reactant that rises in most wells is probably a product read from the wrong column. */
function checkDirection(rows: ScreenRows, { issues }: ReadingContext): void {
  if (rows.kind !== 'reactant') return;
  const wells = [...rows.readings.values()].filter((well) => well.values.length >= 4);
  const rising = wells.filter((well) => {
    const values = well.values.filter((value): value is number => value !== null);
    return values.length >= 4 && values.at(-1)! > 1.5 * Math.max(values[0]!, 0);
  });
  const [first] = rising;
  if (!first || rising.length * 2 <= wells.length) return;
  issues.caution({
    code: 'readings-rise',
    sheet: first.sheet,
    cell: `${first.column}${first.rows[0]}`,
    expected: 'a reactant that is used up',
    message: `The readings rise in ${rising.length} of ${wells.length} wells, which a reactant does not. Check that the column holds the reactant; a product is read under a header such as “product / mmol/L”.`,
  });
}

function checkPlates(rows: ScreenRows, { issues }: ReadingContext): ParsedPlate[] {
  const wellsByPlate = new Map<string, WellRow[]>();
  for (const well of rows.wells.values()) {
    const wells = wellsByPlate.get(well.plate) ?? [];
    wells.push(well);
    wellsByPlate.set(well.plate, wells);
  }
  return [...wellsByPlate].map(([name, wells]) => {
    const declared = wells.find((well) => well.plateFormat !== null)?.plateFormat;
    const format =
      (declared as PlateFormat | undefined) ?? guessFormat(wells.map((well) => well.position));
    for (const well of wells) {
      if (fitsOn(well.position, format)) continue;
      issues.stop({
        code: 'well-off-plate',
        ...well.source,
        found: well.position,
        expected: `a well up to ${lastWell(format)}`,
        message: `Well ${well.position} lies outside ${name}, ${declared ? 'declared' : 'which by its other wells is'} a ${format}-well plate. Correct the well, or add a column “plate format” with the number of wells.`,
      });
    }
    return { name, format };
  });
}

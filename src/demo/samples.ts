import type { CellValue } from '../workbooks/safeCell';
import { writeCsv } from '../workbooks/writeCsv';
import { writeWorkbook, type SheetToWrite } from '../workbooks/writeWorkbook';
import { DEMO_SEED } from './buildDemo';
import { generateSampleScreen } from './marlbeck';
import { screenSheets, screenTable } from './screenSheets';
import type { GeneratedWell } from './types';

export interface SampleFile {
  name: string;
  bytes: Uint8Array;
}

const WRITTEN_ON = new Date('2026-11-17T16:00:00Z');

/** The files of `samples/`, the same bytes every time. */
export function buildSamples(): SampleFile[] {
  const wells = generateSampleScreen(DEMO_SEED);
  return [
    { name: 'marlbeck-screen.xlsx', bytes: writeWorkbook(screenSheets(wells), WRITTEN_ON) },
    {
      name: 'marlbeck-screen.csv',
      bytes: new TextEncoder().encode(writeCsv(screenTable(wells))),
    },
    { name: 'ten-faults.xlsx', bytes: writeWorkbook(withTenFaults(wells), WRITTEN_ON) },
  ];
}

/** Six wells of the sample screen, with ten faults a spreadsheet picks up in daily use. */
function withTenFaults(wells: readonly GeneratedWell[]): SheetToWrite[] {
  const few = wells
    .filter((well) => well.plate === 'Plate 3' && well.role === 'sample')
    .slice(0, 6);
  const [wellSheet, readingSheet] = screenSheets(few) as [SheetToWrite, SheetToWrite];
  const rows = wellSheet.rows.map((row) => [...row]);
  const readings = readingSheet.rows.map((row) => [...row]);
  const column = (name: string) => rows[0]!.indexOf(name);
  const plate = few[0]!.plate;

  rows[1]![column('Role')] = 'smaple';
  rows[2]![column('m / mg')] = 0;
  rows[3]![column('T / °C')] = -300;
  rows[4]![column('Catalyst')] = null;
  rows.push([plate, 'A25', ...rows[5]!.slice(2)]);
  rows.push([...rows[6]!]);

  const perWell = few[0]!.timesMin.length;
  readings[3]![2] = '4 min';
  readings[5]![3] = '#N/A';
  readings[perWell + 2]![2] = readings[perWell + 1]![2] as CellValue;
  readings.push([plate, 'C8', 0, 4.01]);
  return [
    { ...wellSheet, rows },
    { ...readingSheet, rows: readings },
  ];
}

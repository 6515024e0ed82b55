import type { CellValue } from '../workbooks/safeCell';
import type { SheetToWrite } from '../workbooks/writeWorkbook';
import type { GeneratedWell } from './types';

const ROLE_WORDS = {
  sample: 'sample',
  blank: 'blank',
  'support-blank': 'support blank',
  control: 'control',
  benchmark: 'benchmark',
} as const;

const wellHeaders = (measured: boolean): string[] => [
  'Catalyst',
  'T / °C',
  ...(measured ? ['Measured temperature / °C'] : []),
  'm / mg',
  'V / mL',
  'Role',
  'Replicate',
];

const wellCells = (well: GeneratedWell, measured: boolean): CellValue[] => [
  well.catalyst,
  well.temperatureC,
  ...(measured ? [well.measuredTemperatureC] : []),
  well.massMg,
  well.volumeMl,
  ROLE_WORDS[well.role],
  well.replicate,
];

/** The sheets of a workbook with a row for each well and a row for each reading. */
export function screenSheets(wells: readonly GeneratedWell[]): SheetToWrite[] {
  const measured = wells.some((well) => well.measuredTemperatureC !== null);
  const headers = wellHeaders(measured);
  return [
    {
      name: 'Wells',
      rows: [
        ['Plate', 'Well', ...headers],
        ...wells.map((well) => [well.plate, well.position, ...wellCells(well, measured)]),
      ],
      widths: [10, 8, ...headers.map((header) => Math.max(header.length + 2, 10))],
    },
    {
      name: 'Readings',
      rows: [
        ['Plate', 'Well', 't / min', 'c / mmol/L'],
        ...wells.flatMap((well) =>
          well.timesMin.map((time, at) => [well.plate, well.position, time, well.readings[at]!]),
        ),
      ],
      widths: [10, 8, 10, 12],
    },
  ];
}

/** The same as one table, a row for each reading. */
export function screenTable(wells: readonly GeneratedWell[]): CellValue[][] {
  const measured = wells.some((well) => well.measuredTemperatureC !== null);
  return [
    ['Plate', 'Well', ...wellHeaders(measured), 't / min', 'c / mmol/L'],
    ...wells.flatMap((well) =>
      well.timesMin.map((time, at) => [
        well.plate,
        well.position,
        ...wellCells(well, measured),
        time,
        well.readings[at]!,
      ]),
    ),
  ];
}

import { writeWorkbook } from '../workbooks/writeWorkbook';
import { TARNSIDE_CARDS } from './cards';
import { generateScreen } from './generateScreen';
import { randomStream } from '../kinetics/statistics/randomStream';
import { screenSheets } from './screenSheets';
import { TARNSIDE_BENCHMARK, TARNSIDE_TRUTHS } from './truths';
import type { DemoCampaign } from './types';

/** The campaign of the group *Tarnside Catalysis Group*, with its one screen. */
export function buildOximeCampaign(seed: number): DemoCampaign {
  const wells = generateScreen(
    {
      plateFormat: 24,
      temperaturesC: [40, 50, 60],
      referenceTemperatureK: 323.15,
      referenceLoadingGPerL: 4,
      volumeMl: 5,
      initialConcentration: 50,
      noise: 0.3,
      timesMin: [0, 3, 6, 10, 15, 20, 26, 33, 41, 50, 60, 72, 86, 102, 120, 150],
      candidates: TARNSIDE_TRUTHS,
      replicates: 2,
      benchmark: TARNSIDE_BENCHMARK,
      benchmarkWells: 2,
      blanks: 2,
      supports: ['TiO2'],
      edgeEffectAtC: null,
      measured: true,
    },
    randomStream(seed + 4),
  );
  return {
    name: 'Oxime hydrogenation in ethanol',
    reactant: 'oxime',
    nu: 1,
    dimension: 'concentration',
    referenceTemperatureK: 323.15,
    referenceConcentration: 0.05,
    referenceLoadingGPerL: 4,
    targetConversion: 0.9,
    conditions:
      'Hydrogen at 3 bar, in excess over the oxime throughout. Solvent ethanol. Stirring 1000 rpm.',
    thresholds: 'A candidate reaches 90 % conversion at 50 °C in less than 2 h at 4 g/L.',
    benchmark: TARNSIDE_BENCHMARK.code,
    catalysts: [...TARNSIDE_CARDS],
    screens: [
      {
        name: 'Screen 1: TS-01 to TS-04',
        performedOn: '2026-11-04',
        operator: 'Tarnside analyst',
        fileName: 'tarnside-2026-11-04.xlsx',
        bytes: writeWorkbook(screenSheets(wells), new Date('2026-11-04T16:00:00Z')),
      },
    ],
  };
}

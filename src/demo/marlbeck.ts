import { writeWorkbook } from '../workbooks/writeWorkbook';
import { MARLBECK_CARDS } from './cards';
import { generateScreen, type ScreenDesign } from './generateScreen';
import { randomStream } from '../kinetics/statistics/randomStream';
import { screenSheets } from './screenSheets';
import { MARLBECK_BENCHMARK, MARLBECK_TRUTHS, SAMPLE_TRUTHS } from './truths';
import type { DemoCampaign, GeneratedWell } from './types';

const TIMES_MIN = [0, 2, 4, 6, 9, 12, 15, 19, 23, 28, 33, 39, 46, 54, 63, 73, 84, 95, 107, 120];

const DESIGN: Omit<ScreenDesign, 'candidates' | 'edgeEffectAtC' | 'measured'> = {
  plateFormat: 96,
  temperaturesC: [40, 50, 60, 70],
  referenceTemperatureK: 333.15,
  referenceLoadingGPerL: 2.5,
  volumeMl: 2,
  initialConcentration: 4,
  noise: 0.02,
  timesMin: TIMES_MIN,
  replicates: 2,
  benchmark: MARLBECK_BENCHMARK,
  benchmarkWells: 4,
  blanks: 4,
  supports: ['SiO2', 'Al2O3'],
};

/** The campaign of the group *Marlbeck Surface Lab*, with its two screens. */
export function buildBromateCampaign(seed: number): DemoCampaign {
  const half = MARLBECK_TRUTHS.length / 2;
  const first = generateScreen(
    { ...DESIGN, candidates: MARLBECK_TRUTHS.slice(0, half), edgeEffectAtC: null, measured: false },
    randomStream(seed + 1),
  );
  const second = generateScreen(
    { ...DESIGN, candidates: MARLBECK_TRUTHS.slice(half), edgeEffectAtC: 70, measured: false },
    randomStream(seed + 2),
  );
  return {
    name: 'Bromate hydrogenation in water',
    reactant: 'bromate',
    nu: 1,
    dimension: 'concentration',
    referenceTemperatureK: DESIGN.referenceTemperatureK,
    referenceConcentration: 0.004,
    referenceLoadingGPerL: DESIGN.referenceLoadingGPerL,
    targetConversion: 0.8,
    conditions:
      'Hydrogen at 1 bar, in excess over bromate throughout. Solvent water, pH 7 (phosphate buffer). Stirring 1200 rpm.',
    thresholds:
      'A candidate reaches 80 % conversion at 60 °C in less than 60 min at 2.5 g/L, with an apparent activation energy above 25 kJ/mol.',
    benchmark: MARLBECK_BENCHMARK.code,
    catalysts: [...MARLBECK_CARDS],
    screens: [
      {
        name: 'Screen 1: MB-01 to MB-12',
        performedOn: '2026-10-13',
        operator: 'Marlbeck analyst',
        fileName: 'marlbeck-2026-10-13.xlsx',
        bytes: writeWorkbook(screenSheets(first), new Date('2026-10-13T16:00:00Z')),
      },
      {
        name: 'Screen 2: MB-13 to MB-24',
        performedOn: '2026-10-20',
        operator: 'Marlbeck analyst',
        fileName: 'marlbeck-2026-10-20.xlsx',
        bytes: writeWorkbook(screenSheets(second), new Date('2026-10-20T16:00:00Z')),
      },
    ],
  };
}

/** A further screen of eight candidates, for a newcomer to upload; not part of the demo. */
export function generateSampleScreen(seed: number): GeneratedWell[] {
  return generateScreen(
    { ...DESIGN, candidates: SAMPLE_TRUTHS, edgeEffectAtC: null, measured: true },
    randomStream(seed + 3),
  );
}

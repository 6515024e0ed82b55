import type { WellRole } from '../kinetics/types';
import { simulateDecay } from './decay';
import type { RandomStream } from '../kinetics/statistics/randomStream';
import type { CatalystTruth, GeneratedWell } from './types';

export interface ScreenDesign {
  plateFormat: 24 | 96;
  temperaturesC: readonly number[];
  referenceTemperatureK: number;
  referenceLoadingGPerL: number;
  volumeMl: number;
  /** mmol/L. */
  initialConcentration: number;
  /** mmol/L, standard deviation of one reading. */
  noise: number;
  timesMin: readonly number[];
  candidates: readonly CatalystTruth[];
  replicates: number;
  benchmark: CatalystTruth;
  benchmarkWells: number;
  blanks: number;
  /** Bare supports on each plate. */
  supports: readonly string[];
  /** Set temperature of the plate whose outer wells stay cooler; null for none. */
  edgeEffectAtC: number | null;
  /** Whether each well's temperature was measured. */
  measured: boolean;
}

/** K by which the outer wells of the plate with an edge effect stay cooler. */
export const EDGE_DEFICIT_K = 2.5;
/** K, what a plate's set temperature is off by. */
const BLOCK_SD_K = 0.25;
/** Well-to-well spread of the rate, relative. */
const WELL_SD = 0.025;
/** s⁻¹ at the reference temperature. */
const BLANK_RATE = 2e-8;

const NO_CATALYST: CatalystTruth = {
  code: '',
  law: 'none',
  k: 0,
  activationEnergy: 0,
  adsorptionConstant: null,
  adsorptionEnthalpy: null,
  deactivationRate: null,
  noiseFactor: 1,
  story: 'dead',
};

interface Occupant {
  truth: CatalystTruth;
  catalyst: string | null;
  role: WellRole;
  replicate: number;
}

/** Wells and readings of one screen: a plate for each temperature, wells in random order. */
export function generateScreen(design: ScreenDesign, random: RandomStream): GeneratedWell[] {
  return design.temperaturesC.flatMap((temperatureC, index) => {
    const blockOffsetK = BLOCK_SD_K * random.normal();
    const positions = random.shuffle(freePositions(design.plateFormat));
    return occupants(design)
      .map((occupant, at) => ({ occupant, position: positions[at]! }))
      .sort((a, b) => (a.position < b.position ? -1 : 1))
      .map(({ occupant, position }) =>
        generateWell(design, occupant, position, index + 1, temperatureC, blockOffsetK, random),
      );
  });
}

function occupants(design: ScreenDesign): Occupant[] {
  const repeat = (count: number, make: (replicate: number) => Occupant) =>
    Array.from({ length: count }, (_, index) => make(index + 1));
  return [
    ...design.candidates.flatMap((truth) =>
      repeat(design.replicates, (replicate) => ({
        truth,
        catalyst: truth.code,
        role: 'sample',
        replicate,
      })),
    ),
    ...repeat(design.benchmarkWells, (replicate) => ({
      truth: design.benchmark,
      catalyst: design.benchmark.code,
      role: 'benchmark',
      replicate,
    })),
    ...repeat(design.blanks, (replicate) => ({
      truth: NO_CATALYST,
      catalyst: null,
      role: 'blank',
      replicate,
    })),
    ...design.supports.flatMap((support) =>
      repeat(2, (replicate) => ({
        truth: NO_CATALYST,
        catalyst: support,
        role: 'support-blank',
        replicate,
      })),
    ),
  ];
}

/** On 96 wells every second one stays empty, against heat passing between neighbours. */
function freePositions(format: 24 | 96): string[] {
  const [rows, columns] = format === 96 ? [8, 12] : [4, 6];
  const positions: string[] = [];
  for (let row = 0; row < rows; row += 1) {
    for (let column = 1; column <= columns; column += 1) {
      if (format === 96 && (row + column) % 2 === 0) continue;
      positions.push(`${String.fromCharCode(65 + row)}${column}`);
    }
  }
  return positions;
}

function isOuter(position: string, format: 24 | 96): boolean {
  const row = position[0];
  const column = Number(position.slice(1));
  const [lastRow, lastColumn] = format === 96 ? ['H', 12] : ['D', 6];
  return row === 'A' || row === lastRow || column === 1 || column === lastColumn;
}

function generateWell(
  design: ScreenDesign,
  occupant: Occupant,
  position: string,
  plateNumber: number,
  temperatureC: number,
  blockOffsetK: number,
  random: RandomStream,
): GeneratedWell {
  const outer = isOuter(position, design.plateFormat);
  const deficitK = design.edgeEffectAtC === temperatureC && outer ? EDGE_DEFICIT_K : 0;
  const liquidK = temperatureC + 273.15 + blockOffsetK - deficitK;
  const fullMass = design.referenceLoadingGPerL * design.volumeMl;
  const massMg = occupant.role === 'blank' ? 0 : round(fullMass * (1 + 0.03 * random.normal()), 2);
  const relativeLoading = (massMg / fullMass) * (1 + WELL_SD * random.normal());
  const c0 = design.initialConcentration * (1 + 0.008 * random.normal());
  const concentrations = simulateDecay(
    occupant.truth,
    {
      temperatureK: liquidK,
      referenceTemperatureK: design.referenceTemperatureK,
      relativeLoading,
      initialConcentration: c0 / 1000,
      blankRate: BLANK_RATE,
    },
    design.timesMin.map((minutes) => minutes * 60),
  );
  const sd = design.noise * occupant.truth.noiseFactor;
  const measured = round(liquidK - 273.15 + 0.08 * random.normal(), 1);
  return {
    plate: `Plate ${plateNumber}`,
    position,
    catalyst: occupant.catalyst,
    role: occupant.role,
    temperatureC,
    measuredTemperatureC: design.measured ? measured : null,
    massMg,
    volumeMl: design.volumeMl,
    replicate: occupant.replicate,
    timesMin: [...design.timesMin],
    readings: concentrations.map((c) => round(1000 * c + sd * random.normal(), 3)),
  };
}

function round(value: number, decimals: number): number {
  // `+ 0` turns a rounded −0 into 0.
  return Number(value.toFixed(decimals)) + 0;
}

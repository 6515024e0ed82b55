import { analyseScreen, analyseSeries } from '../kinetics';
import { randomStream } from '../kinetics/statistics/randomStream';
import type { CatalystAnalysis, Estimate } from '../kinetics/types';
import { holdsK, judgeWell, rateVerdicts, seriesOf, type VerdictRates } from './judgeWells';
import { CENTRE_K, simulateCatalyst, trueCentreK, type CatalystPlan } from './simulateCatalysts';
import { simulateWell, WIDE_RANGES } from './simulateWells';
import { SIMPLE_TRUTHS, TRUTHS, type Truth } from './truths';

/** How much is simulated; the seeds are fixed, so that a run can be repeated to the letter. */
export interface CalibrationSize {
  wellsOfEachTruth: number;
  forcedWellsOfEachOrder: number;
  catalysts: number;
}

export const FULL_SIZE: CalibrationSize = {
  wellsOfEachTruth: 2000,
  forcedWellsOfEachOrder: 2000,
  catalysts: 400,
};

const WELL_SEED = 20270117;
const COVERAGE_SEED = 20270118;
const CATALYST_SEED = 20270119;

/** How often the intervals of catalysts of one plan hold the truth. */
export interface CatalystCoverage {
  name: string;
  catalysts: number;
  told: number;
  wrong: number;
  activationEnergy: number;
  kRef: number;
  curvatureAlarms: number;
}

export interface Calibration {
  wells: VerdictRates;
  /** Coverage of the 95 % interval of k with the true law forced, by order. */
  forcedCoverage: Partial<Record<Truth, number>>;
  /** Verdicts of whole catalysts, by truth. */
  catalysts: VerdictTable;
  coverage: CatalystCoverage[];
}

type VerdictTable = Record<Truth, Partial<Record<CatalystAnalysis['verdict'], number>>>;

/** Wells of the calibration set, the truths in turn. */
export function calibrationWells(ofEachTruth: number) {
  const random = randomStream(WELL_SEED);
  return Array.from({ length: ofEachTruth }, () =>
    TRUTHS.map((truth) => simulateWell(truth, random, WIDE_RANGES)),
  ).flat();
}

/** Runs the whole calibration. */
export function calibrate(size: CalibrationSize): Calibration {
  return {
    wells: rateVerdicts(calibrationWells(size.wellsOfEachTruth).map(judgeWell)),
    forcedCoverage: coverForced(size.forcedWellsOfEachOrder),
    catalysts: judgeCatalysts(Math.ceil(size.catalysts / 4)),
    coverage: PLANS.map((plan) => coverCatalysts(plan, size.catalysts)),
  };
}

/** Coverage of k over wells that react visibly, the true law forced. */
export function coverForced(ofEachOrder: number): Calibration['forcedCoverage'] {
  const random = randomStream(COVERAGE_SEED);
  const ranges = {
    ...WIDE_RANGES,
    conversion: [0.3, 0.99] as const,
    noise: [0.002, 0.03] as const,
  };
  const covered: Calibration['forcedCoverage'] = {};
  for (const truth of SIMPLE_TRUTHS) {
    let [hits, intervals] = [0, 0];
    for (let i = 0; i < ofEachOrder; i += 1) {
      const well = simulateWell(truth, random, ranges);
      const found = analyseSeries(seriesOf(well, truth as 'zero' | 'first' | 'second'));
      if (found.k?.low == null) continue;
      intervals += 1;
      if (holdsK(found, well.k!)) hits += 1;
    }
    covered[truth] = hits / intervals;
  }
  return covered;
}

const PLATE: CatalystPlan = {
  truth: 'first',
  temperaturesK: [318.15, 328.15, 338.15, 348.15],
  replicates: 2,
  readings: 16,
  noise: 0.01,
  replicateSpread: 0.04,
  blockErrorK: 0,
  activationEnergy: 55_000,
};

const PLANS: readonly { name: string; plan: CatalystPlan }[] = [
  {
    name: '4 temperatures × 2, replicates spread by 4 %, runs 0.5 K off',
    plan: { ...PLATE, blockErrorK: 0.5 },
  },
  { name: '4 × 2, runs 0.7 K off', plan: { ...PLATE, blockErrorK: 0.7 } },
  { name: '4 × 2, runs true to temperature', plan: PLATE },
  { name: '4 × 2, runs true and no spread of replicates', plan: { ...PLATE, replicateSpread: 0 } },
  {
    name: '6 × 2, runs 0.7 K off',
    plan: {
      ...PLATE,
      temperaturesK: [313.15, 320.15, 327.15, 334.15, 341.15, 348.15],
      blockErrorK: 0.7,
    },
  },
  {
    name: '3 × 2, runs 0.7 K off',
    plan: { ...PLATE, temperaturesK: [323.15, 333.15, 343.15], blockErrorK: 0.7 },
  },
];

const REFERENCE = {
  temperatureK: CENTRE_K,
  concentration: null,
  loadingGPerL: null,
  targetConversion: null,
};

const holds = (estimate: Estimate | null, value: number) =>
  estimate?.low != null &&
  estimate.high !== null &&
  estimate.low <= value &&
  value <= estimate.high;

/** How often Ea and k at the centre lie in their intervals, with first order told or not. */
export function coverCatalysts(
  { name, plan }: (typeof PLANS)[number],
  catalysts: number,
): CatalystCoverage {
  const random = randomStream(CATALYST_SEED);
  const found = Array.from(
    { length: catalysts },
    () => analyseScreen(simulateCatalyst(plan, random), REFERENCE).catalysts[0]!,
  );
  const told = found.filter(({ verdict }) => verdict === plan.truth);
  const k = trueCentreK(plan.truth)!;
  const share = (of: (one: CatalystAnalysis) => boolean) => told.filter(of).length / told.length;
  return {
    name,
    catalysts,
    told: told.length / catalysts,
    wrong:
      found.filter(
        ({ verdict }) => verdict !== plan.truth && SIMPLE_TRUTHS.includes(verdict as Truth),
      ).length / catalysts,
    activationEnergy: share((one) => holds(one.activationEnergy, plan.activationEnergy)),
    kRef: share((one) => holds(one.kRef, k)),
    curvatureAlarms: share((one) => one.warnings.includes('arrhenius-curved')),
  };
}

/** The plan whose Ea coverage the engine promises. */
export const PROMISED_PLANS = PLANS.slice(0, 2);

/** Verdicts of catalysts of every truth, wells of 1 and 3 % noise. */
function judgeCatalysts(ofEachTruth: number): VerdictTable {
  const random = randomStream(CATALYST_SEED + 1);
  const table = Object.fromEntries(TRUTHS.map((truth) => [truth, {}])) as VerdictTable;
  for (const truth of TRUTHS) {
    for (let i = 0; i < ofEachTruth; i += 1) {
      const plan = { ...PLATE, truth, blockErrorK: 0.3, noise: i % 2 === 0 ? 0.01 : 0.03 };
      const { verdict } = analyseScreen(simulateCatalyst(plan, random), REFERENCE).catalysts[0]!;
      table[truth][verdict] = (table[truth][verdict] ?? 0) + 1;
    }
  }
  return table;
}

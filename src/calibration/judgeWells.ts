import { analyseSeries } from '../kinetics';
import type { DecaySeries, LawRequest, SeriesAnalysis, Verdict } from '../kinetics/types';
import type { SimulatedWell } from './simulateWells';
import { SIMPLE_TRUTHS, TRUTHS, type Truth } from './truths';

/** A judged well. */
export interface JudgedWell {
  well: Pick<SimulatedWell, 'truth' | 'conversion' | 'noise' | 'meanLocalOrder' | 'k'>;
  readings: number;
  analysis: SeriesAnalysis;
}

/** What the verdicts come to; every rate is between 0 and 1. */
export interface VerdictRates {
  wells: number;
  /** Wells by truth and verdict. */
  table: Record<Truth, Partial<Record<Verdict, number>>>;
  /** Wells of a simple order of which another one is asserted. */
  otherSimpleOrder: number;
  /** Wells of a simple order that are told right. */
  right: number;
  /** The same of wells with conversion ≥ 0.7, noise ≤ 2 % and 15 readings or more. */
  rightOfGood: number;
  /** Order assertions over all truths that are wrong … */
  wrongOrders: number;
  /** … when a saturating well may be called by the limit that it is near. */
  wrongOrdersBesideLimits: number;
  /** Assertions of the saturating law that are wrong. */
  wrongSaturating: number;
  /** Saturating wells that are told as such. */
  saturatingFound: number;
  /** Dead wells kept as such. */
  deadKept: number;
  /** 95 % intervals of k that hold it, after the verdict. */
  coverageAfterVerdict: number;
}

const ORDERS: readonly string[] = SIMPLE_TRUTHS;
/** A saturating well with a mean local order up to here may be called zero order … */
const NEAR_ZERO = 0.25;
/** … and one from here on first order. */
const NEAR_FIRST = 0.75;

/** A simulated well as the engine takes it. */
export function seriesOf(
  { timesS, values }: Pick<SimulatedWell, 'timesS' | 'values'>,
  law: LawRequest = 'auto',
): DecaySeries {
  return {
    id: '1',
    catalyst: '1',
    role: 'sample',
    block: null,
    temperatureK: 333.15,
    timesS,
    values,
    dimension: 'concentration',
    kind: 'reactant',
    initialConcentration: null,
    productPerReactant: 1,
    loadingGPerL: null,
    siteDensityMolPerKg: null,
    nu: 1,
    law,
  };
}

/** Lets the engine judge a well as it would judge any other. */
export function judgeWell(well: SimulatedWell): JudgedWell {
  return { well, readings: well.timesS.length, analysis: analyseSeries(seriesOf(well)) };
}

function isLimit({ truth, meanLocalOrder }: JudgedWell['well'], verdict: Verdict): boolean {
  if (truth !== 'saturating' || meanLocalOrder === null) return false;
  return (
    (verdict === 'zero' && meanLocalOrder <= NEAR_ZERO) ||
    (verdict === 'first' && meanLocalOrder >= NEAR_FIRST)
  );
}

/** True when an interval of k holds the true one. */
export function holdsK({ k }: SeriesAnalysis, truth: number): boolean {
  return k?.low != null && k.high !== null && k.low <= truth && truth <= k.high;
}

/** Counts verdicts against truths. */
export function rateVerdicts(judged: readonly JudgedWell[]): VerdictRates {
  const table = Object.fromEntries(TRUTHS.map((truth) => [truth, {}])) as VerdictRates['table'];
  for (const { well, analysis } of judged) {
    const row = table[well.truth];
    row[analysis.verdict] = (row[analysis.verdict] ?? 0) + 1;
  }
  const share = (part: readonly JudgedWell[], of: (one: JudgedWell) => boolean) =>
    part.length === 0 ? NaN : part.filter(of).length / part.length;
  const isRight = ({ well, analysis }: JudgedWell) => analysis.verdict === well.truth;
  const simple = judged.filter(({ well }) => SIMPLE_TRUTHS.includes(well.truth));
  const good = simple.filter(
    ({ well, readings }) => well.conversion >= 0.7 && well.noise <= 0.02 && readings >= 15,
  );
  const orders = judged.filter(({ analysis }) => ORDERS.includes(analysis.verdict));
  const saturating = judged.filter(({ analysis }) => analysis.verdict === 'saturating');
  return {
    wells: judged.length,
    table,
    otherSimpleOrder: share(
      simple,
      (one) => ORDERS.includes(one.analysis.verdict) && !isRight(one),
    ),
    right: share(simple, isRight),
    rightOfGood: share(good, isRight),
    wrongOrders: share(orders, (one) => !isRight(one)),
    wrongOrdersBesideLimits: share(
      orders,
      (one) => !isRight(one) && !isLimit(one.well, one.analysis.verdict),
    ),
    wrongSaturating: share(saturating, (one) => !isRight(one)),
    saturatingFound: share(
      judged.filter(({ well }) => well.truth === 'saturating'),
      isRight,
    ),
    deadKept: share(
      judged.filter(({ well }) => well.truth === 'none'),
      ({ analysis }) => analysis.verdict === 'no-reaction',
    ),
    coverageAfterVerdict: share(
      simple.filter((one) => isRight(one)),
      ({ well, analysis }) => holdsK(analysis, well.k!),
    ),
  };
}

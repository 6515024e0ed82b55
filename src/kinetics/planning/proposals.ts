import { countTemperatures, setTemperatures } from '../catalyst/temperatures';
import type { CatalystAnalysis, Verdict } from '../types';
import type { TemperatureRange } from './discriminatingTemperature';
import type { SamplingLimits } from './samplingTimes';
import { detectReaction } from './detectReaction';
import { planForActivationEnergy, TARGET_EA_HALF_WIDTH } from './planForActivationEnergy';
import { TARGET_RATE_HALF_WIDTH } from './planForRateConstant';
import type { PlannedWell } from './plannedWell';
import { RANGE_BEYOND_MEASURED_K, type PlanningOptions, type Proposal } from './proposal';
import { tellLawsApart } from './tellLawsApart';
import { tightenRateConstant } from './tightenRateConstant';

/** Wells read at leisure can be read about twice as often. */
const UNHURRIED = 0.5;
/** Readings of a well that usually decide an order. */
const READINGS_FOR_ORDER = 8;
/** J/mol: beyond this half width the constants themselves are not measured, so no line is planned. */
const WIDEST_EA = 500_000;
/** Temperatures that give Ea an interval. */
const TEMPERATURES_FOR_EA = 3;

/**
 * What to run next for one catalyst: for each thing that its wells leave open or wide, the readings
 * or temperatures expected to settle it. What settles the verdict comes first.
 *
 * @param wells its wells with the times of their usable readings
 * @returns empty for a settled catalyst
 */
export function proposals(
  catalyst: CatalystAnalysis,
  wells: readonly PlannedWell[],
  options: PlanningOptions = {},
): Proposal[] {
  const own = wells.filter(({ analysis }) => catalyst.seriesIds.includes(analysis.id));
  if (own.length === 0) return [];
  const limits: SamplingLimits = {
    shortestIntervalS: options.shortestIntervalS ?? shortestInterval(own),
    longestRunS: options.longestRunS ?? null,
  };
  const range = options.temperatureRangeK ?? rangeBeyond(own);
  const { warnings } = catalyst;
  const plans: Proposal[] = [];
  if (isOpen(catalyst.verdict)) plans.push(...tellOrder(catalyst, own, limits, range));
  if (catalyst.verdict === 'no-reaction' || warnings.includes('reacts-only-together')) {
    plans.push(...detectReaction(own, range, limits));
  }
  if (warnings.includes('few-wells')) plans.push(...repeatOnlyWell(own));
  if (isAsserted(catalyst.verdict)) {
    const target = options.rateTarget ?? TARGET_RATE_HALF_WIDTH;
    plans.push(...tightenRateConstant(catalyst, own, limits, target));
  }
  plans.push(...tightenEnergy(catalyst, own, range, options));
  if (warnings.includes('blank-reacts')) {
    const gross = reacting(own).filter(({ analysis }) => analysis.net === null);
    const temperaturesK = temperaturesOf(gross.length > 0 ? gross : reacting(own));
    plans.push({ code: 'run-blanks', temperaturesK });
  }
  return plans;
}

function isOpen(verdict: Verdict): boolean {
  return verdict === 'undetermined' || verdict === 'unusable';
}

function isAsserted(verdict: Verdict): boolean {
  return verdict === 'zero' || verdict === 'first' || verdict === 'second' || verdict === 'forced';
}

const reacting = (wells: readonly PlannedWell[]) =>
  wells.filter(({ analysis: { verdict } }) => verdict !== 'no-reaction' && verdict !== 'unusable');

function tellOrder(
  catalyst: CatalystAnalysis,
  wells: readonly PlannedWell[],
  limits: SamplingLimits,
  range: TemperatureRange,
): Proposal[] {
  const enough = wells.filter(({ timesS }) => timesS.length >= 5);
  if (enough.length > 0) return tellLawsApart(catalyst, reacting(enough), limits, range);
  const fullest = wells.reduce((a, b) => (b.timesS.length > a.timesS.length ? b : a));
  return [
    {
      code: 'more-readings-per-well',
      seriesId: fullest.analysis.id,
      temperatureK: fullest.analysis.temperatureK,
      readings: fullest.timesS.length,
      needed: READINGS_FOR_ORDER,
    },
  ];
}

function repeatOnlyWell(wells: readonly PlannedWell[]): Proposal[] {
  const [only] = reacting(wells);
  if (only === undefined) return [];
  const { id, temperatureK } = only.analysis;
  return [{ code: 'repeat-only-well', seriesId: id, temperatureK }];
}

function tightenEnergy(
  catalyst: CatalystAnalysis,
  wells: readonly PlannedWell[],
  range: TemperatureRange,
  options: PlanningOptions,
): Proposal[] {
  const measuredK = temperaturesOf(reacting(wells));
  if (measuredK.length === 0) return [];
  if (measuredK.length < TEMPERATURES_FOR_EA) {
    const temperaturesK = furtherTemperatures(measuredK, range);
    return temperaturesK.length === 0
      ? []
      : [{ code: 'three-temperatures', measuredK, temperaturesK }];
  }
  const energy = catalyst.activationEnergy ?? catalyst.initialRateActivationEnergy;
  const target = options.activationEnergyTarget ?? TARGET_EA_HALF_WIDTH;
  const line = catalyst.arrhenius;
  if (line === null || energy === null || energy.high === null) return [];
  const halfWidth = energy.high - energy.value;
  if (halfWidth <= target || halfWidth > WIDEST_EA) return [];
  const plan = planForActivationEnergy(line, range, target);
  // A plan that hardly helps is none: then what scatters has to be found, not more of it measured.
  if (plan === null || plan.halfWidth > 0.9 * halfWidth) return [];
  const { halfWidth: expectedHalfWidth, ...runs } = plan;
  const repeats = countTemperatures([...measuredK, ...runs.temperaturesK]) === measuredK.length;
  return [
    { code: 'tighten-activation-energy', ...runs, halfWidth, expectedHalfWidth, target, repeats },
  ];
}

/** One temperature for each set one, ascending, K. */
function temperaturesOf(wells: readonly PlannedWell[]): number[] {
  const all = wells.map(({ analysis }) => analysis.temperatureK);
  const sets = setTemperatures(all);
  return all.filter((_, i) => sets.indexOf(sets[i]!) === i).sort((a, b) => a - b);
}

/** The ends and the middle of the range, farthest from what was measured first, until there are 3. */
function furtherTemperatures(
  measuredK: readonly number[],
  [low, high]: TemperatureRange,
): number[] {
  const middle = 2 / (1 / low + 1 / high);
  const added: number[] = [];
  for (let missing = TEMPERATURES_FOR_EA - measuredK.length; missing > 0; missing -= 1) {
    const known = [...measuredK, ...added];
    const distance = (t: number) => Math.min(...known.map((other) => Math.abs(other - t)));
    const next = [high, low, middle].reduce((a, b) => (distance(b) > distance(a) ? b : a));
    if (countTemperatures([...known, next]) === countTemperatures(known)) break;
    added.push(next);
  }
  return added.sort((a, b) => a - b);
}

function rangeBeyond(wells: readonly PlannedWell[]): TemperatureRange {
  const all = wells.map(({ analysis }) => analysis.temperatureK);
  return [
    Math.max(Math.min(...all) - RANGE_BEYOND_MEASURED_K, 1),
    Math.max(...all) + RANGE_BEYOND_MEASURED_K,
  ];
}

/** Share of the smallest gap between two readings that an instrument is taken to manage, s. */
function shortestInterval(wells: readonly PlannedWell[]): number {
  const gaps = wells.flatMap(({ timesS }) => timesS.slice(1).map((time, i) => time - timesS[i]!));
  const positive = gaps.filter((gap) => gap > 0);
  return positive.length > 0 ? UNHURRIED * Math.min(...positive) : 0;
}

import { SAME_TEMPERATURE_K, setTemperatures } from '../catalyst/temperatures';
import type { CatalystAnalysis } from '../types';
import { discriminatingTemperature, type TemperatureRange } from './discriminatingTemperature';
import { discriminatingTimes, type DiscriminatingTimes } from './discriminatingTimes';
import type { SamplingLimits } from './samplingTimes';
import type { PlannedWell } from './plannedWell';
import type { Proposal, TellLaws } from './proposal';

const CODE: Record<'repeat' | 'readings' | 'noise', TellLaws['code']> = {
  repeat: 'repeat-well',
  readings: 'more-readings',
  noise: 'lower-noise',
};

/** How little help comes before much: the first of these that a well offers is proposed. */
const EFFORT: Record<DiscriminatingTimes['by'], number> = {
  repeat: 0,
  time: 1,
  readings: 2,
  over: 3,
  bend: 4,
  noise: 5,
  none: 6,
};

interface WellPlan {
  well: PlannedWell;
  plan: DiscriminatingTimes;
}

const byEffort = (a: WellPlan, b: WellPlan) =>
  EFFORT[a.plan.by] - EFFORT[b.plan.by] || a.plan.lastS - b.plan.lastS;

/**
 * The run that settles an open order with the least effort: one well per temperature is planned
 * for, the one whose noise is in the middle of its replicates, and the temperature that needs the least is
 * proposed. All wells of a catalyst share their law, so one temperature can decide for all.
 *
 * @param wells reacting, with 5 readings or more
 */
export function tellLawsApart(
  catalyst: CatalystAnalysis,
  wells: readonly PlannedWell[],
  limits: SamplingLimits,
  range: TemperatureRange,
): Proposal[] {
  const sets = setTemperatures(wells.map(({ analysis }) => analysis.temperatureK));
  const plans = [...new Set(sets)].flatMap((set) => {
    const plan = middlePlan(
      wells.filter((_, i) => sets[i] === set),
      limits,
    );
    return plan === null ? [] : [plan];
  });
  plans.sort(byEffort);
  const [easiest] = plans;
  return easiest === undefined ? [] : [propose(catalyst, easiest, range)];
}

/** The plan of the well whose noise is in the middle of its replicates, else of one that has one. */
function middlePlan(wells: readonly PlannedWell[], limits: SamplingLimits): WellPlan | null {
  const usable = wells
    .filter(({ analysis }) => !analysis.warnings.includes('exact-fit'))
    .sort((a, b) => (a.analysis.residualSd ?? Infinity) - (b.analysis.residualSd ?? Infinity));
  const middle = usable.splice(Math.floor(usable.length / 2), 1);
  for (const well of [...middle, ...usable]) {
    const plan = discriminatingTimes(well, limits);
    if (plan !== null) return { well, plan };
  }
  return null;
}

function propose(
  catalyst: CatalystAnalysis,
  { well, plan }: WellPlan,
  range: TemperatureRange,
): Proposal {
  const { id: seriesId, temperatureK } = well.analysis;
  const { by, ...rest } = plan;
  const { lastS, readings, laws } = rest;
  switch (by) {
    case 'bend':
      return { code: 'follow-until-bent', seriesId, temperatureK, lastS, readings };
    case 'over': {
      const colderK = temperatureK - range[0] > SAME_TEMPERATURE_K ? range[0] : null;
      return { code: 'sample-earlier', seriesId, temperatureK, overByS: lastS, colderK };
    }
    case 'none':
      return { code: 'vary-concentration', seriesId, temperatureK, laws };
    case 'repeat':
    case 'noise':
      return { code: CODE[by], seriesId, temperatureK, ...rest, instead: null };
    case 'time':
    case 'readings': {
      const firstS = well.timesS[0]!;
      const longer = (lastS - firstS) / (well.timesS[well.timesS.length - 1]! - firstS);
      const instead =
        Math.abs(longer - 1) < 1e-9
          ? null
          : discriminatingTemperature(catalyst.arrhenius, temperatureK, longer, range);
      const code = by === 'readings' ? CODE[by] : longer > 1 ? 'sample-to' : 'sample-within';
      return { code, seriesId, temperatureK, ...rest, instead };
    }
  }
}

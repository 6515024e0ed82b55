import { setTemperatures } from '../catalyst/temperatures';
import { lawOfOrder } from '../rateLaws/registry';
import type { CatalystAnalysis } from '../types';
import { intervalFactor } from '../statistics/tDistribution';
import type { SamplingLimits } from './samplingTimes';
import { planForRateConstant } from './planForRateConstant';
import { expectedCurve, type PlannedWell } from './plannedWell';
import type { Proposal } from './proposal';

/** A plan must narrow the interval to this share of it, or it is not worth a run. */
const WORTH_A_RUN = 0.8;

/**
 * Sampling that ties the rate constant down, for the temperature whose wells have the widest
 * relative interval of kRel, where that is wider than the target in its best well.
 *
 * @param catalyst with an asserted or forced order
 * @param target half width of the 95 % interval over the value
 */
export function tightenRateConstant(
  catalyst: CatalystAnalysis,
  wells: readonly PlannedWell[],
  limits: SamplingLimits,
  target: number,
): Proposal[] {
  if (catalyst.order === null) return [];
  const law = lawOfOrder(catalyst.order);
  const known = wells.flatMap((well) => {
    const { verdict } = well.analysis;
    const fit = well.analysis.fits[law];
    if (verdict === 'no-reaction' || fit == null || fit.kRel === null || fit.kRelSe === null) {
      return [];
    }
    if (!(fit.kRel > 0) || fit.dof < 1) return [];
    return [{ well, halfWidth: (intervalFactor(fit.dof) * fit.kRelSe) / fit.kRel }];
  });
  const sets = setTemperatures(known.map(({ well }) => well.analysis.temperatureK));
  const bestOfEach = [...new Set(sets)].map((set) =>
    known.filter((_, i) => sets[i] === set).reduce((a, b) => (b.halfWidth < a.halfWidth ? b : a)),
  );
  const widest = bestOfEach.sort((a, b) => b.halfWidth - a.halfWidth)[0];
  if (widest === undefined || !(widest.halfWidth > target)) return [];

  const { well, halfWidth } = widest;
  const { id: seriesId, temperatureK } = well.analysis;
  const curve = expectedCurve(well.analysis, law);
  if (curve === null || well.analysis.warnings.includes('exact-fit')) return [];
  const firstS = well.timesS[0]!;
  const latest = limits.longestRunS ?? curve.originS + 2 / curve.kRel;
  const present = well.timesS.length;
  const plan = planForRateConstant(curve, present, firstS, latest, limits, target);
  if (plan === null || plan.relativeHalfWidth > WORTH_A_RUN * halfWidth) return [];
  return [
    {
      code: 'tighten-rate-constant',
      seriesId,
      temperatureK,
      law,
      relativeHalfWidth: halfWidth,
      expectedRelativeHalfWidth: plan.relativeHalfWidth,
      pointsS: plan.pointsS,
      timesS: plan.timesS,
      readings: plan.readings,
    },
  ];
}

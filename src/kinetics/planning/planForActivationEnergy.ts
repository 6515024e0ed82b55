import { lineThrough } from '../catalyst/weightedLine';
import { poolBlocks } from '../catalyst/fitArrhenius';
import { countTemperatures } from '../catalyst/temperatures';
import { GAS_CONSTANT } from '../constants';
import { intervalFactor } from '../statistics/tDistribution';
import type { ArrheniusLine } from '../types';
import type { TemperatureRange } from './discriminatingTemperature';

/** J/mol: half width of the 95 % interval of Ea that a choice between catalysts can rest on. */
export const TARGET_EA_HALF_WIDTH = 5000;

/** Runs that would bring the activation energy within a target. */
export interface ActivationEnergyPlan {
  /** K, ascending, one entry per further plate run; a run may repeat a temperature. */
  temperaturesK: number[];
  /** Wells of the catalyst in each of these runs. */
  replicates: number;
  /** J/mol, expected half width of the 95 % interval. */
  halfWidth: number;
  /** False when no plan tried reaches the target; the best of them stands here. */
  reachesTarget: boolean;
}

const MOST_REPLICATES = 4;
/** Fewest temperatures that give Ea an interval. */
const FEWEST_TEMPERATURES = 3;

/** What the errors of a further run will be. */
interface RunErrors {
  /** Variance of ln k of one well: fit and replicate together. */
  wellVariance: number;
  /** Variance between plate runs, τ². */
  runVariance: number;
}

/**
 * Which temperatures to add, and with how many wells, so that the 95 % interval of Ea is expected
 * to be within ± the target: the plan with the fewest wells.
 *
 * For a straight line the D-optimal design puts its points at the ends of the range (Atkinson,
 * Donev & Tobias, Optimum Experimental Designs, 2007), so the ends are tried, alone and together,
 * once and repeated, and the middle of 1/T where a third temperature is still wanting. Var(Ea) =
 * R² / Σ w (1/T − mean)², w = 1/(s²/m + τ²) per plate run of m wells, s² the variance of one well
 * and τ² that between runs; degrees of freedom as the engine counts them.
 */
export function planForActivationEnergy(
  line: ArrheniusLine,
  range: TemperatureRange,
  target = TARGET_EA_HALF_WIDTH,
): ActivationEnergyPlan | null {
  const slope = -line.activationEnergy / GAS_CONSTANT;
  const { means, replicateVariance } = poolBlocks(line.points, slope);
  const variances = line.points.map((point) => point.se ** 2).sort((a, b) => a - b);
  const errors: RunErrors = {
    wellVariance: variances[Math.floor(variances.length / 2)]! + replicateVariance,
    runVariance: line.tau ** 2,
  };
  const [low, high] = range;
  const middle = 2 / (1 / low + 1 / high);
  const choices = [[low], [high], [middle], [low, high], [low, low, high, high]];
  const measured = line.points.map((point) => point.temperatureK);
  const plans = choices
    .filter((added) => countTemperatures([...measured, ...added]) >= FEWEST_TEMPERATURES)
    .flatMap((temperaturesK) =>
      Array.from({ length: MOST_REPLICATES }, (_, i) => {
        const runs = { temperaturesK, replicates: i + 1 };
        return { ...runs, halfWidth: expectedHalfWidth(means, line.points.length, runs, errors) };
      }),
    )
    .filter(
      (plan): plan is typeof plan & { halfWidth: number } =>
        plan.halfWidth !== null && Number.isFinite(plan.halfWidth),
    );
  if (plans.length === 0) return null;
  const wells = (plan: (typeof plans)[number]) => plan.temperaturesK.length * plan.replicates;
  const reaching = plans
    .filter((plan) => plan.halfWidth <= target)
    .sort((a, b) => wells(a) - wells(b) || a.halfWidth - b.halfWidth);
  const best = reaching[0] ?? [...plans].sort((a, b) => a.halfWidth - b.halfWidth)[0]!;
  return { ...best, reachesTarget: reaching.length > 0 };
}

/**
 * Expected half width of the 95 % interval of Ea, J/mol, once further runs are added.
 *
 * @param means of the plate runs there are: 1/T and the variance of ln k
 * @param wells there are
 * @returns null without degrees of freedom
 */
export function expectedHalfWidth(
  means: readonly { x: number; variance: number }[],
  wells: number,
  { temperaturesK, replicates }: Pick<ActivationEnergyPlan, 'temperaturesK' | 'replicates'>,
  { wellVariance, runVariance }: RunErrors,
): number | null {
  const x = [
    ...means.map((mean) => mean.x),
    ...temperaturesK.map((temperature) => 1 / temperature),
  ];
  const weights = [
    ...means.map((mean) => 1 / (mean.variance + runVariance)),
    ...temperaturesK.map(() => 1 / (wellVariance / replicates + runVariance)),
  ];
  const { slopeVariance } = lineThrough(
    x,
    x.map(() => 0),
    weights,
  );
  const dof = (runVariance > 0 ? x.length : wells + temperaturesK.length * replicates) - 2;
  return dof < 1 ? null : GAS_CONSTANT * intervalFactor(dof) * Math.sqrt(slopeVariance);
}

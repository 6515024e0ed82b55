import { GAS_CONSTANT } from '../constants';
import type { ArrheniusPoint, WarningCode } from '../types';
import { RUN_TEMPERATURE_ERROR_K, testCurvature } from './curvature';
import { poolBlocks } from './fitArrhenius';
import type { PooledWell } from './pooledWell';
import { setTemperatures } from './temperatures';
import { lineThrough } from './weightedLine';

/** Set temperatures that two halves of a plot need. */
const FEWEST_TEMPERATURES = 4;
/** Upper over lower energy that counts as one half; 0.5 in theory (Thiele 1939). */
const HALF = { least: 0.3, most: 0.7 };
/** J/mol; below it transport to the particle is likelier than diffusion inside (common practice). */
const LEAST_INSIDE = 20_000;
/** Summed AICc that wells of the highest temperature must gain by loss of activity. */
const ACTIVITY_GAIN = 10;

/** What a bend of the Arrhenius plot, or the wells at its hot end, speak for. */
export function bendWarnings(
  wells: readonly PooledWell[],
  points: readonly ArrheniusPoint[],
): WarningCode[] {
  const warnings: WarningCode[] = [];
  const test = testCurvature(points, RUN_TEMPERATURE_ERROR_K);
  if (test?.curved) {
    warnings.push('arrhenius-curved');
    if (test.bends === 'up') warnings.push('arrhenius-bends-up');
    else warnings.push(halvesAbove(points) ? 'pore-diffusion' : 'arrhenius-bends-down');
  }
  if (losesActivityWhenHot(wells)) warnings.push('hot-wells-deactivate');
  return warnings;
}

/**
 * Whether the upper half of the temperatures has about half the activation energy of the lower, as
 * when diffusion in the pores sets the rate (Thiele 1939; Weisz & Prater 1954).
 */
function halvesAbove(points: readonly ArrheniusPoint[]): boolean {
  const sets = setTemperatures(points.map((point) => point.temperatureK));
  const count = Math.max(...sets) + 1;
  if (count < FEWEST_TEMPERATURES) return false;
  const middle = (count - 1) / 2;
  const lower = energyOf(points.filter((_, i) => sets[i]! <= middle));
  const upper = energyOf(points.filter((_, i) => sets[i]! >= middle));
  const ratio = upper / lower;
  return upper > LEAST_INSIDE && ratio > HALF.least && ratio < HALF.most;
}

/** J/mol of the straight line through the block means. */
function energyOf(points: readonly ArrheniusPoint[]): number {
  const { means } = poolBlocks(points, 0);
  const line = lineThrough(
    means.map(({ x }) => x),
    means.map(({ y }) => y),
    means.map(({ variance }) => 1 / variance),
  );
  return -GAS_CONSTANT * line.slope;
}

/**
 * Whether the wells of the highest temperature are described better by a first order that loses
 * activity than by any plain law, and those of the lower temperatures are not.
 */
function losesActivityWhenHot(wells: readonly PooledWell[]): boolean {
  const sets = setTemperatures(wells.map((well) => well.series.temperatureK));
  const hottest = Math.max(...sets);
  if (hottest < 1) return false;
  let [hot, cold] = [0, 0];
  wells.forEach(({ evidence }, i) => {
    const deactivating = evidence?.rivals.deactivating;
    if (deactivating === undefined) return;
    const rivals = [evidence!.rivals.plateau ?? Infinity, evidence!.rivals.order ?? Infinity];
    const plain = Math.min(...evidence!.laws.map((law) => law.aicc), ...rivals);
    if (sets[i] === hottest) hot += plain - deactivating;
    else cold += plain - deactivating;
  });
  return hot > ACTIVITY_GAIN && cold < 0;
}

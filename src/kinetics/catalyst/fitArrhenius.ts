import { GAS_CONSTANT } from '../constants';
import { estimate } from '../statistics/estimate';
import type { ArrheniusLine, ArrheniusPoint, Estimate } from '../types';
import { aboutLine, aboutMean, betweenVariance, weightedMean } from './betweenVariance';
import { countTemperatures, setTemperatures } from './temperatures';
import { lineThrough } from './weightedLine';

/** Errors of ln k below this are rounding, not information. */
const LEAST_SE = 1e-7;

/** The wells of one block, pooled. */
interface BlockMean {
  x: number;
  y: number;
  variance: number;
}

/** Block means and the scatter of replicates within blocks. */
export interface PooledBlocks {
  means: BlockMean[];
  /** Variance of ln k between replicates beyond their fit errors. */
  replicateVariance: number;
}

/**
 * Pools the replicates of each block. A block is what shares one temperature error: a plate run at
 * one set temperature.
 *
 * @param slope of ln k against 1/T, to compare replicates whose measured temperatures differ
 */
export function poolBlocks(points: readonly ArrheniusPoint[], slope: number): PooledBlocks {
  const sets = setTemperatures(points.map((point) => point.temperatureK));
  const blocks = new Map<string, { x: number[]; y: number[]; v: number[] }>();
  points.forEach((point, i) => {
    const key = `${point.block}\u0000${sets[i]!}`;
    const block = blocks.get(key) ?? { x: [], y: [], v: [] };
    block.x.push(1 / point.temperatureK);
    block.y.push(point.lnK);
    block.v.push(Math.max(point.se, LEAST_SE) ** 2);
    blocks.set(key, block);
  });
  const all = [...blocks.values()];
  const level = all.map((block) => block.y.map((y, i) => y - slope * (block.x[i]! - block.x[0]!)));
  const variances = all.flatMap((block) => block.v);
  const replicateDof = points.length - all.length;
  const replicateVariance = betweenVariance(
    (weights) => {
      let at = 0;
      return level.reduce((sum, values) => {
        const q = aboutMean(values, weights.slice(at, at + values.length));
        at += values.length;
        return sum + q;
      }, 0);
    },
    variances,
    replicateDof,
  );
  const means = all.map((block) => {
    const weights = block.v.map((v) => 1 / (v + replicateVariance));
    const total = weights.reduce((sum, w) => sum + w, 0);
    return {
      x: weightedMean(block.x, weights),
      y: weightedMean(block.y, weights),
      variance: 1 / total,
    };
  });
  return { means, replicateVariance };
}

/**
 * The apparent activation energy: ln k = ln k_c − (Ea/R)(1/T − 1/T_c), T_c the weighted harmonic
 * mean temperature, where ln k_c and Ea are uncorrelated.
 *
 * Replicates are pooled within their block with their own scatter, blocks with the scatter that
 * remains between them about the line, both as random effects. Where blocks scatter beyond their
 * replicates the degrees of freedom are those of the blocks, else those of the wells; variances are
 * never taken below what fit errors and replicates say (scale at least 1).
 *
 * @returns null below 2 temperatures. With 2 the energy has no interval.
 */
export function fitArrhenius(points: readonly ArrheniusPoint[]): ArrheniusLine | null {
  const temperatures = countTemperatures(points.map((point) => point.temperatureK));
  if (temperatures < 2) return null;
  const x = points.map((point) => 1 / point.temperatureK);
  const y = points.map((point) => point.lnK);
  const rough = lineThrough(
    x,
    y,
    x.map(() => 1),
  ).slope;
  const { means } = poolBlocks(points, rough);
  const blockX = means.map((mean) => mean.x);
  const blockY = means.map((mean) => mean.y);
  const variances = means.map((mean) => mean.variance);
  const blockDof = means.length - 2;
  const tau2 = betweenVariance((w) => aboutLine(blockX, blockY, w), variances, blockDof);
  const line = lineThrough(
    blockX,
    blockY,
    variances.map((variance) => 1 / (variance + tau2)),
  );
  const dof = degreesOfFreedom(points.length, means.length, tau2);
  const certain = dof > 0;
  const withInterval = certain && temperatures > 2;
  return {
    centreK: 1 / line.centre,
    lnKc: line.level,
    lnKcSe: certain ? Math.sqrt(line.levelVariance) : null,
    activationEnergy: -GAS_CONSTANT * line.slope,
    activationEnergySe: withInterval ? GAS_CONSTANT * Math.sqrt(line.slopeVariance) : null,
    covariance: withInterval ? 0 : null,
    dof,
    tau: Math.sqrt(tau2),
    points: [...points],
  };
}

/**
 * Degrees of freedom of the line's errors: those of the blocks once blocks scatter about the line
 * beyond their replicates, else those of the wells. In simulation (3 to 6 temperatures, 1 to 4
 * replicates) this covers 92 to 98 %; weighing the two by Satterthwaite's rule covers 88 to 97 %.
 */
function degreesOfFreedom(wells: number, blocks: number, tau2: number): number {
  return Math.max(tau2 > 0 ? blocks - 2 : wells - 2, 0);
}

/** ln k of the line at a temperature with its standard error; null se where it has none. */
export function lnRateConstantAt(
  line: ArrheniusLine,
  temperatureK: number,
): { lnK: number; se: number | null } {
  const reach = (1 / temperatureK - 1 / line.centreK) / GAS_CONSTANT;
  const lnK = line.lnKc - line.activationEnergy * reach;
  const { lnKcSe, activationEnergySe } = line;
  if (lnKcSe === null || activationEnergySe === null) return { lnK, se: null };
  const variance =
    lnKcSe ** 2 - 2 * reach * (line.covariance ?? 0) + (reach * activationEnergySe) ** 2;
  return { lnK, se: Math.sqrt(Math.max(variance, 0)) };
}

/** Ea in J/mol with its 95 % t interval. */
export function activationEnergyOf(line: ArrheniusLine): Estimate | null {
  return estimate(line.activationEnergy, line.activationEnergySe, line.dof);
}

/** ln A = ln k_c + Ea/(R T_c), in the unit of k. */
export function lnPreExponentialOf(line: ArrheniusLine): Estimate | null {
  const reach = 1 / (GAS_CONSTANT * line.centreK);
  const se =
    line.lnKcSe === null || line.activationEnergySe === null
      ? null
      : Math.sqrt(
          line.lnKcSe ** 2 +
            2 * reach * (line.covariance ?? 0) +
            (reach * line.activationEnergySe) ** 2,
        );
  return estimate(line.lnKc + line.activationEnergy * reach, se, line.dof);
}

import { estimate } from '../statistics/estimate';
import type { Estimate } from '../types';
import type { PooledWell } from './pooledWell';
import { setTemperatures } from './temperatures';

/** Loadings must span this much before they say anything of their effect. */
const LEAST_SPAN = 1.5;
const FEWEST_WELLS = 4;

/** A well of a mass series. */
export type MassWell = Pick<PooledWell, 'series' | 'analysis'>;

/**
 * How the rate grows with the catalyst loading where a screen varied it: m of r ∝ loadingᵐ over wells
 * of one temperature, initial rates on the logarithm. In the kinetic regime m is 1, and rates per
 * gram compare; below it something else than the catalyst limits the rate.
 *
 * @returns null below 4 wells, or where no temperature has loadings that span a factor of 1.5
 */
export function massOrder(wells: readonly MassWell[]): Estimate | null {
  const known = wells.flatMap(({ series, analysis }) => {
    const [loading, rate] = [series.loadingGPerL, analysis.initialRate?.value ?? null];
    return loading !== null && loading > 0 && rate !== null && rate > 0
      ? [{ temperatureK: series.temperatureK, x: Math.log(loading), y: Math.log(rate) }]
      : [];
  });
  const sets = setTemperatures(known.map(({ temperatureK }) => temperatureK));
  const groups = [...new Set(sets)].map((set) => known.filter((_, i) => sets[i] === set));
  const varied = groups.filter((group) => {
    const loadings = group.map(({ x }) => x);
    return Math.max(...loadings) - Math.min(...loadings) >= Math.log(LEAST_SPAN);
  });
  const count = varied.reduce((sum, group) => sum + group.length, 0);
  const dof = count - varied.length - 1;
  if (count < FEWEST_WELLS || dof < 1) return null;
  // Each temperature has a level of its own; the slope is shared.
  let [xx, xy, yy] = [0, 0, 0];
  for (const group of varied) {
    const mean = (of: (one: (typeof group)[number]) => number) =>
      group.reduce((sum, one) => sum + of(one), 0) / group.length;
    const [x, y] = [mean((one) => one.x), mean((one) => one.y)];
    for (const one of group) {
      xx += (one.x - x) ** 2;
      xy += (one.x - x) * (one.y - y);
      yy += (one.y - y) ** 2;
    }
  }
  const slope = xy / xx;
  const rest = Math.max(yy - slope * xy, 0);
  return estimate(slope, Math.sqrt(rest / dof / xx), dof);
}

/** True when the rate clearly grows less than in proportion to the loading. */
export const growsTooLittle = (order: Estimate | null) => order?.high != null && order.high < 0.9;

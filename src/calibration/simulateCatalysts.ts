import { GAS_CONSTANT } from '../kinetics';
import type { DecaySeries } from '../kinetics/types';
import type { RandomStream } from '../kinetics/statistics/randomStream';
import { reachOf, trueCurve, type Truth } from './truths';

/** How a simulated catalyst was screened. */
export interface CatalystPlan {
  truth: Truth;
  temperaturesK: readonly number[];
  replicates: number;
  readings: number;
  /** Standard deviation of a reading over C0. */
  noise: number;
  /** Standard deviation of ln k between replicates. */
  replicateSpread: number;
  /** K: standard deviation of the temperature of a plate run, which its wells share. */
  blockErrorK: number;
  /** J/mol. */
  activationEnergy: number;
}

/** The temperature at which every simulated catalyst converts the same. */
export const CENTRE_K = 333.15;
const C0 = 0.01;
const SPAN_S = 3600;

/** The wells of one catalyst, which convert 80 % at the centre. */
export function simulateCatalyst(plan: CatalystPlan, random: RandomStream): DecaySeries[] {
  const curve = trueCurve(plan.truth, { load: 4, level: 0.15, decay: 0.5 });
  const last = plan.truth === 'none' ? 0 : (reachOf(curve, 0.8) ?? 1);
  return plan.temperaturesK.flatMap((temperatureK) => {
    const actualK = temperatureK + plan.blockErrorK * random.normal();
    const factor = Math.exp((-plan.activationEnergy / GAS_CONSTANT) * (1 / actualK - 1 / CENTRE_K));
    return Array.from({ length: plan.replicates }, (_, replicate): DecaySeries => {
      const rate = (last / SPAN_S) * factor * Math.exp(plan.replicateSpread * random.normal());
      const timesS = Array.from(
        { length: plan.readings },
        (__, i) => (SPAN_S * i) / (plan.readings - 1),
      );
      return {
        id: `${temperatureK} ${replicate}`,
        catalyst: '1',
        role: 'sample',
        block: `${temperatureK}`,
        temperatureK,
        timesS,
        values: timesS.map((t) => C0 * (curve.relative(rate * t) + plan.noise * random.normal())),
        dimension: 'concentration',
        kind: 'reactant',
        initialConcentration: null,
        productPerReactant: 1,
        loadingGPerL: null,
        siteDensityMolPerKg: null,
        nu: 1,
        law: 'auto',
      };
    });
  });
}

/** k at the centre, in the unit of the truth's order; null without a whole order. */
export function trueCentreK(truth: Truth): number | null {
  const order = { zero: 0, first: 1, second: 2 }[truth as string];
  if (order === undefined) return null;
  const curve = trueCurve(truth, { load: 0, level: 0, decay: 1 });
  return (reachOf(curve, 0.8)! / SPAN_S) * C0 ** (1 - order);
}

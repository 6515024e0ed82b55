import type { RandomStream } from '../kinetics/statistics/randomStream';
import { reachOf, trueCurve, type Truth } from './truths';

/** A simulated well and what it really is. */
export interface SimulatedWell {
  truth: Truth;
  timesS: number[];
  /** mol/L. */
  values: number[];
  /** k in the unit of its order; null for truths without one. */
  k: number | null;
  /** True 1 − C(t_last)/C0. */
  conversion: number;
  /** Standard deviation of a reading over C0. */
  noise: number;
  /** Mean local order over the readings; only of the saturating law. */
  meanLocalOrder: number | null;
}

/** Where the settings of simulated wells lie. */
export interface Ranges {
  readings: readonly [number, number];
  conversion: readonly [number, number];
  /** Log-uniform. */
  noise: readonly [number, number];
  /** mol/L, log-uniform. */
  c0: readonly [number, number];
  /** K C0, log-uniform. */
  load: readonly [number, number];
  /** Share of C0 that stays, at most what the conversion leaves. */
  level: readonly [number, number];
  /** k_d/k, log-uniform. */
  decay: readonly [number, number];
}

/** Ranges that a screening laboratory meets, and some beyond. */
export const WIDE_RANGES: Ranges = {
  readings: [6, 80],
  conversion: [0.1, 0.99],
  noise: [0.002, 0.06],
  c0: [1e-4, 1],
  load: [0.3, 25],
  level: [0.05, 0.6],
  decay: [0.15, 7],
};

/** One well of a truth. */
export function simulateWell(truth: Truth, random: RandomStream, ranges: Ranges): SimulatedWell {
  const between = ([low, high]: readonly [number, number]) => low + (high - low) * random.uniform();
  const logBetween = ([low, high]: readonly [number, number]) =>
    low * (high / low) ** random.uniform();
  const c0 = logBetween(ranges.c0);
  const noise = logBetween(ranges.noise);
  const count = Math.round(between(ranges.readings));
  const wanted = between(ranges.conversion);
  const shape = {
    load: logBetween(ranges.load),
    level: Math.min(between(ranges.level), 0.95 * (1 - wanted)),
    decay: logBetween(ranges.decay),
  };
  // A dying catalyst stops at 1 − exp(−k/kd); beyond that it is run to its end.
  const curve = trueCurve(truth, shape);
  const ceiling = truth === 'deactivating' ? 0.98 * -Math.expm1(-1 / shape.decay) : 1;
  const last = truth === 'none' ? 1 : (reachOf(curve, Math.min(wanted, ceiling)) ?? 1);
  const spanS = logBetween([60, 1e5]);
  const kRel = last / spanS;
  const timesS = grid(count, spanS, random);
  const relatives = timesS.map((t) => curve.relative(kRel * t));
  const order = { zero: 0, first: 1, second: 2 }[truth as string];
  return {
    truth,
    timesS,
    values: relatives.map((relative) => c0 * (relative + noise * random.normal())),
    k: order === undefined ? null : kRel * c0 ** (1 - order),
    conversion: 1 - relatives[relatives.length - 1]!,
    noise,
    meanLocalOrder:
      curve.localOrder === undefined
        ? null
        : relatives.reduce((sum, w) => sum + curve.localOrder!(w), 0) / relatives.length,
  };
}

/** Sampling times from 0 to the end: even, jittered, geometric, or denser at the start. */
function grid(count: number, spanS: number, random: RandomStream): number[] {
  const kind = Math.floor(random.uniform() * 4);
  const steps = Array.from({ length: count }, (_, i) => i / (count - 1));
  if (kind === 1) {
    const width = 1 / (count - 1);
    return steps.map((x, i) =>
      i === 0 || i === count - 1 ? x * spanS : (x + (random.uniform() - 0.5) * 0.8 * width) * spanS,
    );
  }
  if (kind === 2) return steps.map((x) => (spanS * (20 ** x - 1)) / 19);
  if (kind === 3) return steps.map((x) => spanS * x ** 1.5);
  return steps.map((x) => x * spanS);
}

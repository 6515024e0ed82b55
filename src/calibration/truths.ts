/** What a simulated well really does. */
export type Truth =
  'zero' | 'first' | 'second' | 'saturating' | 'plateau' | 'deactivating' | 'none';

export const TRUTHS: readonly Truth[] = [
  'zero',
  'first',
  'second',
  'saturating',
  'plateau',
  'deactivating',
  'none',
];

/** The truths whose order is a whole number. */
export const SIMPLE_TRUTHS: readonly Truth[] = ['zero', 'first', 'second'];

/** C/C0 against u = r0 t/C0, written down from the differential equation, not from the engine. */
export interface TrueCurve {
  relative(u: number): number;
  /** Mean of d ln r/d ln C over relative concentrations; only where it is not a whole number. */
  localOrder?(relative: number): number;
}

/** What bends a curve that is no simple order. */
export interface Shape {
  /** K C0 of the saturating law. */
  load: number;
  /** Share of C0 that stays. */
  level: number;
  /** Deactivation rate over k. */
  decay: number;
}

/** The curve of a truth. */
export function trueCurve(truth: Truth, { load, level, decay }: Shape): TrueCurve {
  switch (truth) {
    case 'zero':
      return { relative: (u) => Math.max(1 - u, 0) };
    case 'first':
      return { relative: (u) => Math.exp(-u) };
    case 'second':
      return { relative: (u) => 1 / (1 + u) };
    case 'saturating':
      return {
        relative: (u) => solveSaturation(load, u),
        localOrder: (relative) => 1 / (1 + load * relative),
      };
    case 'plateau':
      return { relative: (u) => level + (1 - level) * Math.exp(-u) };
    case 'deactivating':
      return { relative: (u) => Math.exp(-(1 - Math.exp(-decay * u)) / decay) };
    case 'none':
      return { relative: () => 1 };
  }
}

/** w with ln w + L (w − 1) = −(1 + L) u, by halving ln w: slow, and right to the last digits. */
function solveSaturation(load: number, u: number): number {
  const target = -(1 + load) * u;
  let [low, high] = [target - 1, 0];
  for (let i = 0; i < 200 && high - low > 1e-15 * (1 + Math.abs(low)); i += 1) {
    const middle = (low + high) / 2;
    if (middle + load * Math.expm1(middle) < target) low = middle;
    else high = middle;
  }
  return Math.exp((low + high) / 2);
}

/** u at which a curve has converted X; null where it never does. */
export function reachOf(curve: TrueCurve, conversion: number): number | null {
  let [low, high] = [0, 1];
  while (1 - curve.relative(high) < conversion) {
    high *= 2;
    if (high > 1e4) return null;
  }
  for (let i = 0; i < 100; i += 1) {
    const middle = (low + high) / 2;
    if (1 - curve.relative(middle) < conversion) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

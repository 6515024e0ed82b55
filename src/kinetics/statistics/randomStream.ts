/** A seeded stream of random numbers; the same seed gives the same stream. */
export interface RandomStream {
  /** Uniform on [0, 1). */
  uniform(): number;
  /** Normal with mean 0 and standard deviation 1. */
  normal(): number;
  /** A new array in random order. */
  shuffle<T>(values: readonly T[]): T[];
}

/** Generator mulberry32 (public domain, T. Ettinger 2017), normals by Box & Muller (1958). */
export function randomStream(seed: number): RandomStream {
  let state = seed >>> 0;
  const uniform = () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
  return {
    uniform,
    normal: () => Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform()),
    shuffle: (values) =>
      values
        .map((value) => ({ value, rank: uniform() }))
        .sort((a, b) => a.rank - b.rank)
        .map(({ value }) => value),
  };
}

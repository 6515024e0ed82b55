/** An axis range on round numbers. */
export interface NiceScale {
  min: number;
  max: number;
  interval: number;
}

/**
 * A range that holds both ends, on steps of 1, 2 or 5 times a power of ten.
 *
 * @param low finite
 * @param high finite, at least `low`; equal ends are widened
 * @param steps about how many steps to make, at least 1
 */
export function niceScale(low: number, high: number, steps = 5): NiceScale {
  const span = high - low || Math.abs(high) || 1;
  const rough = span / steps;
  const magnitude = 10 ** Math.floor(Math.log10(rough));
  const mantissa = rough / magnitude;
  const interval =
    magnitude * (mantissa < 1.42 ? 1 : mantissa < 3.17 ? 2 : mantissa < 7.08 ? 5 : 10);
  const tidy = (value: number) => Number(value.toPrecision(12));
  let min = tidy(Math.floor(low / interval + 1e-9) * interval);
  let max = tidy(Math.ceil(high / interval - 1e-9) * interval);
  if (min === max) {
    min = tidy(min - interval);
    max = tidy(max + interval);
  }
  return { min, max, interval: tidy(interval) };
}

/** Smallest and largest of the finite values; null when there is none. */
export function extent(values: Iterable<number | null>): [number, number] | null {
  let low = Infinity;
  let high = -Infinity;
  for (const value of values) {
    if (value === null || !Number.isFinite(value)) continue;
    if (value < low) low = value;
    if (value > high) high = value;
  }
  return low <= high ? [low, high] : null;
}

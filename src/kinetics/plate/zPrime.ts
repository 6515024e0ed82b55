/** Mean and standard deviation (n − 1) of values; null below 2. */
function spreadOf(values: readonly number[]): { mean: number; sd: number } | null {
  const n = values.length;
  if (n < 2) return null;
  const mean = values.reduce((sum, value) => sum + value, 0) / n;
  const squares = values.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  return { mean, sd: Math.sqrt(squares / (n - 1)) };
}

/** Z′ = 1 − 3 (σ₊ + σ₋)/|μ₊ − μ₋| (Zhang, Chung & Oldenburg, J. Biomol. Screen. 1999, 4, 67). */
export function zPrimeOf(
  positive: { mean: number; sd: number },
  negative: { mean: number; sd: number },
): number | null {
  const distance = Math.abs(positive.mean - negative.mean);
  if (!(distance > 0)) return null;
  const value = 1 - (3 * (positive.sd + negative.sd)) / distance;
  return Number.isFinite(value) ? value : null;
}

/**
 * Z′ of a plate from the rates of its benchmark wells and of its blanks.
 *
 * @returns null below 2 wells of either kind, or where their means are equal
 */
export function zPrime(benchmarks: readonly number[], blanks: readonly number[]): number | null {
  const [positive, negative] = [spreadOf(benchmarks), spreadOf(blanks)];
  return positive === null || negative === null ? null : zPrimeOf(positive, negative);
}

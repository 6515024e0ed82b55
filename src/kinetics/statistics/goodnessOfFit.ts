/**
 * AICc of a least-squares fit: n ln(RSS/n) + 2K + 2K(K+1)/(n−K−1), K = parameters + 1 for the
 * noise variance (Hurvich & Tsai 1989; Burnham & Anderson 2002).
 *
 * @param rss residual sum of squares, any unit; only differences between fits of the same readings
 *   mean anything
 * @returns null when rss is 0 or there are fewer than K + 2 readings
 */
export function aicc(readings: number, rss: number, parameters: number): number | null {
  const k = parameters + 1;
  if (readings < k + 2 || !(rss > 0) || !Number.isFinite(rss)) return null;
  return readings * Math.log(rss / readings) + 2 * k + (2 * k * (k + 1)) / (readings - k - 1);
}

/** Akaike weights exp(−Δ/2)/Σ; an entry of −Infinity (exact fit) shares all weight. */
export function akaikeWeights(values: readonly number[]): number[] {
  const best = Math.min(...values);
  const raw = values.map((value) =>
    value === best ? 1 : best === -Infinity ? 0 : Math.exp((best - value) / 2),
  );
  const total = raw.reduce((sum, value) => sum + value, 0);
  return raw.map((value) => value / total);
}

/** exp(Δ/2): how many times more support the first has than the second. */
export function evidenceRatio(better: number, worse: number): number {
  if (better === worse) return 1;
  return Math.exp((worse - better) / 2);
}

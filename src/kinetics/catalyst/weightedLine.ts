/** A weighted straight line y = level + slope (x − centre). */
export interface WeightedLine {
  /** Weighted mean of x: there level and slope are uncorrelated. */
  centre: number;
  level: number;
  slope: number;
  /** Variances for weights that are reciprocal variances. */
  levelVariance: number;
  slopeVariance: number;
  /** Weighted residual sum of squares. */
  chi2: number;
  dof: number;
}

/**
 * Weighted least squares of a straight line in centred form.
 *
 * @param x at least 2 distinct values; @param weights above 0, reciprocal variances
 */
export function lineThrough(
  x: readonly number[],
  y: readonly number[],
  weights: readonly number[],
): WeightedLine {
  let [w, wx, wy] = [0, 0, 0];
  for (let i = 0; i < x.length; i += 1) {
    w += weights[i]!;
    wx += weights[i]! * x[i]!;
    wy += weights[i]! * y[i]!;
  }
  const centre = wx / w;
  const level = wy / w;
  let [xx, xy] = [0, 0];
  for (let i = 0; i < x.length; i += 1) {
    const d = x[i]! - centre;
    xx += weights[i]! * d * d;
    xy += weights[i]! * d * (y[i]! - level);
  }
  const slope = xy / xx;
  let chi2 = 0;
  for (let i = 0; i < x.length; i += 1) {
    chi2 += weights[i]! * (y[i]! - level - slope * (x[i]! - centre)) ** 2;
  }
  return {
    centre,
    level,
    slope,
    levelVariance: 1 / w,
    slopeVariance: 1 / xx,
    chi2,
    dof: x.length - 2,
  };
}

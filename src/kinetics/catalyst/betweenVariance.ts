import { lineThrough } from './weightedLine';

const MOST_ITERATIONS = 200;

/**
 * Variance τ² that a set of values scatters with beyond their own errors: the root of
 * Q(τ²) = degrees of freedom, weights 1/(v + τ²) (Paule & Mandel 1982; the iterated form of
 * DerSimonian & Laird 1986, whose value is its first step).
 *
 * @param q weighted sum of squares about the fitted model, for given weights
 * @param variances of the values, above 0
 * @returns 0 when the values scatter no more than their errors say
 */
export function betweenVariance(
  q: (weights: readonly number[]) => number,
  variances: readonly number[],
  dof: number,
): number {
  if (!(dof > 0)) return 0;
  const excess = (tau2: number) => q(variances.map((v) => 1 / (v + tau2))) - dof;
  if (!(excess(0) > 0)) return 0;
  let low = 0;
  let high = Math.max(...variances);
  while (excess(high) > 0 && high < 1e6) high *= 4;
  for (let i = 0; i < MOST_ITERATIONS && high - low > 1e-10 * high; i += 1) {
    const middle = (low + high) / 2;
    if (excess(middle) > 0) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** The method-of-moments estimate of DerSimonian & Laird (1986), of a common mean. */
export function momentVariance(values: readonly number[], variances: readonly number[]): number {
  const w = variances.map((v) => 1 / v);
  const sum = w.reduce((s, value) => s + value, 0);
  const squares = w.reduce((s, value) => s + value * value, 0);
  const q = aboutMean(values, w);
  return Math.max(0, (q - (values.length - 1)) / (sum - squares / sum));
}

/** Weighted mean. */
export function weightedMean(values: readonly number[], weights: readonly number[]): number {
  let [sum, total] = [0, 0];
  values.forEach((value, i) => {
    sum += weights[i]! * value;
    total += weights[i]!;
  });
  return sum / total;
}

/** Weighted sum of squares about the weighted mean. */
export function aboutMean(values: readonly number[], weights: readonly number[]): number {
  const mean = weightedMean(values, weights);
  return values.reduce((sum, value, i) => sum + weights[i]! * (value - mean) ** 2, 0);
}

/** Weighted sum of squares about the weighted straight line. */
export function aboutLine(
  x: readonly number[],
  y: readonly number[],
  weights: readonly number[],
): number {
  return lineThrough(x, y, weights).chi2;
}

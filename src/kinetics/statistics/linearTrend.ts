import { SimpleLinearRegression } from 'ml-regression';

/** A straight line with the standard error of its slope. */
export interface LinearTrend {
  slope: number;
  /** Value at x = 0. */
  intercept: number;
  /** Null below 3 readings. */
  slopeSe: number | null;
  interceptSe: number | null;
  rss: number;
  dof: number;
}

/**
 * Ordinary least squares of y on x, centred before the regression so that a large offset of the
 * clock costs no digits.
 *
 * @param x at least 2 distinct values
 * @throws RangeError when all x are equal or lengths differ
 */
export function linearTrend(x: readonly number[], y: readonly number[]): LinearTrend {
  if (x.length !== y.length) {
    throw new RangeError(`x and y must have one length, got ${x.length} and ${y.length}`);
  }
  const mean = (values: readonly number[]) => values.reduce((s, v) => s + v / values.length, 0);
  const xMean = mean(x);
  const yMean = mean(y);
  const dx = x.map((value) => value - xMean);
  const dy = y.map((value) => value - yMean);
  const sxx = dx.reduce((sum, value) => sum + value * value, 0);
  if (!(sxx > 0)) throw new RangeError('x must hold at least 2 distinct values');
  const line = new SimpleLinearRegression(dx, dy);
  const rss = dx.reduce((sum, value, i) => sum + (dy[i]! - line.predict(value)) ** 2, 0);
  const dof = x.length - 2;
  const variance = dof > 0 ? rss / dof : null;
  return {
    slope: line.slope,
    intercept: yMean + line.intercept - line.slope * xMean,
    slopeSe: variance === null ? null : Math.sqrt(variance / sxx),
    interceptSe:
      variance === null ? null : Math.sqrt(variance * (1 / x.length + (xMean * xMean) / sxx)),
    rss,
    dof,
  };
}

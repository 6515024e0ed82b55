/** A curve y(t; p): returns the value and writes ∂y/∂p into `gradient`. */
export type CurveModel = (p: readonly number[], t: number, gradient: number[]) => number;

export interface LeastSquaresFit {
  parameters: number[];
  rss: number;
  /** (JᵀJ)⁻¹ at the optimum; null where it is singular. */
  inverse: number[][] | null;
}

const MOST_ITERATIONS = 60;
/** Relative fall of the sum of squares below which the search stops, unless told otherwise. */
const SMALLEST_GAIN = 1e-12;

/**
 * Solves M x = b for a symmetric positive definite M by Cholesky's method; null where M is not.
 */
export function solvePositive(
  matrix: readonly number[][],
  right: readonly number[],
): number[] | null {
  const n = right.length;
  const l = matrix.map((row) => row.slice());
  for (let j = 0; j < n; j += 1) {
    for (let i = j; i < n; i += 1) {
      let sum = matrix[i]![j]!;
      for (let k = 0; k < j; k += 1) sum -= l[i]![k]! * l[j]![k]!;
      if (i === j) {
        if (!(sum > 1e-13 * matrix[j]![j]!)) return null;
        l[j]![j] = Math.sqrt(sum);
      } else l[i]![j] = sum / l[j]![j]!;
    }
  }
  const x = right.slice();
  for (let i = 0; i < n; i += 1) {
    for (let k = 0; k < i; k += 1) x[i]! -= l[i]![k]! * x[k]!;
    x[i]! /= l[i]![i]!;
  }
  for (let i = n - 1; i >= 0; i -= 1) {
    for (let k = i + 1; k < n; k += 1) x[i]! -= l[k]![i]! * x[k]!;
    x[i]! /= l[i]![i]!;
  }
  return x;
}

/** Inverse of a symmetric positive definite matrix; null where it is not. */
export function invertPositive(matrix: readonly number[][]): number[][] | null {
  const columns = matrix.map((_, j) =>
    solvePositive(
      matrix,
      matrix.map((__, i) => (i === j ? 1 : 0)),
    ),
  );
  return columns.every((column) => column !== null) ? columns : null;
}

/**
 * Nonlinear least squares with an analytic gradient (Levenberg 1944; Marquardt 1963), for the
 * three-parameter curves that have no closed profile.
 *
 * @param keep brings a trial point back into its allowed range, in place
 * @param smallestGain relative fall of the sum of squares below which the search stops
 */
export function fitCurve(
  model: CurveModel,
  t: ArrayLike<number>,
  y: ArrayLike<number>,
  start: readonly number[],
  keep: (p: number[]) => void = () => undefined,
  smallestGain = SMALLEST_GAIN,
): LeastSquaresFit {
  const size = start.length;
  const gradient = new Array<number>(size).fill(0);
  const rssOf = (p: readonly number[]) => {
    let rss = 0;
    for (let i = 0; i < t.length; i += 1) rss += (y[i]! - model(p, t[i]!, gradient)) ** 2;
    return Number.isFinite(rss) ? rss : Infinity;
  };
  const normal = (p: readonly number[]) => {
    const matrix = start.map(() => new Array<number>(size).fill(0));
    const right = new Array<number>(size).fill(0);
    for (let i = 0; i < t.length; i += 1) {
      const residual = y[i]! - model(p, t[i]!, gradient);
      for (let a = 0; a < size; a += 1) {
        right[a]! += gradient[a]! * residual;
        for (let b = 0; b < size; b += 1) matrix[a]![b]! += gradient[a]! * gradient[b]!;
      }
    }
    return { matrix, right };
  };

  let p = start.slice();
  let rss = rssOf(p);
  let damping = 1e-3;
  for (let i = 0; i < MOST_ITERATIONS && damping < 1e10; i += 1) {
    const { matrix, right } = normal(p);
    let improved = false;
    let gain = 0;
    while (!improved && damping < 1e10) {
      const damped = matrix.map((row, a) =>
        row.map((value, b) => (a === b ? value * (1 + damping) + 1e-300 : value)),
      );
      const step = solvePositive(damped, right);
      if (step !== null) {
        const trial = p.map((value, a) => value + step[a]!);
        keep(trial);
        const height = rssOf(trial);
        if (height < rss) {
          gain = (rss - height) / rss;
          [p, rss, improved] = [trial, height, true];
        }
      }
      damping = improved ? Math.max(damping / 8, 1e-12) : damping * 6;
    }
    if (!improved || gain < smallestGain) break;
  }
  return { parameters: p, rss, inverse: invertPositive(normal(p).matrix) };
}

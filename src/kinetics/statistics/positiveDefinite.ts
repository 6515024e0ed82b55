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

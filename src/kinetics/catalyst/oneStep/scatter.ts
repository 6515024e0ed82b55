import type { OneStepSolution } from './solveOneStep';

/** Variances of one constant's ln beyond the errors of its readings. */
export interface Scatter {
  /** Between replicates of a block. */
  replicate: number;
  /** Between blocks. */
  block: number;
}

/**
 * Covariance of the shared constants where wells and blocks scatter by themselves: the readings'
 * own covariance on both sides of what readings, replicates and blocks put into the normal
 * equations (White 1980; Liang & Zeger 1986, with the variances of the random effects instead of
 * their few residuals: with four or five blocks those residuals are too few for their own sum).
 *
 * @param x of the wells; @param blocks which wells share one temperature error
 * @param scatter of each constant
 * @returns null where the readings' covariance is singular
 */
export function covarianceWithScatter(
  { covariance, information }: OneStepSolution,
  x: readonly number[],
  blocks: readonly string[],
  scatter: readonly Scatter[],
): number[][] | null {
  if (covariance === null) return null;
  const p = covariance.length;
  const variance = covariance.map((row) => [...row]);
  // A change e of a well's (or of all the block's) ln constant j moves the shared ones by B A e.
  const add = (wells: readonly number[], j: number, extra: number) => {
    if (!(extra > 0)) return;
    const pull = new Array<number>(p).fill(0);
    for (const i of wells) {
      information[i]!.forEach((row, a) => {
        pull[2 * a]! += row[j]!;
        pull[2 * a + 1]! += row[j]! * x[i]!;
      });
    }
    const moved = covariance.map((row) => row.reduce((sum, b, a) => sum + b * pull[a]!, 0));
    moved.forEach((m, a) => moved.forEach((n, b) => (variance[a]![b]! += extra * m * n)));
  };
  const members = new Map<string, number[]>();
  blocks.forEach((block, i) => members.set(block, [...(members.get(block) ?? []), i]));
  scatter.forEach(({ replicate, block }, j) => {
    x.forEach((_, i) => add([i], j, replicate));
    for (const wells of members.values()) add(wells, j, block);
  });
  return variance;
}

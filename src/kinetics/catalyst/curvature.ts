import { invertPositive } from '../statistics/positiveDefinite';
import { fUpperTail } from '../statistics/tDistribution';
import type { ArrheniusPoint } from '../types';
import { poolBlocks } from './fitArrhenius';
import { countTemperatures } from './temperatures';
import { lineThrough } from './weightedLine';

/** Chance that a straight Arrhenius plot is called curved. */
const CURVATURE_LEVEL = 0.05;

/** Quadratic in 1/T against the straight line. */
export interface CurvatureTest {
  f: number;
  dof: number;
  p: number;
  curved: boolean;
}

/**
 * F test of a quadratic in 1/T against the straight Arrhenius line, over all wells, weights
 * 1/(se² + replicate variance), residual variance estimated (Draper & Smith 1998).
 *
 * @returns null below 3 temperatures or without a degree of freedom
 */
export function testCurvature(points: readonly ArrheniusPoint[]): CurvatureTest | null {
  const dof = points.length - 3;
  if (dof < 1 || countTemperatures(points.map((point) => point.temperatureK)) < 3) return null;
  const x = points.map((point) => 1 / point.temperatureK);
  const y = points.map((point) => point.lnK);
  const rough = lineThrough(
    x,
    y,
    x.map(() => 1),
  );
  const { replicateVariance } = poolBlocks(points, rough.slope);
  const weights = points.map((point) => 1 / (Math.max(point.se, 1e-7) ** 2 + replicateVariance));
  const straight = lineThrough(x, y, weights);
  const spread = Math.max(...x.map((value) => Math.abs(value - straight.centre)));
  const gain = quadraticGain(
    x.map((value) => (value - straight.centre) / spread),
    y.map((value, i) => value - straight.level - straight.slope * (x[i]! - straight.centre)),
    weights,
  );
  if (gain === null) return null;
  const rest = Math.max(straight.chi2 - gain, 0);
  const f = rest > 0 ? gain / (rest / dof) : 0;
  const p = fUpperTail(f, 1, dof);
  return { f, dof, p, curved: p < CURVATURE_LEVEL };
}

/** How much the weighted sum of squares of residuals falls by a quadratic. */
function quadraticGain(
  z: readonly number[],
  residuals: readonly number[],
  weights: readonly number[],
): number | null {
  const rows = z.map((value) => [1, value, value * value]);
  const normal = [0, 1, 2].map((a) =>
    [0, 1, 2].map((b) => rows.reduce((sum, row, i) => sum + weights[i]! * row[a]! * row[b]!, 0)),
  );
  const right = [0, 1, 2].map((a) =>
    rows.reduce((sum, row, i) => sum + weights[i]! * row[a]! * residuals[i]!, 0),
  );
  const inverse = invertPositive(normal);
  if (inverse === null) return null;
  return right.reduce(
    (sum, ra, a) => sum + ra * right.reduce((s, rb, b) => s + inverse[a]![b]! * rb, 0),
    0,
  );
}

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
  /** Whether the plot falls below the straight line at both ends, or rises above it. */
  bends: 'down' | 'up';
  curved: boolean;
}

/** K: how far a plate run may lie from the temperature it was set to (common practice). */
export const RUN_TEMPERATURE_ERROR_K = 0.5;

/**
 * F test of a quadratic in 1/T against the straight Arrhenius line, residual variance estimated
 * (Draper & Smith 1998).
 *
 * Wells of a run share the error of its temperature, (Ea/RT²) δT in ln k, which bends a plot of few
 * temperatures by itself. With an error given, runs count as one point each, and the scatter is
 * never taken below what their errors say.
 *
 * F alone decides. AICc of the two curves asks for F above 11 with 8 wells, which hides plain bends,
 * and for no more than 2.7 with 24, which straight plots pass in 11 of 100 cases.
 *
 * @param temperatureErrorK δT; 0 takes wells as independent, weights 1/(se² + replicate variance)
 * @returns null below 3 temperatures or without a degree of freedom
 */
export function testCurvature(
  points: readonly ArrheniusPoint[],
  temperatureErrorK = 0,
): CurvatureTest | null {
  const dof = points.length - 3;
  if (dof < 1 || countTemperatures(points.map((point) => point.temperatureK)) < 3) return null;
  const rough = lineThrough(
    points.map((point) => 1 / point.temperatureK),
    points.map((point) => point.lnK),
    points.map(() => 1),
  );
  const { means, replicateVariance } = poolBlocks(points, rough.slope);
  const shared = temperatureErrorK > 0;
  const used = shared
    ? means.map(({ x, y, variance }) => ({
        x,
        y,
        variance: variance + (rough.slope * x * x * temperatureErrorK) ** 2,
      }))
    : points.map((point) => ({
        x: 1 / point.temperatureK,
        y: point.lnK,
        variance: Math.max(point.se, 1e-7) ** 2 + replicateVariance,
      }));
  const weights = used.map(({ variance }) => 1 / variance);
  const straight = lineThrough(
    used.map(({ x }) => x),
    used.map(({ y }) => y),
    weights,
  );
  const spread = Math.max(...used.map(({ x }) => Math.abs(x - straight.centre)));
  const quadratic = fitQuadratic(
    used.map(({ x }) => (x - straight.centre) / spread),
    used.map(({ x, y }) => y - straight.level - straight.slope * (x - straight.centre)),
    weights,
  );
  if (quadratic === null) return null;
  const { gain } = quadratic;
  const rest = Math.max(straight.chi2 - gain, 0);
  const restDof = used.length - 3;
  const scatter = restDof > 0 ? rest / restDof : 0;
  const scale = shared ? Math.max(scatter, 1) : scatter;
  const f = scale > 0 ? gain / scale : 0;
  const p = fUpperTail(f, 1, dof);
  return {
    f,
    dof,
    p,
    bends: quadratic.bend < 0 ? 'down' : 'up',
    curved: p < CURVATURE_LEVEL,
  };
}

/** How much the weighted sum of squares of residuals falls by a quadratic, and its last term. */
function fitQuadratic(
  z: readonly number[],
  residuals: readonly number[],
  weights: readonly number[],
): { gain: number; bend: number } | null {
  const rows = z.map((value) => [1, value, value * value]);
  const normal = [0, 1, 2].map((a) =>
    [0, 1, 2].map((b) => rows.reduce((sum, row, i) => sum + weights[i]! * row[a]! * row[b]!, 0)),
  );
  const right = [0, 1, 2].map((a) =>
    rows.reduce((sum, row, i) => sum + weights[i]! * row[a]! * residuals[i]!, 0),
  );
  const inverse = invertPositive(normal);
  if (inverse === null) return null;
  const terms = inverse.map((row) => row.reduce((sum, value, b) => sum + value * right[b]!, 0));
  return { gain: terms.reduce((sum, term, a) => sum + term * right[a]!, 0), bend: terms[2]! };
}

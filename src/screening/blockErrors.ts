import { aboutLine, betweenVariance } from '../kinetics/catalyst/betweenVariance';
import { lnRateConstantAt, poolBlocks } from '../kinetics/catalyst/fitArrhenius';
import { setTemperatures } from '../kinetics/catalyst/temperatures';
import { GAS_CONSTANT } from '../kinetics/constants';
import type { ArrheniusLine } from '../kinetics/types';
import type { LogError } from './logError';
import type { BlockError, ErrorParts } from './ranks';

/** What is known of one candidate's ln x at the reference temperature. */
export interface RankedLine {
  /** Keeps blocks of one name in different screens apart. */
  screenId: string;
  /** Null where its wells make none: then its error is all its own. */
  line: ArrheniusLine | null;
  /** Error of ln x as its 95 % interval has it; null without one. */
  error: LogError | null;
}

/** The errors of a ranking, split into what candidates share and what they do not. */
export interface SplitErrors {
  /** K: standard deviation of a block's temperature error, and its degrees of freedom. */
  shared: BlockError;
  /** Aligned with the candidates; loadings in 1/K. */
  parts: (ErrorParts | null)[];
}

/** One candidate in one block. */
interface BlockView {
  key: string;
  x: number;
  y: number;
  variance: number;
  /** d ln k/dT = Ea/(R T²), 1/K. */
  perKelvin: number;
  residual: number;
  /** Share of its own error that a residual keeps, 1 − leverage. */
  kept: number;
  /** Share of this block in ln k at the reference temperature; all together 1. */
  share: number;
}

/**
 * Splits each candidate's error of ln k at the reference temperature into the part that its block's
 * candidates share and its own.
 *
 * Model (our own): a block, a plate run at one set temperature, was δT warmer than written for
 * every candidate in it, so that ln k_ib is off by g_ib δT_b, g = Ea/(R T²), plus an error of the
 * candidate's own. δT has one standard deviation in all blocks; its square is the mean product of
 * two candidates' residuals about their Arrhenius lines in a block over the product of their g,
 * with the share of an error that residuals keep, 1 − leverage, taken into account (method of
 * moments; exact for equal, evenly weighted lines). What the *other* candidates of a block say of
 * its δT (ridge estimate) is then taken off a candidate's residuals, and what still scatters between
 * its blocks is its own (Paule & Mandel 1982), with the degrees of freedom of the blocks, or of the
 * wells where nothing is left. ln k at T is linear in the block means, Σ share · ln k, so that
 * the shared part is share · g · δT; in ln(x/best) it cancels for candidates with one energy.
 *
 * With no two candidates in any block nothing is shared, and an ln x that its line does not give
 * (two temperatures, a saturating surface) keeps its whole error for its own. Breaks first where blocks differ by
 * something that does not scale with Ea.
 *
 * @param temperatureK reference temperature, above 0
 */
export function splitErrors(lines: readonly RankedLine[], temperatureK: number): SplitErrors {
  const views = lines.map(({ line, screenId, error }) =>
    line !== null && error !== null && isErrorOf(line, error, temperatureK)
      ? viewBlocks(line, screenId, temperatureK)
      : null,
  );
  const spread = median(lines.flatMap(({ line }, i) => (views[i] ? [line!.tau ** 2] : [])));
  const blocks = sumBlocks(views, spread);
  const variance = sharedVariance(blocks);
  const shared = { sd: Math.sqrt(variance), dof: blocks.dof };
  const parts = lines.map(({ error, line }, i): ErrorParts | null => {
    if (error === null) return null;
    const own = views[i] ?? null;
    if (own === null || !(variance > 0)) return { own: error, shared: [] };
    return {
      own: ownError(own, blocks, variance, spread, line!.points.length),
      shared: own.map(({ key, share, perKelvin }) => ({ block: key, loading: share * perKelvin })),
    };
  });
  return { shared, parts };
}

/** False where ln x does not come from the line, as the rate of a saturating surface. */
function isErrorOf(line: ArrheniusLine, error: LogError, temperatureK: number): boolean {
  const { se } = lnRateConstantAt(line, temperatureK);
  return se !== null && Math.abs(se - error.se) <= 1e-6 * se;
}

function viewBlocks(line: ArrheniusLine, screenId: string, temperatureK: number): BlockView[] {
  const slope = -line.activationEnergy / GAS_CONSTANT;
  const sets = setTemperatures(line.points.map((point) => point.temperatureK));
  const keys = [...new Set(line.points.map(({ block }, i) => `${block}\u0000${sets[i]!}`))];
  // The pooled means stand in the order in which their blocks first appear.
  const { means } = poolBlocks(line.points, slope);
  const tau2 = line.tau ** 2;
  const weights = means.map(({ variance }) => 1 / (variance + tau2));
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const centre = 1 / line.centreK;
  const spread = means.reduce((sum, { x }, i) => sum + weights[i]! * (x - centre) ** 2, 0);
  const reach = 1 / temperatureK - centre;
  return means.map(({ x, y, variance }, i) => ({
    key: `${screenId}\u0000${keys[i]!}`,
    x,
    y,
    variance,
    perKelvin: (line.activationEnergy / GAS_CONSTANT) * x * x,
    residual: y - line.lnKc - slope * (x - centre),
    kept: Math.max(1 - weights[i]! * (1 / total + (x - centre) ** 2 / spread), 0),
    share: weights[i]! * (1 / total + (reach * (x - centre)) / spread),
  }));
}

/** Sums over the candidates of each block. */
interface BlockSums {
  byKey: Map<string, { u: number; uu: number; p: number; pp: number; g: number }>;
  dof: number;
}

const weightOf = (view: BlockView, spread: number) => 1 / (view.variance + spread);

function sumBlocks(views: readonly (BlockView[] | null)[], spread: number): BlockSums {
  const byKey: BlockSums['byKey'] = new Map();
  let [kept, count] = [0, 0];
  for (const view of views.flatMap((one) => one ?? [])) {
    const sums = byKey.get(view.key) ?? { u: 0, uu: 0, p: 0, pp: 0, g: 0 };
    const w = weightOf(view, spread);
    const u = w * view.perKelvin * view.residual;
    const p = w * view.perKelvin ** 2 * Math.sqrt(view.kept);
    sums.u += u;
    sums.uu += u * u;
    sums.p += p;
    sums.pp += p * p;
    sums.g += w * view.perKelvin ** 2;
    byKey.set(view.key, sums);
    kept += view.kept;
    count += 1;
  }
  return { byKey, dof: Math.max(count > 0 ? (kept / count) * byKey.size : 1, 1) };
}

/** K²; 0 where residuals in a block do not go together, or no block holds two candidates. */
function sharedVariance({ byKey }: BlockSums): number {
  let [products, expected] = [0, 0];
  for (const { u, uu, p, pp } of byKey.values()) {
    products += u * u - uu;
    expected += p * p - pp;
  }
  return expected > 1e-9 ? Math.max(products / expected, 0) : 0;
}

function ownError(
  views: readonly BlockView[],
  { byKey }: BlockSums,
  shared: number,
  spread: number,
  wells: number,
): LogError {
  const corrected = views.map((view) => {
    const sums = byKey.get(view.key)!;
    const w = weightOf(view, spread);
    const others = sums.g - w * view.perKelvin ** 2;
    const delta = (sums.u - w * view.perKelvin * view.residual) / (others + 1 / shared);
    return view.y - view.perKelvin * delta;
  });
  const x = views.map((view) => view.x);
  const variances = views.map((view) => view.variance);
  const tau2 = betweenVariance((w) => aboutLine(x, corrected, w), variances, views.length - 2);
  const variance = views.reduce((sum, { share, variance: v }) => sum + share ** 2 * (v + tau2), 0);
  return {
    se: Math.sqrt(variance),
    dof: Math.max(tau2 > 0 ? views.length - 2 : wells - 2, 1),
  };
}

function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? 0;
}

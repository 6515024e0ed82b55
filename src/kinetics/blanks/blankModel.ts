import type { AnalysedWell } from '../analyseWell';
import { anyDecay } from '../catalyst/jointDecay';
import { poolEvidence } from '../catalyst/poolEvidence';
import { SAME_TEMPERATURE_K, setTemperatures } from '../catalyst/temperatures';
import { lineThrough } from '../catalyst/weightedLine';
import { lawOfOrder } from '../rateLaws/registry';
import type { ReadingDimension } from '../types';

/** −dC/dt = k Cⁿ of what goes on without the catalyst, per volume. */
export interface BlankConstant {
  order: number;
  /** In the unit of its order; 0 where the blank does not react. */
  k: number;
  se: number;
}

/** What goes on without the catalyst, at any temperature that the blanks cover. */
export interface BlankModel {
  dimension: ReadingDimension;
  /**
   * @param order what the blank is taken for where its own order is not told
   * @param loadingGPerL of the well: what the bare support does grows with it
   * @returns null where no blank was measured and none lies on both sides
   */
  at(order: number, temperatureK: number, loadingGPerL: number | null): BlankConstant | null;
}

/** Blanks of one role, at one temperature. */
interface BlankPoint {
  temperatureK: number;
  k: number;
  se: number;
}

interface BlankSeries {
  /** The order that the blanks themselves assert; null where they cannot tell. */
  order: number | null;
  loadingGPerL: number | null;
  points(order: number): BlankPoint[];
}

/** A temperature this far outside the measured ones is still read off the blank's line, in K. */
const REACH_K = 5;

/**
 * Collects the blanks of a screen. Those without catalyst and those with bare support are kept
 * apart: the second grows with mass.
 *
 * @param blanks all of one dimension count together
 * @returns null without a usable blank of that dimension
 */
export function blankModel(
  blanks: readonly AnalysedWell[],
  dimension: ReadingDimension,
): BlankModel | null {
  const own = blanks.filter(
    ({ analysis, decay }) => decay !== null && analysis.dimension === dimension,
  );
  if (own.length === 0) return null;
  const series = (role: 'blank' | 'support-blank') => {
    const wells = own.filter((well) => well.series.role === role);
    return wells.length === 0 ? null : seriesOf(wells);
  };
  const [plain, support] = [series('blank'), series('support-blank')];
  return {
    dimension,
    at(wanted, temperatureK, loadingGPerL) {
      const agreed = plain === null || support === null || plain.order === support.order;
      const order = (agreed ? (support ?? plain)!.order : null) ?? wanted;
      const background = plain === null ? null : rateAt(plain.points(order), temperatureK);
      if (support === null) return background === null ? null : { order, ...background };
      const bare = rateAt(support.points(order), temperatureK);
      if (bare === null) return null;
      const below = background?.k ?? 0;
      const share =
        loadingGPerL === null || support.loadingGPerL === null
          ? 1
          : loadingGPerL / support.loadingGPerL;
      return {
        order,
        k: below + Math.max(bare.k - below, 0) * share,
        se: Math.hypot((background?.se ?? 0) * (1 - share), bare.se * share),
      };
    },
  };
}

function seriesOf(wells: readonly AnalysedWell[]): BlankSeries {
  const reacting = wells.filter((well) => well.analysis.verdict !== 'no-reaction');
  const { order } = reacting.length === 0 ? { order: null } : poolEvidence(reacting);
  const loadings = wells.flatMap(({ series }) => series.loadingGPerL ?? []);
  const known = new Map<number, BlankPoint[]>();
  return {
    order,
    loadingGPerL:
      loadings.length === 0 ? null : loadings.reduce((sum, one) => sum + one, 0) / loadings.length,
    points(wanted) {
      const points = known.get(wanted) ?? pointsOf(wells, wanted, order !== null);
      known.set(wanted, points);
      return points;
    },
  };
}

/** The mean constant at each temperature, with the larger of fit error and scatter. */
function pointsOf(wells: readonly AnalysedWell[], order: number, asserted: boolean): BlankPoint[] {
  const sets = setTemperatures(wells.map((well) => well.series.temperatureK));
  return [...new Set(sets)].flatMap((set): BlankPoint[] => {
    const own = wells.filter((_, i) => sets[i] === set);
    const temperatureK = own.reduce((sum, well) => sum + well.series.temperatureK, 0) / own.length;
    if (!anyDecay(own)) return [{ temperatureK, k: 0, se: 0 }];
    const constants = own.flatMap((well) => constantOf(well, order, asserted) ?? []);
    if (constants.length === 0) return [];
    const n = constants.length;
    const k = constants.reduce((sum, one) => sum + one.k, 0) / n;
    const errors = constants.reduce((sum, one) => sum + one.se ** 2, 0) / n ** 2;
    const scatter =
      n < 2 ? 0 : constants.reduce((sum, one) => sum + (one.k - k) ** 2, 0) / (n * (n - 1));
    return [{ temperatureK, k: Math.max(k, 0), se: Math.sqrt(Math.max(errors, scatter)) }];
  });
}

/** k of the blank's own law, else r0/Cⁿ at its first reading. */
function constantOf(well: AnalysedWell, order: number, asserted: boolean) {
  const { analysis, firstConcentration: c } = well;
  if (asserted && analysis.verdict !== 'no-reaction') {
    const fit = analysis.fits[lawOfOrder(order)];
    return fit?.k == null || fit.kSe === null ? null : { k: fit.k, se: fit.kSe };
  }
  const rate = analysis.initialRate;
  if (rate?.se == null) return null;
  const scale = order === 0 ? 1 : c !== null && c > 0 ? c ** order : null;
  return scale === null ? null : { k: rate.value / scale, se: rate.se / scale };
}

/** At a measured temperature its point; between them along ln k against 1/T. */
function rateAt(
  points: readonly BlankPoint[],
  temperatureK: number,
): Omit<BlankConstant, 'order'> | null {
  const near = points.find(
    (point) => Math.abs(point.temperatureK - temperatureK) <= SAME_TEMPERATURE_K,
  );
  if (near !== undefined) return { k: near.k, se: near.se };
  const temperatures = points.map((point) => point.temperatureK);
  const inside =
    temperatureK >= Math.min(...temperatures) - REACH_K &&
    temperatureK <= Math.max(...temperatures) + REACH_K;
  if (!inside) return null;
  if (points.every(({ k }) => k === 0)) return { k: 0, se: 0 };
  const reacting = points.filter(({ k, se }) => k > 0 && se > 0);
  if (reacting.length < 2) return null;
  const line = lineThrough(
    reacting.map((point) => 1 / point.temperatureK),
    reacting.map((point) => Math.log(point.k)),
    reacting.map((point) => (point.k / point.se) ** 2),
  );
  const reach = 1 / temperatureK - line.centre;
  const k = Math.exp(line.level + line.slope * reach);
  return { k, se: k * Math.sqrt(line.levelVariance + reach ** 2 * line.slopeVariance) };
}

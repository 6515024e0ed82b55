import { rateUnit } from '../kinetics/rateLaws/rateConstantUnit';
import { evaluateArrhenius, evaluateFit } from '../kinetics/curves';
import type { CatalystAnalysis, RateLawName, SeriesAnalysis } from '../kinetics/types';

/** Curves of a well's laws on shared times, in the unit of its readings. */
export interface DrawnCurves {
  timesS: number[];
  laws: { law: RateLawName; values: number[] }[];
  /** 95 % band of the shown law's curve; null where it has none. */
  band: { low: number[]; high: number[] } | null;
}

/** The Arrhenius plot: 1000/T in kK⁻¹ against ln of k (or of the initial rate). */
export interface DrawnArrhenius {
  points: { x: number; y: number; se: number; wellId: string; temperatureK: number }[];
  line: { x: number[]; y: number[]; low: number[] | null; high: number[] | null };
  /** Unit of what the logarithm is taken of. */
  yUnit: string;
}

const curvePoints = 121;
const linePoints = 41;

const spread = (from: number, to: number, points: number) =>
  Array.from({ length: points }, (_, index) => from + ((to - from) * index) / (points - 1));

/**
 * The fitted curves of one well, from its first to its last used reading.
 *
 * @param timesS s, any order, aligned with `values`
 * @param values base unit; null is a missing reading
 * @returns no times and no laws when there is nothing to draw
 */
export function drawnCurves(
  analysis: SeriesAnalysis,
  timesS: readonly number[],
  values: readonly (number | null)[],
): DrawnCurves {
  const used = timesS.filter((_, index) => values[index] != null);
  const [from, to] = [Math.min(...used), Math.max(...used)];
  if (used.length < 2 || from === to) return { timesS: [], laws: [], band: null };
  const grid = spread(from, to, curvePoints);
  let band: DrawnCurves['band'] = null;
  const laws = (Object.keys(analysis.fits) as RateLawName[]).flatMap((law) => {
    const fit = analysis.fits[law];
    const curve = fit && evaluateFit(analysis, law, fit, grid);
    if (!curve) return [];
    if (law === analysis.shownLaw && curve.low && curve.high) {
      band = { low: curve.low, high: curve.high };
    }
    return [{ law, values: curve.values }];
  });
  return { timesS: grid, laws, band };
}

/**
 * A catalyst's Arrhenius plot.
 *
 * @returns null when it has no line
 */
export function drawnArrhenius(result: CatalystAnalysis): DrawnArrhenius | null {
  const line = result.arrhenius;
  if (!line || line.points.length === 0) return null;
  const inverse = line.points.map((point) => 1000 / point.temperatureK);
  const [low, high] = [Math.min(...inverse), Math.max(...inverse)];
  const margin = Math.max((high - low) * 0.05, 0.01);
  const x = spread(low - margin, high + margin, linePoints);
  const curve = evaluateArrhenius(
    line,
    x.map((one) => 1000 / one),
  );
  return {
    points: line.points.map((point) => ({
      x: 1000 / point.temperatureK,
      y: point.lnK,
      se: point.se,
      wellId: point.seriesId,
      temperatureK: point.temperatureK,
    })),
    line: { x, y: curve.values, low: curve.low, high: curve.high },
    // Where k has no unit the relative rate stands for it; without a law it is initial rates.
    yUnit: result.basis === 'law' ? (result.kUnit ?? 's^-1') : rateUnit(result.dimension),
  };
}

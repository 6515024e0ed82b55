import type { RateLawName, SeriesAnalysis, Verdict } from '../kinetics/types';

/** One cell of the heatmap: all wells of a catalyst at one set temperature. */
export interface HeatmapCell {
  temperatureK: number;
  wells: number;
  /** Verdict of the cell's wells when they agree, else `undetermined`. */
  verdict: Verdict;
  order: number | null;
  /** Geometric mean under the catalyst's law, at the reference loading; null when it has no law. */
  k: number | null;
  kUnit: string | null;
  /** Geometric mean at each well's own loading, base unit s⁻¹. */
  initialRate: number | null;
  /** Mean, 0 to 1. */
  conversion: number | null;
  /** Root mean square of the wells' residual standard deviations as shares of C0. */
  relativeResidualSd: number | null;
  wellsWithLackOfFit: number;
  wellIds: string[];
}

/** A well's answer with the temperature that its plate was set to. */
export interface HeatmapWell {
  /** K. */
  setTemperatureK: number;
  analysis: SeriesAnalysis;
}

const present = (values: (number | null | undefined)[]): number[] =>
  values.filter((value): value is number => value !== null && value !== undefined);

function mean(values: number[]): number | null {
  return values.length === 0 ? null : values.reduce((sum, value) => sum + value, 0) / values.length;
}

/** Null when a value is not above 0: a rate of nothing has no logarithm. */
function geometricMean(values: number[]): number | null {
  if (values.some((value) => value <= 0)) return null;
  const ln = mean(values.map(Math.log));
  return ln === null ? null : Math.exp(ln);
}

/** k of a well under a law, brought to the reference loading (rate proportional to catalyst). */
function kAtReference(
  { fits, loadingGPerL }: SeriesAnalysis,
  law: RateLawName,
  referenceLoadingGPerL: number | null,
): number | null {
  const k = fits[law]?.k ?? null;
  if (k === null || referenceLoadingGPerL === null || loadingGPerL === null) return k;
  return (k * referenceLoadingGPerL) / loadingGPerL;
}

function relativeSd({ residualSd, c0 }: SeriesAnalysis): number | null {
  return residualSd === null || c0 === null || c0.value === 0
    ? null
    : residualSd / Math.abs(c0.value);
}

/**
 * Gathers a catalyst's wells into one cell for each temperature.
 *
 * @param wells engine answers with their set temperatures
 * @param temperaturesK columns of the heatmap, K
 * @param law the catalyst's law; null when it has none, and then k is null
 * @param kUnit unit of k under that law
 * @param referenceLoadingGPerL g/L; null leaves k at each well's own loading
 * @returns cells aligned with `temperaturesK`; null where the catalyst was not measured
 */
export function heatmapCells(
  wells: readonly HeatmapWell[],
  temperaturesK: readonly number[],
  law: RateLawName | null,
  kUnit: string | null,
  referenceLoadingGPerL: number | null,
): (HeatmapCell | null)[] {
  return temperaturesK.map((temperatureK) => {
    const own = wells
      .filter((well) => well.setTemperatureK === temperatureK)
      .map((well) => well.analysis);
    const [first] = own;
    if (!first) return null;
    const agreed = own.every((well) => well.verdict === first.verdict);
    const ks =
      law === null
        ? []
        : present(own.map((well) => kAtReference(well, law, referenceLoadingGPerL)));
    const squares = present(own.map(relativeSd)).map((sd) => sd * sd);
    const meanSquare = mean(squares);
    const k = geometricMean(ks);
    return {
      temperatureK,
      wells: own.length,
      verdict: agreed ? first.verdict : 'undetermined',
      order: agreed ? first.order : null,
      k,
      kUnit: k === null ? null : kUnit,
      initialRate: geometricMean(present(own.map((well) => well.initialRate?.value))),
      conversion: mean(present(own.map((well) => well.conversion))),
      relativeResidualSd: meanSquare === null ? null : Math.sqrt(meanSquare),
      wellsWithLackOfFit: own.filter((well) => well.lackOfFit?.significant).length,
      wellIds: own.map((well) => well.id),
    };
  });
}

import { logEstimate } from '../statistics/estimate';
import type { Estimate } from '../types';

/** A well's rate, for comparison with the benchmark beside it. */
export interface RatedWell {
  catalyst: string;
  /** Plate run at one set temperature. */
  block: string;
  temperatureK: number;
  /** ln of k or rate at one loading, and its standard error. */
  lnRate: number;
  se: number;
}

/** A catalyst against the benchmark of its own plates. */
export interface BenchmarkRatio {
  catalyst: string;
  ratio: Estimate;
  /** Plate runs in which both were measured. */
  blocks: number;
}

const meanOf = (wells: readonly RatedWell[]) => {
  const weights = wells.map(({ se }) => 1 / Math.max(se, 1e-6) ** 2);
  const total = weights.reduce((sum, w) => sum + w, 0);
  const mean = wells.reduce((sum, { lnRate }, i) => sum + weights[i]! * lnRate, 0) / total;
  const scatter =
    wells.length < 2
      ? 0
      : wells.reduce((sum, { lnRate }) => sum + (lnRate - mean) ** 2, 0) /
        (wells.length * (wells.length - 1));
  return { mean, variance: Math.max(1 / total, scatter) };
};

/**
 * Ratio of each catalyst's rate to the benchmark's in the same plate run, where day and plate fall
 * out; the mean over runs of its logarithm, weighed by both errors.
 *
 * @param benchmarks wells of the benchmark
 */
export function benchmarkRatios(
  wells: readonly RatedWell[],
  benchmarks: readonly RatedWell[],
): BenchmarkRatio[] {
  return [...new Set(wells.map(({ catalyst }) => catalyst))].flatMap((catalyst) => {
    const own = wells.filter((well) => well.catalyst === catalyst);
    const differences = [...new Set(own.map(({ block }) => block))].flatMap((block) => {
      const beside = benchmarks.filter((well) => well.block === block);
      if (beside.length === 0) return [];
      const [a, b] = [meanOf(own.filter((well) => well.block === block)), meanOf(beside)];
      return [{ value: a.mean - b.mean, variance: a.variance + b.variance }];
    });
    if (differences.length === 0) return [];
    const weights = differences.map(({ variance }) => 1 / variance);
    const total = weights.reduce((sum, w) => sum + w, 0);
    const mean = differences.reduce((sum, { value }, i) => sum + weights[i]! * value, 0) / total;
    const n = differences.length;
    const chi2 = differences.reduce(
      (sum, { value }, i) => sum + weights[i]! * (value - mean) ** 2,
      0,
    );
    // Ratios that scatter beyond their errors, as with another Ea, widen the interval.
    const scale = n > 1 ? Math.max(chi2 / (n - 1), 1) : 1;
    const dof = n > 1 ? n - 1 : own.length + benchmarks.length - 2;
    const ratio = logEstimate(mean, Math.sqrt(scale / total), dof);
    return ratio === null ? [] : [{ catalyst, ratio, blocks: n }];
  });
}

/**
 * Standard deviation of the benchmark's ln rate between plate runs of one temperature: what day and
 * plate add.
 *
 * @returns null where no temperature was run twice
 */
export function betweenPlateSpread(benchmarks: readonly RatedWell[]): number | null {
  const runs = [...new Set(benchmarks.map(({ block }) => block))].map((block) => {
    const own = benchmarks.filter((well) => well.block === block);
    return { temperatureK: Math.round(own[0]!.temperatureK), mean: meanOf(own).mean };
  });
  let [squares, dof] = [0, 0];
  for (const set of new Set(runs.map(({ temperatureK }) => temperatureK))) {
    const own = runs.filter(({ temperatureK }) => temperatureK === set);
    const mean = own.reduce((sum, run) => sum + run.mean / own.length, 0);
    squares += own.reduce((sum, run) => sum + (run.mean - mean) ** 2, 0);
    dof += own.length - 1;
  }
  return dof > 0 ? Math.sqrt(squares / dof) : null;
}

import { simulateWell, WIDE_RANGES, type Ranges } from '../../calibration/simulateWells';
import type { Truth } from '../../calibration/truths';
import { randomStream } from '../../kinetics/statistics/randomStream';

/** A well as every fitter gets it. */
export interface BenchSeries {
  times: number[];
  values: number[];
}

const SEED = 4711;
const TRUTHS: readonly Truth[] = ['zero', 'first', 'second', 'saturating'];

/** Wells of the four laws in turn, as a plate gives them: 30 to 95 % converted, 0.5 to 3 % noise. */
export function benchSeries(count: number, readings: number): BenchSeries[] {
  const random = randomStream(SEED);
  const ranges: Ranges = {
    ...WIDE_RANGES,
    readings: [readings, readings],
    conversion: [0.3, 0.95],
    noise: [0.005, 0.03],
    c0: [0.002, 0.05],
  };
  return Array.from({ length: count }, (_, i) => {
    const { timesS, values } = simulateWell(TRUTHS[i % TRUTHS.length]!, random, ranges);
    return { times: timesS, values };
  });
}

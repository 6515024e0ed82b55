import { analyseWell } from './analyseWell';
import type { DecaySeries, SeriesAnalysis } from './types';

/**
 * Analyses one well by itself, as a preview of a refit does.
 *
 * @throws RangeError as `analyseWell` does; readings that cannot be fitted are a verdict instead
 */
export function analyseSeries(series: DecaySeries): SeriesAnalysis {
  return analyseWell(series).analysis;
}

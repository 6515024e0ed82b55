import type { AnalysedWell } from '../analyseWell';
import { anyDecay } from './jointDecay';

/** A blank within this many kelvin stands for a well. */
const NEAR_K = 5;
/** Below this share of a catalyst's rate a blank does not matter to it. */
const NOTABLE_SHARE = 0.05;

/**
 * Whether what goes on without the catalyst matters to its rates: the blanks react, taken together,
 * and one of them is faster than 5 % of the catalyst's wells at its temperature. Rates are those of
 * the first reading, per volume.
 *
 * @param blanks of the screen, all kinds
 * @param wells the catalyst's reacting wells
 */
export function blanksReact(
  blanks: readonly AnalysedWell[],
  wells: readonly AnalysedWell[],
): boolean {
  if (!anyDecay(blanks)) return false;
  return blanks.some(({ analysis, decay }) => {
    const reacts = analysis.verdict !== 'no-reaction' && analysis.verdict !== 'unusable';
    if (decay === null || !reacts || analysis.initialRate === null) return false;
    const near = wells.flatMap((well) => {
      const rate = well.analysis.initialRate?.value;
      const apart = Math.abs(well.series.temperatureK - analysis.temperatureK);
      const same = well.analysis.dimension === analysis.dimension;
      return rate !== undefined && same && apart <= NEAR_K ? [rate] : [];
    });
    if (near.length === 0) return false;
    const mean = near.reduce((sum, rate) => sum + rate, 0) / near.length;
    return analysis.initialRate.value > NOTABLE_SHARE * mean;
  });
}

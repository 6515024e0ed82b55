import type { AnalysedWell } from '../analyseWell';
import { anyDecay } from './jointDecay';

/** A blank within this many kelvin stands for a well. */
const NEAR_K = 5;
/** Below this share of a catalyst's rate a blank does not matter to it. */
const NOTABLE_SHARE = 0.05;

/**
 * Whether what goes on without the catalyst matters to its rates: the blanks react, taken together,
 * and one of them is faster than 5 % of the catalyst's wells at its temperature. Rates are those of
 * the first reading, per volume; signals, whose scale differs from well to well, are compared by
 * their rates relative to the first reading.
 *
 * @param blanks of the screen, all kinds
 * @param wells the catalyst's reacting wells
 */
export function blanksReact(
  blanks: readonly AnalysedWell[],
  wells: readonly AnalysedWell[],
): boolean {
  if (!anyDecay(blanks)) return false;
  return blanks.some((blank) => {
    const { verdict, dimension, temperatureK } = blank.analysis;
    if (verdict === 'no-reaction' || verdict === 'unusable') return false;
    const near = wells.filter(
      ({ analysis }) =>
        analysis.dimension === dimension &&
        Math.abs(analysis.temperatureK - temperatureK) <= NEAR_K,
    );
    const relative = [blank, ...near].some(({ series }) => series.kind === 'signal');
    const rates = near.map((well) => rateOf(well, relative)).filter((rate) => rate !== null);
    const own = rateOf(blank, relative);
    if (own === null || rates.length === 0) return false;
    const mean = rates.reduce((sum, rate) => sum + rate, 0) / rates.length;
    return own > NOTABLE_SHARE * mean;
  });
}

function rateOf({ analysis, firstConcentration: c }: AnalysedWell, relative: boolean) {
  const rate = analysis.initialRate?.value ?? null;
  if (!relative || rate === null) return rate;
  return c !== null && c > 0 ? rate / c : null;
}

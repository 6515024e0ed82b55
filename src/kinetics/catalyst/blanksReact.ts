import type { AnalysedWell } from '../analyseWell';
import { anyDecay } from './jointDecay';
import { setTemperatures } from './temperatures';

/** A blank within this many kelvin stands for a well. */
const NEAR_K = 5;
/** Below this share of a catalyst's rate a blank does not matter to it. */
const NOTABLE_SHARE = 0.05;

/**
 * Whether what goes on without the catalyst matters to its rates: the blanks react, all taken
 * together and those of one temperature too, and there their mean rate is above 5 % of that of the
 * catalyst's wells. Rates are those of the first reading, per volume; signals, whose scale differs
 * from well to well, are compared by their rates relative to the first reading.
 *
 * @param blanks of the screen, all kinds
 * @param wells the catalyst's reacting wells
 */
export function blanksReact(
  blanks: readonly AnalysedWell[],
  wells: readonly AnalysedWell[],
): boolean {
  const usable = blanks.filter(
    ({ decay, analysis }) => decay !== null && analysis.dimension === wells[0]?.analysis.dimension,
  );
  if (!anyDecay(usable)) return false;
  const sets = setTemperatures(usable.map(({ analysis }) => analysis.temperatureK));
  return [...new Set(sets)].some((set) => {
    const together = usable.filter((_, i) => sets[i] === set);
    const temperatureK = together[0]!.analysis.temperatureK;
    const near = wells.filter(
      ({ analysis }) => Math.abs(analysis.temperatureK - temperatureK) <= NEAR_K,
    );
    if (near.length === 0 || !anyDecay(together)) return false;
    const relative = [...together, ...near].some(({ series }) => series.kind === 'signal');
    const own = meanRate(together, relative);
    const catalysts = meanRate(near, relative);
    return own !== null && catalysts !== null && own > NOTABLE_SHARE * catalysts;
  });
}

function meanRate(wells: readonly AnalysedWell[], relative: boolean): number | null {
  const rates = wells.flatMap(({ analysis, firstConcentration: c }) => {
    const rate = analysis.initialRate?.value;
    if (rate === undefined || (relative && !(c !== null && c > 0))) return [];
    return [relative ? rate / c! : rate];
  });
  return rates.length === 0 ? null : rates.reduce((sum, rate) => sum + rate, 0) / rates.length;
}

import type { AnalysedWell } from '../analyseWell';
import type { ReadingDimension } from '../types';
import { anyDecay } from './jointDecay';
import { setTemperatures } from './temperatures';

/** A blank within this many kelvin stands for a well. */
const NEAR_K = 5;
/** Below this share of a catalyst's rate a blank does not matter to it. */
const NOTABLE_SHARE = 0.05;

/** Blanks of one temperature that react. */
export interface BlankRate {
  dimension: ReadingDimension;
  temperatureK: number;
  /** Mean of −dC/dt at the first reading, base unit s⁻¹; null where none is known. */
  rate: number | null;
  /** Mean of −dC/dt over C at the first reading, s⁻¹; null where none is known. */
  relativeRate: number | null;
  /** True where a blank's reading is a signal, whose scale is its own. */
  signal: boolean;
}

/**
 * The rates of a screen's blanks, where they react: all of one dimension taken together, and those
 * of one temperature too.
 *
 * @param blanks of the screen, all kinds
 */
export function blankRates(blanks: readonly AnalysedWell[]): BlankRate[] {
  const dimensions = [...new Set(blanks.map(({ analysis }) => analysis.dimension))];
  return dimensions.flatMap((dimension) => {
    const own = blanks.filter(
      ({ analysis, decay }) => decay !== null && analysis.dimension === dimension,
    );
    if (!anyDecay(own)) return [];
    const sets = setTemperatures(own.map(({ analysis }) => analysis.temperatureK));
    return [...new Set(sets)].flatMap((set): BlankRate[] => {
      const together = own.filter((_, i) => sets[i] === set);
      if (!anyDecay(together)) return [];
      return [
        {
          dimension,
          temperatureK: together[0]!.analysis.temperatureK,
          rate: meanRate(together, false),
          relativeRate: meanRate(together, true),
          signal: together.some(isSignal),
        },
      ];
    });
  });
}

/**
 * Whether what goes on without the catalyst matters to its rates: at one of its temperatures the
 * blanks' mean rate is above 5 % of that of its wells. Rates are those of the first reading, per
 * volume; signals are compared by their rates relative to the first reading.
 *
 * @param wells the catalyst's reacting wells
 */
export function blanksReact(blanks: readonly BlankRate[], wells: readonly AnalysedWell[]): boolean {
  return blanks.some((blank) => {
    const near = wells.filter(
      ({ analysis }) =>
        analysis.dimension === blank.dimension &&
        Math.abs(analysis.temperatureK - blank.temperatureK) <= NEAR_K,
    );
    const relative = blank.signal || near.some(isSignal);
    const own = relative ? blank.relativeRate : blank.rate;
    const catalysts = meanRate(near, relative);
    return own !== null && catalysts !== null && own > NOTABLE_SHARE * catalysts;
  });
}

const isSignal = ({ series }: AnalysedWell) => series.kind === 'signal';

function meanRate(wells: readonly AnalysedWell[], relative: boolean): number | null {
  const rates = wells.flatMap(({ analysis, firstConcentration: c }) => {
    const rate = analysis.initialRate?.value;
    if (rate === undefined || (relative && !(c !== null && c > 0))) return [];
    return [relative ? rate / c! : rate];
  });
  return rates.length === 0 ? null : rates.reduce((sum, rate) => sum + rate, 0) / rates.length;
}

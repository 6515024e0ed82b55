import { analyseWell, type AnalysedWell } from './analyseWell';
import { analyseCatalyst } from './catalyst/analyseCatalyst';
import { blankRates } from './catalyst/blanksReact';
import { blankModel, type BlankModel } from './blanks/blankModel';
import { netOfBlank } from './blanks/netOfBlank';
import { ENGINE_VERSION } from './constants';
import type {
  DecaySeries,
  ReadingDimension,
  ReferenceConditions,
  ScreenAnalysis,
  WellRole,
} from './types';

const RANKED: readonly WellRole[] = ['sample', 'benchmark'];
const BLANK: readonly WellRole[] = ['blank', 'support-blank'];

/**
 * Analyses every well of a screen and every catalyst in it.
 *
 * @param onProgress called after each well with the number done
 * @throws RangeError as `analyseWell` does
 */
export function analyseScreen(
  series: readonly DecaySeries[],
  reference: ReferenceConditions,
  onProgress?: (done: number, total: number) => void,
): ScreenAnalysis {
  const wells = series.map((one, i) => {
    const well = analyseWell(one);
    onProgress?.(i + 1, series.length);
    return well;
  });
  return concludeScreen(wells, reference);
}

/**
 * What the wells of a screen come to: each after the blank, and every catalyst in the order of first
 * appearance.
 *
 * @param wells of one screen, catalysts whole; their `net` is filled in
 * @param blankWells all blanks of that screen, where they are not among the wells
 */
export function concludeScreen(
  wells: readonly AnalysedWell[],
  reference: ReferenceConditions,
  blankWells: readonly AnalysedWell[] = wells.filter(({ series }) => BLANK.includes(series.role)),
): ScreenAnalysis {
  const blanks = blankRates(blankWells);
  const models = blankModels(blankWells);
  for (const well of wells) {
    const model = models.get(well.analysis.dimension) ?? null;
    if (model === null || !RANKED.includes(well.series.role)) continue;
    well.analysis.net = netOfBlank(well, model);
  }
  const byCatalyst = new Map<string, AnalysedWell[]>();
  for (const well of wells) {
    const { catalyst, role } = well.series;
    if (catalyst === null || !RANKED.includes(role)) continue;
    const own = byCatalyst.get(catalyst);
    if (own === undefined) byCatalyst.set(catalyst, [well]);
    else own.push(well);
  }
  return {
    engine: ENGINE_VERSION,
    series: wells.map((well) => well.analysis),
    catalysts: [...byCatalyst].map(([catalyst, own]) =>
      analyseCatalyst(
        catalyst,
        own,
        reference,
        blanks,
        models.get(own[0]!.analysis.dimension) ?? null,
      ),
    ),
  };
}

/** What goes on without the catalyst, for each dimension that has blanks. */
function blankModels(blanks: readonly AnalysedWell[]): Map<ReadingDimension, BlankModel> {
  const models = new Map<ReadingDimension, BlankModel>();
  for (const dimension of new Set(blanks.map(({ analysis }) => analysis.dimension))) {
    const model = blankModel(blanks, dimension);
    if (model !== null) models.set(dimension, model);
  }
  return models;
}

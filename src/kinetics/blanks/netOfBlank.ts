import type { AnalysedWell } from '../analyseWell';
import { lawOfOrder } from '../rateLaws/registry';
import { estimate } from '../statistics/estimate';
import type { NetOfBlank } from '../types';
import type { BlankModel, BlankConstant } from './blankModel';
import { fitBesideBlank } from './fitBesideBlank';

/** A well's own constant after the blank. */
export interface NetConstant {
  k: number;
  se: number;
  blank: BlankConstant;
}

/**
 * The well's own k under an order: rates add, rate constants do not, so k − k_blank only where both
 * follow one order; else the well is fitted again with the blank's rate held beside its own. The
 * blank's error is carried over.
 *
 * @returns null where the well has no k, or no blank covers its temperature
 */
export function netConstant(
  well: AnalysedWell,
  order: number,
  model: BlankModel,
): NetConstant | null {
  const { series, analysis } = well;
  const fit = analysis.fits[lawOfOrder(order)];
  if (fit?.k == null || fit.kSe === null) return null;
  const blank = model.at(order, series.temperatureK, series.loadingGPerL);
  if (blank === null) return null;
  if (blank.k === 0) return { k: fit.k, se: fit.kSe, blank };
  if (blank.order === order) {
    return { k: fit.k - blank.k, se: Math.hypot(fit.kSe, blank.se), blank };
  }
  if (fit.c0 === null) return null;
  const start = { k: fit.k, c0: fit.c0 };
  const own = fitBesideBlank(series, order, blank, start);
  const shifted = fitBesideBlank(series, order, { ...blank, k: blank.k + blank.se }, start);
  if (own?.se == null || shifted === null) return null;
  return { k: own.k, se: Math.hypot(own.se, own.k - shifted.k), blank };
}

/**
 * k and initial rate of a well after the blank; k only where the well has one, of an order.
 *
 * @returns null where no blank covers its temperature
 */
export function netOfBlank(well: AnalysedWell, model: BlankModel): NetOfBlank | null {
  const { series, analysis, firstConcentration: c } = well;
  const order = analysis.order ?? 1;
  const blank = model.at(order, series.temperatureK, series.loadingGPerL);
  if (blank === null || analysis.initialRate === null) return null;
  const dof = Math.max(analysis.pointsUsed - 2, 1);
  // Signals have a scale of their own: only what is relative to C carries over.
  const carries = series.kind !== 'signal' || blank.order === 1;
  const known = blank.k === 0 || (carries && (blank.order === 0 || (c !== null && c > 0)));
  const scale = blank.order === 0 ? 1 : (c ?? 0) ** blank.order;
  const { value, se } = analysis.initialRate;
  const net =
    analysis.k === null || analysis.order === null
      ? null
      : netConstant(well, analysis.order, model);
  return {
    k: net === null ? null : estimate(net.k, net.se, dof),
    initialRate: known
      ? estimate(
          value - blank.k * scale,
          se === null ? null : Math.hypot(se, blank.se * scale),
          dof,
        )
      : null,
  };
}

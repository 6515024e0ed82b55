import type { LawFit, RateLawName, SeriesAnalysis } from '../../kinetics/types';
import { rateConstantUnit } from '../../kinetics/rateLaws/rateConstantUnit';
import { freeOrderOf, lawName } from './lawWords';

/** One law in the table of rivals. */
export interface LawRow {
  law: RateLawName;
  name: string;
  fit: LawFit;
  kUnit: string | null;
  /** AICc above the best one's; null when it cannot be given. */
  deltaAicc: number | null;
  /** What speaks for and against it, for a chemist. */
  words: string;
  shown: boolean;
}

const order: RateLawName[] = ['zero', 'first', 'second', 'saturating', 'order'];
const wholeOrders: Partial<Record<RateLawName, number>> = { zero: 0, first: 1, second: 2 };

/** The laws tried on a well, side by side, in the order of their orders. */
export function lawRows(analysis: SeriesAnalysis): LawRow[] {
  const fits = order.flatMap((law) => {
    const fit = analysis.fits[law];
    return fit ? [{ law, fit }] : [];
  });
  const aiccs = fits.flatMap(({ fit }) => (fit.aicc === null ? [] : [fit.aicc]));
  const best = aiccs.length === 0 ? null : Math.min(...aiccs);
  const bestSd = fits.find(({ fit }) => fit.aicc === best)?.fit.residualSd ?? null;
  const freeOrder = freeOrderOf(analysis);
  return fits.map(({ law, fit }) => {
    const deltaAicc = fit.aicc === null || best === null ? null : fit.aicc - best;
    return {
      law,
      fit,
      name: lawName(law, freeOrder),
      kUnit: kUnitOf(law, analysis, freeOrder),
      deltaAicc,
      words: evidenceWords({ fit, deltaAicc, bestSd, rivals: fits.length - 1 }),
      shown: law === analysis.shownLaw,
    };
  });
}

function kUnitOf(law: RateLawName, analysis: SeriesAnalysis, freeOrder: number | null) {
  if (law === 'saturating') return rateConstantUnit(0, analysis.dimension);
  const n = law === 'order' ? freeOrder : (wholeOrders[law] ?? null);
  return n === null ? null : rateConstantUnit(n, analysis.dimension);
}

/**
 * Words for a difference in AICc: below 2 as good as the best, 4 to 7 clearly weaker, above 10
 * next to nothing. Burnham & Anderson, Model Selection and Multimodel Inference (2002), section 2.6.
 */
export function evidenceWords(input: {
  fit: Pick<LawFit, 'residualSd' | 'k'>;
  deltaAicc: number | null;
  bestSd: number | null;
  rivals: number;
}): string {
  const { fit, deltaAicc, bestSd, rivals } = input;
  if (deltaAicc === null) return 'Too few readings to weigh it against the others.';
  const likelier = Math.exp(deltaAicc / 2);
  const weighed =
    deltaAicc === 0
      ? rivals === 0
        ? 'The only law tried.'
        : 'Describes these readings best.'
      : deltaAicc < 2
        ? 'As good as the best: these readings cannot tell them apart.'
        : deltaAicc < 4
          ? 'A little weaker than the best, not ruled out.'
          : deltaAicc < 10
            ? `Clearly weaker: the best is ${Math.round(likelier)} times as likely.`
            : 'Next to nothing speaks for it.';
  const ratio = fit.residualSd !== null && bestSd ? fit.residualSd / bestSd : 1;
  const misses = ratio >= 1.15 ? ` Misses the readings ${ratio.toFixed(1)} times as widely.` : '';
  const open = fit.k === null ? ' Its k cannot be had from these readings.' : '';
  return weighed + misses + open;
}

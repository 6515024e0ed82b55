import { EVIDENCE_TO_ASSERT } from '../verdict/selectRateLaw';
import { evidenceRatio } from '../statistics/goodnessOfFit';
import type { RateLawName, SeriesAnalysis } from '../types';
import { expectedSelection } from './expectedSelection';
import { competingLaws, expectedConversion, expectedCurve, type PlannedWell } from './plannedWell';
import { evenTimes, type SamplingLimits } from './samplingTimes';
import { searchDesign } from './searchDesign';

/** What would settle the order of a well. */
export interface DiscriminatingTimes {
  /**
   * `repeat`: a second run as it was; `time`: another last reading; `readings`: more of them;
   * `noise`: no duration and no number of readings helps at this noise, less noise does; `none`:
   * nor does that; `bend`: product has grown too straight to show where it ends, so a longer run
   * comes before any plan; `over`: the reaction ends before the second reading.
   */
  by: 'repeat' | 'time' | 'readings' | 'noise' | 'none' | 'bend' | 'over';
  /** The laws that compete, the likeliest first. */
  laws: RateLawName[];
  /** s, ascending; the proposed sampling. */
  timesS: number[];
  lastS: number;
  readings: number;
  /** Conversion reached at `lastS`, the lowest of the competing laws; 0 when `by` is `bend`. */
  conversion: number;
  /** Readings that would do within the present duration; null where none would. */
  readingsAtPresentDuration: number | null;
  /** Share of the present noise at which the proposed times do; null unless `by` is `noise`. */
  noiseShare: number | null;
  /** Runs whose evidence adds up to the same; null unless `by` is `noise`. */
  replicates: number | null;
  /** Expected at the proposed sampling, the lowest of the competing laws; 1 where none is planned. */
  evidenceRatio: number;
}

/** How much longer product is followed that shows no end yet, and what counts as that. */
const LONGER_TO_BEND = 3;
const LOOSE_C0 = 0.3;

/** Beyond this conversion at its second reading a reaction is over. */
const OVER = 0.95;

/** The laws that a well does not yet tell apart, the likeliest first. */
export function lawsInPlay({ fits }: Pick<SeriesAnalysis, 'fits'>): RateLawName[] {
  const known = competingLaws().flatMap(({ name }) => {
    const aicc = fits[name]?.aicc;
    return aicc == null ? [] : [{ name, aicc }];
  });
  known.sort((a, b) => a.aicc - b.aicc);
  return known
    .filter(({ aicc }, i) => i < 2 || evidenceRatio(known[0]!.aicc, aicc) < EVIDENCE_TO_ASSERT)
    .map(({ name }) => name);
}

/**
 * The sampling times that are expected to settle a well's order, whichever of the competing laws is
 * true: the shortest change of duration at the number of readings as it was; else more readings;
 * else less noise or replicates.
 *
 * The aim is the one of Box & Hill (1967), designs under which the rivals predict most differently;
 * the criterion is the non-centrality of the best-fitting rival (T-optimality, Atkinson & Fedorov
 * 1975), read through the engine's own rule for asserting an order.
 *
 * @returns null where no law gives a curve to predict by
 */
export function discriminatingTimes(
  well: PlannedWell,
  limits: SamplingLimits,
): DiscriminatingTimes | null {
  const laws = lawsInPlay(well.analysis);
  const [best] = laws;
  const present = well.timesS.length;
  const firstS = well.timesS[0] ?? 0;
  const spanS = (well.timesS[present - 1] ?? 0) - firstS;
  if (best === undefined || present < 3 || !(spanS > 0)) return null;
  const presentLastS = firstS + spanS;
  const nothing = { laws, ...NOTHING_PLANNED };
  if (endIsOpen(well.analysis, best)) {
    const longest = Math.max(limits.longestRunS ?? Infinity, presentLastS);
    const lastS = Math.min(firstS + LONGER_TO_BEND * spanS, longest);
    const timesS = evenTimes(firstS, lastS, present, limits.shortestIntervalS);
    return { ...nothing, by: 'bend', timesS, lastS, readings: timesS.length };
  }
  const sigma = well.analysis.fits[best]?.residualSd ?? null;
  const curves = laws
    .filter((name) => !endIsOpen(well.analysis, name))
    .map((name) => expectedCurve(well.analysis, name, sigma))
    .filter((curve) => curve !== null);
  const [likeliest] = curves;
  if (likeliest === undefined) return null;
  const secondS = well.timesS.find((timeS) => timeS > firstS)!;
  if (expectedConversion(likeliest, secondS) > OVER) {
    const timesS = [...well.timesS];
    return { ...nothing, by: 'over', timesS, lastS: secondS, readings: present, conversion: 1 };
  }

  const found = searchDesign({ curves, readings: present, firstS, lastS: presentLastS }, limits);
  const { by, lastS, readings, noiseShare } = found;
  const timesS = evenTimes(firstS, lastS, readings, limits.shortestIntervalS);
  const ratios = curves.map(
    (curve) =>
      expectedSelection({ ...curve, residualSd: curve.residualSd * (noiseShare ?? 1) }, timesS)
        .evidenceRatio,
  );
  return {
    by,
    laws,
    timesS,
    lastS,
    readings: timesS.length,
    conversion: Math.min(...curves.map((curve) => expectedConversion(curve, lastS))),
    readingsAtPresentDuration: found.readingsAtPresentDuration,
    noiseShare,
    replicates: noiseShare === null ? null : Math.ceil(noiseShare ** -2 - 1e-9),
    evidenceRatio: Math.min(...ratios),
  };
}

/** True when a fit of product does not tell how much there will be in the end. */
function endIsOpen({ kind, fits }: SeriesAnalysis, name: RateLawName): boolean {
  if (kind !== 'product') return false;
  const fit = fits[name];
  if (fit == null || fit.c0 === null || fit.c0Se === null) return true;
  return fit.c0Se > LOOSE_C0 * fit.c0;
}

const NOTHING_PLANNED = {
  conversion: 0,
  readingsAtPresentDuration: null,
  noiseShare: null,
  replicates: null,
  evidenceRatio: 1,
};

import type { CatalystAnalysis, Estimate } from '../kinetics/types';
import { splitErrors } from './blockErrors';
import { logErrorOf } from './logError';
import { FIRST_CANDIDATES, kGroupOf, type Rankings } from './rankedMeasures';
import { drawErrors, rankCandidates, type ErrorDraws, type Ranking } from './ranks';

/** Any fixed number: the same results always get the same ranks. */
const SEED = 20_261_201;

/** A candidate as its analysis left it, with the screen that it was measured in. */
export type RankedResult = Pick<
  CatalystAnalysis,
  | 'verdict'
  | 'order'
  | 'kRef'
  | 'kUnit'
  | 'rateRef'
  | 'rateRefPerMass'
  | 'turnoverFrequency'
  | 'timeToTarget'
  | 'bracket'
  | 'arrhenius'
> & { screenId: string };

/**
 * Ranks a campaign's candidates by every measure, from one set of joint draws: all measures follow
 * from ln k at the reference temperature, and so share its error (a time as its reciprocal).
 * k is ranked within one order and unit. Brackets between laws take no rank.
 *
 * @param temperatureK the campaign's reference temperature, above 0
 * @param first see `rankCandidates`
 * @returns aligned with `results`
 */
export function rankLeaderboard(
  results: readonly RankedResult[],
  temperatureK: number,
  first = FIRST_CANDIDATES,
): Rankings[] {
  const lines = results.map(({ screenId, arrhenius, bracket, rateRef, kRef, timeToTarget }) => {
    const estimate = bracket ? null : (rateRef ?? kRef ?? timeToTarget);
    return { screenId, line: arrhenius, error: estimate === null ? null : logErrorOf(estimate) };
  });
  const { shared, parts } = splitErrors(lines, temperatureK);
  const draws = drawErrors(parts, shared, SEED);
  const by = (estimateOf: (one: RankedResult) => Estimate | null) =>
    results.map((one) => lnOf(one.bracket ? null : estimateOf(one)));
  const lnRate = by((one) => one.rateRef);
  const rate = rankCandidates(lnRate, draws, first);
  const alike = (ln: readonly (number | null)[]) =>
    isShifted(ln, lnRate) ? rate : rankCandidates(ln, draws, first);
  const perGram = alike(by((one) => one.rateRefPerMass));
  const turnover = alike(by((one) => one.turnoverFrequency));
  const lnSpeed = by((one) => one.timeToTarget).map((ln) => (ln === null ? null : -ln));
  const time = alike(lnSpeed);
  const k = rankWithinOrders(results, draws, first);
  return results.map((_, i) => ({
    rate: rate[i]!,
    perGram: perGram[i]!,
    turnover: turnover[i]!,
    time: time[i]!,
    k: k[i]!,
  }));
}

function rankWithinOrders(
  results: readonly RankedResult[],
  draws: ErrorDraws,
  first: number,
): (Ranking | null)[] {
  const groups = results.map(kGroupOf);
  const rankings = results.map((): Ranking | null => null);
  for (const group of new Set(groups)) {
    if (group === null) continue;
    const ln = results.map((one, i) => (groups[i] === group ? lnOf(one.kRef) : null));
    rankCandidates(ln, draws, first).forEach((one, i) => {
      if (one !== null) rankings[i] = one;
    });
  }
  return rankings;
}

function lnOf(estimate: Estimate | null): number | null {
  return estimate !== null && estimate.value > 0 ? Math.log(estimate.value) : null;
}

/** True when one factor leads from one measure to the other, so that ranks are the same. */
function isShifted(ln: readonly (number | null)[], from: readonly (number | null)[]): boolean {
  let shift: number | null = null;
  return ln.every((value, i) => {
    const other = from[i]!;
    if (value === null || other === null) return value === other;
    shift ??= value - other;
    return Math.abs(value - other - shift) < 1e-9;
  });
}

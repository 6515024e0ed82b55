import { randomStream, type RandomStream } from '../kinetics/statistics/randomStream';
import { studentDraw, type LogError } from './logError';

/** Draws of a ranking of up to a thousand candidates. */
const MOST_DRAWS = 500;
/** Draws of a long ranking: enough for a 95 % interval. */
const LEAST_DRAWS = 120;
/** Draws times candidates that a long ranking is held to. */
const MOST_WORK = 500_000;
/** Left out at either end of a 95 % interval. */
const TAIL = 0.025;

/** How the error of a candidate's ln x is made up. */
export interface ErrorParts {
  /** What no other candidate shares. */
  own: LogError;
  /** d ln x for an error of 1 in what the block's candidates share. */
  shared: readonly { block: string; loading: number }[];
}

/** The error of a block that all its candidates share. */
export interface BlockError {
  sd: number;
  dof: number;
}

/** A candidate's place with what its uncertainty leaves open. */
export interface Ranking {
  /** From 1, best first, by the estimates themselves. */
  rank: number;
  /** The ranks it takes in 95 % of the draws, its own among them; null without an error. */
  rankLow: number | null;
  rankHigh: number | null;
  /** Share of the draws that place it among the first `first`; null without an error. */
  chanceAmongFirst: number | null;
  /** True for the best and for what cannot be told from it: see `rankCandidates`. */
  tiedWithBest: boolean;
}

/** Joint draws of the errors of ln x, a row of `candidates` numbers for each draw. */
export interface ErrorDraws {
  draws: number;
  candidates: number;
  errors: Float64Array;
  /** False for candidates without an error, whose draws are 0. */
  known: readonly boolean[];
}

/**
 * Draws the errors of all candidates together: those of the blocks once for everybody, then each
 * candidate's own. The same seed gives the same draws.
 *
 * @param parts aligned with the candidates; null where the error is not known
 * @param shared size of the error that a block's candidates share
 */
export function drawErrors(
  parts: readonly (ErrorParts | null)[],
  shared: BlockError,
  seed: number,
  draws = drawsFor(parts.length),
): ErrorDraws {
  const random = randomStream(seed);
  const candidates = parts.length;
  const blocks = new Map<string, number>();
  const loadings = parts.map((one) =>
    (shared.sd > 0 ? (one?.shared ?? []) : []).map(({ block, loading }) => {
      const at = blocks.get(block) ?? blocks.size;
      blocks.set(block, at);
      return { at, loading };
    }),
  );
  const errors = new Float64Array(draws * candidates);
  const own = new Float64Array(candidates);
  const blockErrors = new Float64Array(blocks.size);
  const fill = normalPairs(random);
  for (let draw = 0; draw < draws; draw += 1) {
    fill(blockErrors);
    fill(own);
    for (let b = 0; b < blockErrors.length; b += 1) {
      blockErrors[b] = shared.sd * studentDraw(blockErrors[b]!, shared.dof);
    }
    for (let i = 0; i < candidates; i += 1) {
      const part = parts[i];
      if (!part) continue;
      let error = part.own.se * studentDraw(own[i]!, part.own.dof);
      for (const { at, loading } of loadings[i]!) error += loading * blockErrors[at]!;
      errors[draw * candidates + i] = error;
    }
  }
  return { draws, candidates, errors, known: parts.map((one) => one !== null) };
}

/** Fewer draws for a longer ranking. */
export function drawsFor(candidates: number): number {
  return Math.max(
    LEAST_DRAWS,
    Math.min(MOST_DRAWS, Math.floor(MOST_WORK / Math.max(candidates, 1))),
  );
}

/** Fills arrays with standard normals, both of each pair used (Box & Muller 1958). */
function normalPairs(random: RandomStream): (into: Float64Array) => void {
  return (into) => {
    for (let i = 0; i < into.length; i += 2) {
      const radius = Math.sqrt(-2 * Math.log(1 - random.uniform()));
      const angle = 2 * Math.PI * random.uniform();
      into[i] = radius * Math.cos(angle);
      if (i + 1 < into.length) into[i + 1] = radius * Math.sin(angle);
    }
  };
}

/**
 * Ranks candidates by ln x, highest first. Each draw adds its errors to the estimates and ranks
 * them anew; a rank interval holds the middle 95 % of the ranks so taken (Goldstein & Spiegelhalter
 * 1996). A candidate is tied with the best where the 95 % interval of ln(x/best) holds 0: where at
 * least 2.5 % of the draws put it level or in front.
 *
 * Candidates that are not ranked (a bracket between laws is no 95 % interval) are null and take no
 * rank from anybody. One without an error keeps its estimate in every draw. Breaks first where the
 * errors' sizes are themselves wrong: the draws know no bias.
 *
 * @param lnValues any one unit; null for what is not ranked; aligned with the draws
 * @param first the chance to be among how many is asked for, from 1
 */
export function rankCandidates(
  lnValues: readonly (number | null)[],
  { draws, candidates, errors, known }: ErrorDraws,
  first: number,
): (Ranking | null)[] {
  const placed = lnValues
    .map((ln, index) => ({ ln, index }))
    .filter((one): one is { ln: number; index: number } => one.ln !== null)
    .sort((a, b) => b.ln - a.ln);
  const count = placed.length;
  const ranks = new Int32Array(count * draws);
  const ahead = new Int32Array(count);
  const drawn = new Float64Array(count);
  const sorted = new Float64Array(count);
  for (let draw = 0; draw < draws; draw += 1) {
    for (let p = 0; p < count; p += 1) {
      const { ln, index } = placed[p]!;
      drawn[p] = ln + errors[draw * candidates + index]!;
    }
    sorted.set(drawn);
    sorted.sort();
    for (let p = 0; p < count; p += 1) {
      ranks[p * draws + draw] = count - lastAt(sorted, drawn[p]!);
      if (drawn[p]! >= drawn[0]!) ahead[p]! += 1;
    }
  }
  const rankings = lnValues.map((): Ranking | null => null);
  placed.forEach(({ index }, p) => {
    const rank = p + 1;
    const own = ranks.subarray(p * draws, (p + 1) * draws).sort();
    const low = own[Math.floor(TAIL * draws)]!;
    const high = own[draws - 1 - Math.floor(TAIL * draws)]!;
    const chance = own.reduce((sum, one) => sum + (one <= first ? 1 : 0), 0) / draws;
    const sure = known[index] === true;
    rankings[index] = {
      rank,
      rankLow: sure ? Math.min(low, rank) : null,
      rankHigh: sure ? Math.max(high, rank) : null,
      chanceAmongFirst: sure ? chance : null,
      tiedWithBest: p === 0 || (sure && known[placed[0]!.index]! && ahead[p]! >= TAIL * draws),
    };
  });
  return rankings;
}

/** Index of the last number of a rising array that is not above `value`, which is among them. */
function lastAt(rising: Float64Array, value: number): number {
  let [low, high] = [0, rising.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if (rising[middle]! <= value) low = middle + 1;
    else high = middle;
  }
  return low - 1;
}

import { describe, expect, it } from 'vitest';
import { fitArrhenius, lnRateConstantAt } from '../../../src/kinetics/catalyst/fitArrhenius';
import { GAS_CONSTANT } from '../../../src/kinetics/constants';
import { randomStream, type RandomStream } from '../../../src/kinetics/statistics/randomStream';
import { splitErrors, type RankedLine } from '../../../src/screening/blockErrors';
import { drawErrors, rankCandidates, type Ranking } from '../../../src/screening/ranks';

const temperaturesK = [313.15, 323.15, 333.15, 343.15];
const REFERENCE_K = 333.15;

interface Plan {
  candidates: number;
  /** Standard deviation of the candidates' true ln k at the reference. */
  spread: number;
  /** K. */
  blockErrorK: number;
  /** Of ln k, between replicates and between blocks. */
  replicateSd: number;
  ownBlockSd?: number;
  plates?: number;
}

/** Candidates with known ln k, measured twice at each temperature on shared plate runs. */
function simulate(plan: Plan, random: RandomStream) {
  const { candidates, spread, blockErrorK, replicateSd, ownBlockSd = 0, plates = 1 } = plan;
  const deltas = Array.from({ length: plates }, () =>
    temperaturesK.map(() => blockErrorK * random.normal()),
  );
  const truth: number[] = [];
  const lines = Array.from({ length: candidates }, (_, i): RankedLine & { lnK: number } => {
    const ln = spread * random.normal();
    truth.push(ln);
    const energy = 50_000 + 8_000 * random.normal();
    const plate = i % plates;
    const points = temperaturesK.flatMap((temperatureK, t) => {
      const actual = temperatureK + deltas[plate]![t]!;
      const own = ownBlockSd * random.normal();
      return [0, 1].map((replicate) => ({
        seriesId: `${i} ${t} ${replicate}`,
        temperatureK,
        lnK:
          ln -
          (energy / GAS_CONSTANT) * (1 / actual - 1 / REFERENCE_K) +
          own +
          replicateSd * random.normal(),
        se: replicateSd / 2,
        block: `plate ${plate}`,
      }));
    });
    const line = fitArrhenius(points)!;
    const { lnK, se } = lnRateConstantAt(line, REFERENCE_K);
    return { screenId: 's', line, error: { se: se!, dof: line.dof }, lnK };
  });
  return { truth, lines };
}

function rank(lines: readonly (RankedLine & { lnK: number })[], seed: number) {
  const { shared, parts } = splitErrors(lines, REFERENCE_K);
  const draws = drawErrors(parts, shared, seed, 400);
  return rankCandidates(
    lines.map((line) => line.lnK),
    draws,
    3,
  ).map((one) => one!);
}

/** Share of candidates whose true rank lies in their rank interval, and mean width of it. */
function coverage(plan: Plan, runs: number, seed: number) {
  const random = randomStream(seed);
  let [inside, total, width, ties, trueBestTied] = [0, 0, 0, 0, 0];
  for (let run = 0; run < runs; run += 1) {
    const { truth, lines } = simulate(plan, random);
    const rankings: Ranking[] = rank(lines, run + 1);
    const best = truth.indexOf(Math.max(...truth));
    trueBestTied += rankings[best]!.tiedWithBest ? 1 : 0;
    rankings.forEach((ranking, i) => {
      const trueRank = 1 + truth.filter((ln) => ln > truth[i]!).length;
      inside += ranking.rankLow! <= trueRank && trueRank <= ranking.rankHigh! ? 1 : 0;
      width += ranking.rankHigh! - ranking.rankLow!;
      ties += ranking.tiedWithBest ? 1 : 0;
      total += 1;
    });
  }
  return {
    coverage: inside / total,
    width: width / total,
    ties: ties / runs,
    trueBestTied: trueBestTied / runs,
  };
}

describe('rank intervals', () => {
  const runs = 25;

  it.each([
    { candidates: 30, spread: 0.4, blockErrorK: 0.5, replicateSd: 0.06 },
    { candidates: 30, spread: 0.4, blockErrorK: 0, replicateSd: 0.06 },
    { candidates: 30, spread: 0.4, blockErrorK: 0, replicateSd: 0.04, ownBlockSd: 0.05 },
    { candidates: 30, spread: 0.4, blockErrorK: 1, replicateSd: 0.04, plates: 3 },
    { candidates: 100, spread: 0.2, blockErrorK: 0.5, replicateSd: 0.06 },
    { candidates: 8, spread: 0.2, blockErrorK: 0.5, replicateSd: 0.05 },
  ])('cover the true rank: %o', (plan) => {
    const { coverage: covered, trueBestTied } = coverage(plan, runs, 7);
    expect(covered).toBeGreaterThan(0.93);
    expect(trueBestTied).toBeGreaterThan(0.9);
  });

  it('do not widen, nor ties multiply, for an error that all candidates share', () => {
    const plan = { candidates: 30, spread: 0.4, replicateSd: 0.06 };
    const without = coverage({ ...plan, blockErrorK: 0 }, runs, 7);
    const shared = coverage({ ...plan, blockErrorK: 0.5 }, runs, 7);
    expect(shared.width).toBeLessThan(1.2 * without.width);
    expect(shared.ties).toBeLessThan(1.3 * without.ties);
  });
});

describe('the error that a block’s candidates share', () => {
  it('is found from how their residuals go together', () => {
    const random = randomStream(21);
    let squares = 0;
    for (let run = 0; run < 20; run += 1) {
      const plan = { candidates: 24, spread: 0.5, blockErrorK: 0.8, replicateSd: 0.03, plates: 4 };
      squares += splitErrors(simulate(plan, random).lines, REFERENCE_K).shared.sd ** 2;
    }
    expect(Math.sqrt(squares / 20)).toBeGreaterThan(0.65);
    expect(Math.sqrt(squares / 20)).toBeLessThan(0.95);
  });

  it('is small where every candidate errs by itself', () => {
    const plan = {
      candidates: 40,
      spread: 0.5,
      blockErrorK: 0,
      replicateSd: 0.03,
      ownBlockSd: 0.05,
    };
    // 0.05 in ln k is 0.9 K at 50 kJ/mol and 333 K.
    expect(splitErrors(simulate(plan, randomStream(5)).lines, REFERENCE_K).shared.sd).toBeLessThan(
      0.3,
    );
  });

  it('is not made up for candidates that stand alone in their blocks', () => {
    const { lines } = simulate(
      { candidates: 3, spread: 0.5, blockErrorK: 1, replicateSd: 0.03, plates: 3 },
      randomStream(6),
    );
    const { shared, parts } = splitErrors(lines, REFERENCE_K);
    expect(shared.sd).toBe(0);
    expect(parts.map((part) => part!.own)).toEqual(lines.map((line) => line.error));
  });
});

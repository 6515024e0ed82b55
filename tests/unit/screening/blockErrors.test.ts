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
  const report = {
    coverage: inside / total,
    width: width / total,
    ties: ties / runs,
    trueBestTied: trueBestTied / runs,
  };
  if (process.env['SHOW']) console.log(plan, report);
  return report;
}

describe('rank intervals', () => {
  const runs = 60;

  it.each([
    { candidates: 30, spread: 0.4, blockErrorK: 0.5, replicateSd: 0.06 },
    { candidates: 30, spread: 0.4, blockErrorK: 0, replicateSd: 0.06 },
    { candidates: 30, spread: 0.4, blockErrorK: 0, replicateSd: 0.04, ownBlockSd: 0.05 },
    { candidates: 30, spread: 0.4, blockErrorK: 1, replicateSd: 0.04, plates: 3 },
    { candidates: 100, spread: 0.2, blockErrorK: 0.5, replicateSd: 0.06 },
    { candidates: 100, spread: 0.2, blockErrorK: 0, replicateSd: 0.06 },
    { candidates: 8, spread: 0.2, blockErrorK: 0.5, replicateSd: 0.05 },
  ])('cover the true rank: %o', (plan) => {
    const { coverage: covered, trueBestTied } = coverage(plan, runs, 7);
    expect(covered).toBeGreaterThan(0.93);
    expect(trueBestTied).toBeGreaterThan(0.9);
  });
});

import { lnGamma } from './specialFunctions';

/** Mean, variance and exact tail probabilities of the number of runs. */
export interface RunsTest {
  runs: number;
  mean: number;
  variance: number;
  /** P(R ≤ runs): small when neighbours share their sign. */
  lower: number;
  /** P(R ≥ runs). */
  upper: number;
  /** min(1, 2 min(lower, upper)). */
  twoSided: number;
}

const lnFactorials = [0];

/** ln n!; remembered, because a plate asks for few. */
function lnFactorial(n: number): number {
  if (n > 10_000) return lnGamma(n + 1);
  for (let m = lnFactorials.length; m <= n; m += 1) lnFactorials.push(lnGamma(m + 1));
  return lnFactorials[n]!;
}

const lnChoose = (n: number, k: number) =>
  k < 0 || k > n ? -Infinity : lnFactorial(n) - lnFactorial(k) - lnFactorial(n - k);

function probabilityOfRuns(runs: number, plus: number, minus: number): number {
  const total = lnChoose(plus + minus, plus);
  const half = Math.floor(runs / 2);
  if (runs % 2 === 0) {
    return 2 * Math.exp(lnChoose(plus - 1, half - 1) + lnChoose(minus - 1, half - 1) - total);
  }
  return (
    Math.exp(lnChoose(plus - 1, half) + lnChoose(minus - 1, half - 1) - total) +
    Math.exp(lnChoose(plus - 1, half - 1) + lnChoose(minus - 1, half) - total)
  );
}

/**
 * Runs test on the signs of residuals in time order (Wald & Wolfowitz 1940), exact.
 *
 * @param residuals in time order; zeros are left out
 * @returns null when one of the signs is missing or fewer than 8 residuals have a sign
 */
export function runsTest(residuals: readonly number[]): RunsTest | null {
  const signs = residuals.filter((value) => value !== 0).map((value) => value > 0);
  const plus = signs.filter(Boolean).length;
  const minus = signs.length - plus;
  if (signs.length < 8 || plus === 0 || minus === 0) return null;
  let runs = 1;
  for (let i = 1; i < signs.length; i += 1) if (signs[i] !== signs[i - 1]) runs += 1;
  return runsProbabilities(runs, plus, minus);
}

/** The test for given counts: `runs` runs among `plus` and `minus` signs, both at least 1. */
export function runsProbabilities(runs: number, plus: number, minus: number): RunsTest {
  const n = plus + minus;
  const mean = 1 + (2 * plus * minus) / n;
  const variance = ((mean - 1) * (mean - 2)) / (n - 1);
  let lower = 0;
  for (let r = 2; r <= runs; r += 1) lower += probabilityOfRuns(r, plus, minus);
  lower = Math.min(lower, 1);
  const upper = Math.min(Math.max(1 - lower + probabilityOfRuns(runs, plus, minus), 0), 1);
  return { runs, mean, variance, lower, upper, twoSided: Math.min(1, 2 * Math.min(lower, upper)) };
}

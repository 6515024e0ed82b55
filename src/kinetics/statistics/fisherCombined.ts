import { lnGamma } from './specialFunctions';

const SMALLEST = 1e-300;

/**
 * Chance that independent tests of true null hypotheses are together as small as these: the upper
 * tail of χ² with 2m degrees of freedom at −2 Σ ln p (Fisher 1932), e^(−x) Σ_{j<m} xʲ/j! with
 * x = −Σ ln p.
 *
 * Exact where each p is uniform on (0, 1). Terms are summed as logarithms, so that hundreds of
 * tests neither overflow nor vanish.
 *
 * @param tails p of each test, 0 to 1
 * @returns 1 for no tests
 */
export function fisherCombined(tails: readonly number[]): number {
  const x = -tails.reduce((sum, tail) => sum + Math.log(Math.max(tail, SMALLEST)), 0);
  if (!(x > 0)) return 1;
  let sum = 0;
  for (let j = 0; j < tails.length; j += 1) {
    sum += Math.exp(j * Math.log(x) - x - lnGamma(j + 1));
  }
  return Math.min(sum, 1);
}

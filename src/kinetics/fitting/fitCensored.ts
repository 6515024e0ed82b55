import { invertPositive } from '../statistics/positiveDefinite';
import { completeFit, type RelativeFit } from './fitLaw';
import type { FitProblem } from './problem';

const MOST_ROUNDS = 500;
const CLOSE_ENOUGH = 1e-12;
const HALVINGS = 30;

/** Where a search stands: amplitude, kRel and the noise, scaled. */
interface Place {
  amplitude: number;
  kRel: number;
  variance: number;
}

/**
 * Maximum likelihood of a law on readings of which some are only known to lie below a limit (Tobin
 * 1958): those count by the chance of a reading below it. Gauss–Newton on the mean, the noise by the
 * EM step (Dempster, Laird & Rubin 1977).
 *
 * The answer's `rss` is the sum of squares that would give the same likelihood without such readings,
 * so that AICc compares laws on the same well. Its covariance is that of the mean at the estimated
 * noise, with n − p degrees of freedom.
 *
 * @param problem readings below the limit stand in it as the limit itself
 * @param below aligned with the problem's readings
 * @param plain the least-squares fit of the same problem, where the search begins
 */
export function fitCensored(
  problem: FitProblem,
  below: readonly boolean[],
  plain: RelativeFit,
): RelativeFit {
  const { law } = plain;
  if (plain.kRel === null || plain.amplitude === null || !(plain.kRel > 0)) return plain;
  const { t, y, mode } = problem;
  const n = t.length;
  const fixed = mode === 'fraction';
  const sign = mode === 'decay' ? 1 : -1;
  const shapeAt = (kRel: number, i: number) =>
    sign === 1 ? law.relative(kRel * t[i]!) : law.converted(kRel * t[i]!);
  const lnLikelihood = ({ amplitude, kRel, variance }: Place) => {
    const sd = Math.sqrt(variance);
    let sum = 0;
    for (let i = 0; i < n; i += 1) {
      const z = (y[i]! - amplitude * shapeAt(kRel, i)) / sd;
      sum += below[i]! ? lnNormalTail(z) : -0.5 * (z * z + Math.log(2 * Math.PI * variance));
    }
    return sum;
  };
  let at: Place = {
    amplitude: plain.amplitude / problem.valueScale,
    kRel: plain.kRel * problem.timeScale,
    variance: Math.max(plain.rss / problem.valueScale ** 2 / n, 1e-12),
  };
  let best = lnLikelihood(at);
  let normal = [
    [1, 0],
    [0, 1],
  ];
  for (let round = 0; round < MOST_ROUNDS; round += 1) {
    const sd = Math.sqrt(at.variance);
    let [aa, ak, kk, ra, rk, squares] = [0, 0, 0, 0, 0, 0];
    for (let i = 0; i < n; i += 1) {
      const shape = shapeAt(at.kRel, i);
      const byRate = sign * at.amplitude * t[i]! * law.slope(at.kRel * t[i]!);
      const residual = y[i]! - at.amplitude * shape;
      let [weight, score] = [1, residual];
      if (below[i]!) {
        const z = residual / sd;
        const hazard = Math.exp(-0.5 * z * z - 0.5 * Math.log(2 * Math.PI) - lnNormalTail(z));
        weight = Math.min(Math.max(hazard * (hazard + z), 1e-12), 1);
        score = -sd * hazard;
        squares += at.variance * Math.max(1 - z * hazard, 0);
      } else squares += residual * residual;
      aa += fixed ? 0 : weight * shape * shape;
      ak += fixed ? 0 : weight * shape * byRate;
      kk += weight * byRate * byRate;
      ra += fixed ? 0 : shape * score;
      rk += byRate * score;
    }
    normal = fixed
      ? [[kk]]
      : [
          [aa, ak],
          [ak, kk],
        ];
    const inverse = invertPositive(normal);
    if (inverse === null) return plain;
    const right = fixed ? [rk] : [ra, rk];
    const step = inverse.map((row) => row.reduce((sum, value, j) => sum + value * right[j]!, 0));
    const [byAmplitude, byRate] = fixed ? [0, step[0]!] : [step[0]!, step[1]!];
    const variance = squares / n;
    let next = at;
    let reached = best;
    for (let half = 0, share = 1; half < HALVINGS; half += 1, share /= 2) {
      const trial = {
        amplitude: at.amplitude + share * byAmplitude,
        kRel: Math.max(at.kRel + share * byRate, at.kRel / 4),
        variance,
      };
      const value = lnLikelihood(trial);
      if (value >= best - 1e-12 * Math.abs(best)) {
        [next, reached] = [trial, value];
        break;
      }
    }
    const moved =
      Math.abs(next.amplitude - at.amplitude) / Math.abs(at.amplitude) +
      Math.abs(next.kRel - at.kRel) / at.kRel +
      Math.abs(next.variance - at.variance) / at.variance;
    [at, best] = [next, reached];
    if (moved < CLOSE_ENOUGH) break;
  }
  // −2 ln L = n ln(2π RSS/n) + n for readings that are all known.
  const rss = n * Math.exp((-2 * best - n) / n - Math.log(2 * Math.PI));
  const inverse = invertPositive(normal);
  const dof = n - normal.length;
  const fit = completeFit(problem, law, {
    kRel: at.kRel,
    amplitude: at.amplitude,
    rss,
    atBound: false,
    sums: { amplitude: at.amplitude, rss, aa: 1, ak: 0, kk: 1 },
  });
  if (inverse === null || !(dof > 0)) return { ...fit, covariance: null };
  const unit = (at.variance * n) / dof;
  const { valueScale, timeScale } = problem;
  const [va, vak, vk] = fixed
    ? [0, 0, inverse[0]![0]!]
    : [inverse[0]![0]!, inverse[0]![1]!, inverse[1]![1]!];
  return {
    ...fit,
    covariance: {
      aa: va * unit * valueScale ** 2,
      ak: (vak * unit * valueScale) / timeScale,
      kk: (vk * unit) / timeScale ** 2,
    },
  };
}

/** ln Φ(z) of the standard normal, to 12 digits or better; asymptotic far below 0. */
function lnNormalTail(z: number): number {
  if (z < -25) {
    const s = 1 / (z * z);
    return (
      -0.5 * z * z -
      Math.log(-z * Math.sqrt(2 * Math.PI)) +
      Math.log1p(-s * (1 - 3 * s * (1 - 5 * s)))
    );
  }
  if (z > 8) return -Math.exp(-0.5 * z * z) / (z * Math.sqrt(2 * Math.PI));
  if (z >= -2) return Math.log(0.5 + normalPart(z));
  // Continued fraction of Mills' ratio (Laplace), which converges quickly below −2.
  let fraction = 0;
  for (let i = 120; i >= 1; i -= 1) fraction = i / (-z + fraction);
  return -0.5 * z * z - 0.5 * Math.log(2 * Math.PI) - Math.log(-z + fraction);
}

/** Φ(z) − 1/2 by its series (Marsaglia, J. Stat. Softw. 2004, 11(4)). */
function normalPart(z: number): number {
  let [term, sum] = [z, z];
  for (let i = 3; i < 400 && Math.abs(term) > 1e-18 * Math.abs(sum); i += 2) {
    term *= (z * z) / i;
    sum += term;
  }
  return sum * Math.exp(-0.5 * z * z - 0.5 * Math.log(2 * Math.PI));
}

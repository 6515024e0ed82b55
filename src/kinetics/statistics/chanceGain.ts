/** Mean and variance of a gain in −2 ln L. */
export interface Gain {
  mean: number;
  variance: number;
}

/** Digamma from here on by its asymptotic series, good to 12 digits. */
const ASYMPTOTIC = 10;

/** ψ(x) and ψ′(x) for x > 0 by recurrence and asymptotic series (Abramowitz & Stegun 1964, 6.3, 6.4). */
export function polygamma(x: number): { psi: number; psi1: number } {
  let [psi, psi1, at] = [0, 0, x];
  for (; at < ASYMPTOTIC; at += 1) {
    psi -= 1 / at;
    psi1 += 1 / (at * at);
  }
  const y = 1 / (at * at);
  psi += Math.log(at) - 1 / (2 * at) - y * (1 / 12 - y * (1 / 120 - y * (1 / 252 - y / 240)));
  psi1 += 1 / at + y / 2 + (y / at) * (1 / 6 - y * (1 / 30 - y * (1 / 42 - y / 30)));
  return { psi, psi1 };
}

/**
 * What a needless parameter gains by chance: n ln(RSS/RSS′) of a least-squares fit with it, whose
 * RSS′/RSS is Beta(d/2, 1/2) for a linear model, d degrees of freedom left (Draper & Smith 1998).
 * For many readings χ² with one degree of freedom, mean 1 and variance 2; for few clearly more.
 *
 * @param readings n
 * @param dof d > 0, with the needless parameter
 */
export function chanceGain(readings: number, dof: number): Gain {
  const without = polygamma((dof + 1) / 2);
  const withIt = polygamma(dof / 2);
  return {
    mean: readings * (without.psi - withIt.psi),
    variance: readings ** 2 * (withIt.psi1 - without.psi1),
  };
}

/** The same for a parameter that must not be negative: half of the time it gains nothing. */
export function oneSidedGain({ mean, variance }: Gain): Gain {
  return { mean: mean / 2, variance: variance / 2 + (mean / 2) ** 2 };
}

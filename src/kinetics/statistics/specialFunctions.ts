const LANCZOS_G = 607 / 128;
const LANCZOS = [
  0.9999999999999971, 57.15623566586292, -59.59796035547549, 14.136097974741746,
  -0.4919138160976202, 3.399464998481189e-5, 4.652362892704858e-5, -9.837447530487956e-5,
  0.0001580887032249125, -0.00021026444172410488, 0.00021743961811521265, -0.0001643181065367639,
  8.441822398385275e-5, -2.6190838401581408e-5, 3.6899182659531625e-6,
];
const SMALLEST = 1e-300;

/**
 * ln Γ(x) for x > 0 by Lanczos' series (Lanczos 1964, coefficients of Godfrey 2001), relative
 * error near 1e-15.
 */
export function lnGamma(x: number): number {
  let series = LANCZOS[0]!;
  for (let i = 1; i < LANCZOS.length; i += 1) series += LANCZOS[i]! / (x + i);
  const t = x + LANCZOS_G + 0.5;
  return (x + 0.5) * Math.log(t) - t + Math.log((2.5066282746310007 * series) / x);
}

function betaFraction(x: number, a: number, b: number): number {
  let c = 1;
  let d = 1 - ((a + b) * x) / (a + 1);
  d = 1 / (Math.abs(d) < SMALLEST ? SMALLEST : d);
  let h = d;
  const step = (term: number) => {
    d = 1 + term * d;
    d = 1 / (Math.abs(d) < SMALLEST ? SMALLEST : d);
    c = 1 + term / c;
    if (Math.abs(c) < SMALLEST) c = SMALLEST;
    h *= d * c;
    return d * c;
  };
  for (let m = 1; m <= 2000; m += 1) {
    step((m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m)));
    const last = step((-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1)));
    if (Math.abs(last - 1) < 1e-16) break;
  }
  return h;
}

/**
 * Regularised incomplete beta function I_x(a, b), by its continued fraction (DLMF 8.17.22) and
 * Lentz's method (Lentz 1976).
 *
 * @param x 0 to 1; values outside are clamped
 * @param y 1 − x, given where it is known without cancellation
 */
export function incompleteBeta(x: number, a: number, b: number, y = 1 - x): number {
  if (x <= 0) return 0;
  if (x >= 1) return 1;
  const front = Math.exp(
    lnGamma(a + b) - lnGamma(a) - lnGamma(b) + a * Math.log(x) + b * Math.log(y),
  );
  return x < (a + 1) / (a + b + 2)
    ? (front * betaFraction(x, a, b)) / a
    : 1 - (front * betaFraction(y, b, a)) / b;
}

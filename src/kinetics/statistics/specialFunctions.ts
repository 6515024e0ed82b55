const LANCZOS_G = 607 / 128;
const LANCZOS = [
  0.99999999999999709182, 57.156235665862923517, -59.597960355475491248, 14.136097974741747174,
  -0.49191381609762019978, 0.33994649984811888699e-4, 0.46523628927048575665e-4,
  -0.98374475304879564677e-4, 0.15808870322491248884e-3, -0.21026444172410488319e-3,
  0.2174396181152126432e-3, -0.16431810653676389022e-3, 0.84418223983852743293e-4,
  -0.2619083840158140867e-4, 0.36899182659531622704e-5,
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
  return (x + 0.5) * Math.log(t) - t + Math.log((2.5066282746310005 * series) / x);
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

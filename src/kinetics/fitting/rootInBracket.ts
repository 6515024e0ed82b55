/**
 * Root of a continuous function between two points of opposite sign (Brent 1973, zeroin), to the
 * last digits.
 *
 * @param atLow f(low); @param atHigh f(high), of the opposite sign
 */
export function rootInBracket(
  f: (x: number) => number,
  low: number,
  high: number,
  atLow: number,
  atHigh: number,
): number {
  let [a, fa, b, fb] = [low, atLow, high, atHigh];
  let [c, fc] = [a, fa];
  let step = b - a;
  let before = step;
  for (let i = 0; i < 120; i += 1) {
    if (fb > 0 === fc > 0) {
      [c, fc] = [a, fa];
      step = b - a;
      before = step;
    }
    if (Math.abs(fc) < Math.abs(fb)) [a, fa, b, fb, c, fc] = [b, fb, c, fc, b, fb];
    const tolerance = 2.3e-16 * Math.abs(b);
    const half = (c - b) / 2;
    if (Math.abs(half) <= tolerance || fb === 0) break;
    if (Math.abs(before) < tolerance || Math.abs(fa) <= Math.abs(fb)) {
      step = half;
      before = half;
    } else {
      let p: number;
      let q: number;
      const s = fb / fa;
      if (a === c) {
        p = 2 * half * s;
        q = 1 - s;
      } else {
        const r = fb / fc;
        const v = fa / fc;
        p = s * (2 * half * v * (v - r) - (b - a) * (r - 1));
        q = (v - 1) * (r - 1) * (s - 1);
      }
      if (p > 0) q = -q;
      else p = -p;
      if (2 * p < Math.min(3 * half * q - Math.abs(tolerance * q), Math.abs(before * q))) {
        before = step;
        step = p / q;
      } else {
        step = half;
        before = half;
      }
    }
    [a, fa] = [b, fb];
    b += Math.abs(step) > tolerance ? step : half > 0 ? tolerance : -tolerance;
    fb = f(b);
  }
  return b;
}

/** Smallest value of a function between two points by golden section (Kiefer 1953). */
export function lowestInBracket(f: (x: number) => number, low: number, high: number): number {
  const ratio = (Math.sqrt(5) - 1) / 2;
  let [a, b] = [low, high];
  let x1 = b - ratio * (b - a);
  let x2 = a + ratio * (b - a);
  let [f1, f2] = [f(x1), f(x2)];
  for (let i = 0; i < 80 && b - a > 1e-12 * Math.max(Math.abs(a), Math.abs(b)); i += 1) {
    if (f1 < f2) {
      [b, x2, f2] = [x2, x1, f1];
      x1 = b - ratio * (b - a);
      f1 = f(x1);
    } else {
      [a, x1, f1] = [x1, x2, f2];
      x2 = a + ratio * (b - a);
      f2 = f(x2);
    }
  }
  return (a + b) / 2;
}

/**
 * Wright omega function of a real argument: the ω > 0 with ω + ln ω = x, so that W0(eˣ) = ω(x)
 * without an exponential that overflows.
 *
 * Lawrence, Corless & Jeffrey, ACM Trans. Math. Softw. 2012, 38, 20 (Algorithm 917), whose step is
 * that of Fritsch, Shafer & Crowley, Commun. ACM 1973, 16, 123: fourth order, so that two steps from
 * the starting values here reach the last digits.
 *
 * @returns 0 below the smallest double's logarithm, x − ln x… for large x; NaN for NaN
 */
export function wrightOmega(x: number): number {
  if (x < -50) return Math.exp(x);
  if (x > 1e20) return x;
  let w = start(x);
  for (let i = 0; i < 3; i += 1) {
    const r = x - w - Math.log(w);
    const q = 1 + w;
    const z = 2 * q * (q + (2 / 3) * r);
    const step = (w * (r / q) * (z - r)) / (z - 2 * r);
    w += step;
    if (Math.abs(step) <= 1e-5 * w) break;
  }
  return w;
}

/** ln ω(x): the y with y + e^y = x, down to −x itself where ω underflows. */
export function lnWrightOmega(x: number): number {
  if (x < -50) return x;
  // Far out ω is x less a logarithm, and the logarithm of ω loses no digit.
  return x > 1 ? Math.log(wrightOmega(x)) : x - wrightOmega(x);
}

/** Within a few per cent of ω, above 0. */
function start(x: number): number {
  if (x < -2) {
    const e = Math.exp(x);
    return e / (1 + e);
  }
  if (x > 2.5) {
    const l = Math.log(x);
    return x - l + l / x;
  }
  // Series about x = 1, where ω = 1.
  const h = x - 1;
  return 1 + h * (1 / 2 + h * (1 / 16 + h * (-1 / 192 - h / 3072)));
}

/**
 * Reads a finely drawn curve between its points: piecewise cubic with limited slopes, so that a
 * kink or a floor is not overshot. Fritsch & Carlson, SIAM J. Numer. Anal. 17 (1980) 238.
 *
 * @param xs strictly rising, at least two
 * @param ys same length
 * @returns the value at `x`; null outside the drawn range
 */
export function interpolate(
  xs: readonly number[],
  ys: readonly number[],
  x: number,
): number | null {
  const last = xs.length - 1;
  if (last < 1 || !(x >= xs[0]! && x <= xs[last]!)) return null;
  let right = xs.findIndex((place) => place >= x);
  if (right === 0) right = 1;
  const left = right - 1;
  const h = xs[right]! - xs[left]!;
  const t = (x - xs[left]!) / h;
  const [m0, m1] = [slopeAt(xs, ys, left) * h, slopeAt(xs, ys, right) * h];
  const t2 = t * t;
  const t3 = t2 * t;
  return (
    (2 * t3 - 3 * t2 + 1) * ys[left]! +
    (t3 - 2 * t2 + t) * m0 +
    (3 * t2 - 2 * t3) * ys[right]! +
    (t3 - t2) * m1
  );
}

function secant(xs: readonly number[], ys: readonly number[], left: number): number {
  return (ys[left + 1]! - ys[left]!) / (xs[left + 1]! - xs[left]!);
}

/** Slope at a point: the parabola through its neighbours, held to three times the flatter secant. */
function slopeAt(xs: readonly number[], ys: readonly number[], index: number): number {
  const last = xs.length - 1;
  if (last === 1) return secant(xs, ys, 0);
  if (index === 0) return limited(endSlope(xs, ys, 0, 1), secant(xs, ys, 0));
  if (index === last)
    return limited(endSlope(xs, ys, last - 1, last - 2), secant(xs, ys, last - 1));
  const before = secant(xs, ys, index - 1);
  const after = secant(xs, ys, index);
  if (before * after <= 0) return 0;
  const hBefore = xs[index]! - xs[index - 1]!;
  const hAfter = xs[index + 1]! - xs[index]!;
  const slope = (before * hAfter + after * hBefore) / (hBefore + hAfter);
  return limited(slope, Math.abs(before) < Math.abs(after) ? before : after);
}

function endSlope(xs: readonly number[], ys: readonly number[], near: number, far: number): number {
  const sNear = secant(xs, ys, near);
  const sFar = secant(xs, ys, far);
  const hNear = xs[near + 1]! - xs[near]!;
  const hFar = xs[far + 1]! - xs[far]!;
  return sNear + ((sNear - sFar) * hNear) / (hNear + hFar);
}

function limited(slope: number, secantSlope: number): number {
  if (slope * secantSlope <= 0) return 0;
  return Math.sign(slope) * Math.min(Math.abs(slope), 3 * Math.abs(secantSlope));
}

import type { ShapeSums } from './shapeSums';

const MOST_STEPS = 40;
/** A step this small leaves, by quadratic convergence, an error in the last digits only. */
const SMALL_STEP = 3e-8;

/** Sums at the last kRel that was tried, which is the optimum to eight digits once it settled. */
export const newtonSums = new Float64Array(6);
const sums = newtonSums;

/**
 * Minimises Σ(y − A f)² over kRel > 0 by Newton's method on the objective whose amplitude is
 * profiled out (Golub & Pereyra 1973), with its exact second derivative; a step that leaves the
 * bracket of the gradient's sign is replaced by one inside it.
 *
 * @param start above 0
 * @param fixed the amplitude is 1
 * @returns NaN when it does not settle
 */
export function profiledNewton(
  sumsAt: ShapeSums,
  t: Float64Array,
  y: Float64Array,
  start: number,
  fixed: boolean,
): number {
  let kRel = start;
  let low = 0;
  let high = Infinity;
  for (let i = 0; i < MOST_STEPS; i += 1) {
    sumsAt(kRel, t, y, sums);
    const p1 = sums[1]!;
    const p2 = sums[2]!;
    const q1 = sums[4]!;
    const q2 = sums[5]!;
    let gradient: number;
    let curvature: number;
    if (fixed) {
      gradient = q1 - 2 * p1;
      curvature = q2 - 2 * p2;
    } else {
      const a = sums[0]! / sums[3]!;
      const a1 = (p1 - a * q1) / sums[3]!;
      gradient = a * (a * q1 - 2 * p1);
      curvature = a * (a * q2 - 2 * p2) + 2 * a1 * (a * q1 - p1);
    }
    if (gradient < 0) low = kRel;
    else high = kRel;
    let next = curvature > 0 ? kRel - gradient / curvature : NaN;
    if (!(next > low && next < high)) next = inside(low, high);
    const moved = Math.abs(next - kRel);
    kRel = next;
    if (moved <= SMALL_STEP * kRel) return kRel;
  }
  return NaN;
}

function inside(low: number, high: number): number {
  if (high === Infinity) return 4 * low + 0.1;
  return low === 0 ? high / 4 : Math.sqrt(low * high);
}

/**
 * kRel of −dC/dt = kRel C0 (C/C0)ⁿ by the integral method: C against ∫Cⁿ dt is a straight line of
 * slope −k, whatever the noise does to single readings.
 *
 * @param order 1 or 2
 * @returns not above 0 where the readings do not fall
 */
export function integralRate(t: Float64Array, y: Float64Array, order: 1 | 2): number {
  const n = t.length;
  let integral = 0;
  let before = order === 2 ? y[0]! * y[0]! : y[0]!;
  let si = 0;
  let sy = y[0]!;
  let sii = 0;
  let siy = 0;
  for (let i = 1; i < n; i += 1) {
    const yi = y[i]!;
    const power = order === 2 ? yi * yi : yi;
    integral += 0.5 * (t[i]! - t[i - 1]!) * (power + before);
    before = power;
    si += integral;
    sy += yi;
    sii += integral * integral;
    siy += integral * yi;
  }
  const k = -(siy - (si * sy) / n) / (sii - (si * si) / n);
  return order === 2 ? k * ((sy + k * si) / n) : k;
}

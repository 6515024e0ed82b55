import { INTERVAL_ALPHA } from '../constants';
import { incompleteBeta, lnGamma } from './specialFunctions';

/** P(T > t) of Student's t (Student 1908); `dof` > 0 need not be whole. */
export function studentTUpperTail(t: number, dof: number): number {
  const square = t * t;
  if (!Number.isFinite(square)) return t > 0 ? 0 : 1;
  const half = 0.5 * incompleteBeta(dof / (dof + square), dof / 2, 0.5, square / (dof + square));
  return t >= 0 ? half : 1 - half;
}

function density(t: number, dof: number): number {
  const norm = lnGamma((dof + 1) / 2) - lnGamma(dof / 2) - 0.5 * Math.log(dof * Math.PI);
  return Math.exp(norm - ((dof + 1) / 2) * Math.log1p((t * t) / dof));
}

/**
 * Quantile of Student's t: the t that leaves `tail` above it.
 *
 * Safeguarded Newton steps on the upper tail; good to about 13 digits.
 *
 * @param tail probability above, 0 < tail ≤ 0.5
 * @param dof degrees of freedom, > 0, need not be whole
 * @throws RangeError outside these ranges
 */
export function studentTQuantile(tail: number, dof: number): number {
  if (!(tail > 0 && tail <= 0.5)) throw new RangeError(`tail must be in (0, 0.5], got ${tail}`);
  if (!(dof > 0)) throw new RangeError(`degrees of freedom must be above 0, got ${dof}`);
  let low = 0;
  let high = 2;
  while (studentTUpperTail(high, dof) > tail && high < 1e150) {
    low = high;
    high *= 2;
  }
  let t = (low + high) / 2;
  for (let i = 0; i < 200; i += 1) {
    const excess = studentTUpperTail(t, dof) - tail;
    if (excess > 0) low = t;
    else high = t;
    let next = t + excess / density(t, dof);
    if (!(next > low && next < high)) next = (low + high) / 2;
    const moved = Math.abs(next - t);
    t = next;
    if (moved <= 1e-14 * Math.max(t, 1e-3)) break;
  }
  return t;
}

const intervalFactors = new Map<number, number>();

/** t factor of the two-sided 95 % interval; remembered, because a plate asks for few values. */
export function intervalFactor(dof: number): number {
  let factor = intervalFactors.get(dof);
  if (factor === undefined) {
    factor = studentTQuantile(INTERVAL_ALPHA / 2, dof);
    if (intervalFactors.size < 1000) intervalFactors.set(dof, factor);
  }
  return factor;
}

/** P(F > f) of Fisher's F with (d1, d2) degrees of freedom. */
export function fUpperTail(f: number, d1: number, d2: number): number {
  if (!(f > 0)) return 1;
  if (!Number.isFinite(f)) return 0;
  return incompleteBeta(d2 / (d2 + d1 * f), d2 / 2, d1 / 2, (d1 * f) / (d2 + d1 * f));
}

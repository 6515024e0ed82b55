import { MODE } from '../fitting/problem';
import { log1pOver, orderSlope } from '../rateLaws/apparentOrder';
import type { ExpectedCurve } from './plannedWell';

const SINGULAR = 1e-13;

/**
 * Standard error that the free order n of −dC/dt = k Cⁿ is expected to have from given sampling
 * times: the root of its element of σ² (JᵀJ)⁻¹ over amplitude, ln kRel and n (Fisher information
 * of constant noise; Bates & Watts 1988).
 *
 * @param curve taken as true; its order is where n is expanded
 * @param timesS s, at least 4 for anything to be left over
 * @returns null where the times do not determine n
 */
export function expectedOrderSe(curve: ExpectedCurve, timesS: readonly number[]): number | null {
  const { law, amplitude, kRel, originS, residualSd } = curve;
  const mode = MODE[curve.kind];
  const sign = mode === 'decay' ? 1 : -1;
  let [aa, ak, an, kk, kn, nn] = [0, 0, 0, 0, 0, 0];
  for (const timeS of timesS) {
    const u = kRel * (timeS - originS);
    const g = law.relative(u);
    const x = (law.order - 1) * u;
    const byAmplitude =
      mode === 'fraction' ? 0 : mode === 'decay' ? g : x <= -1 ? 1 : -Math.expm1(-u * log1pOver(x));
    const byRate = sign * amplitude * u * law.slope(u);
    const byOrder = sign * amplitude * orderSlope(law.order, u, g);
    aa += byAmplitude * byAmplitude;
    ak += byAmplitude * byRate;
    an += byAmplitude * byOrder;
    kk += byRate * byRate;
    kn += byRate * byOrder;
    nn += byOrder * byOrder;
  }
  if (mode !== 'fraction') {
    if (!(aa > 0)) return null;
    kk -= (ak * ak) / aa;
    kn -= (ak * an) / aa;
    nn -= (an * an) / aa;
  }
  const determinant = kk * nn - kn * kn;
  if (!(determinant > SINGULAR * kk * nn)) return null;
  const se = residualSd * Math.sqrt(kk / determinant);
  return Number.isFinite(se) ? se : null;
}

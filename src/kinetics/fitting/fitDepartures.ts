import type { RelativeFit } from './fitLaw';
import { fitCurve, type CurveModel } from './levenbergMarquardt';

/** How well curves that are no simple order describe a well. */
export interface Departure {
  name: 'plateau' | 'deactivating';
  /** The reading's base unit, squared; that of the first order where the extra term is not wanted. */
  rss: number;
  parameters: number;
}

/** Only the sum of squares is wanted of these curves, not their constants. */
const SMALLEST_GAIN = 1e-6;

/** A level that stays: y = a e^(−κt) + b, parameters (a, ln κ, b). */
const plateau: CurveModel = (p, t, gradient) => {
  const kappa = Math.exp(p[1]!);
  const e = Math.exp(-kappa * t);
  gradient[0] = e;
  gradient[1] = -p[0]! * kappa * t * e;
  gradient[2] = 1;
  return p[0]! * e + p[2]!;
};

/** ∫ e^(−δt) dt = (1 − e^(−δt))/δ and its derivative by δ. */
function ageing(delta: number, t: number): { span: number; byDelta: number } {
  const x = delta * t;
  if (Math.abs(x) < 1e-4) return { span: t * (1 - x / 2), byDelta: t * t * (-1 / 2 + x / 3) };
  const span = -Math.expm1(-x) / delta;
  return { span, byDelta: (t * Math.exp(-x) - span) / delta };
}

/**
 * First order on a catalyst that dies exponentially: C = A exp(−(κ/δ)(1 − e^(−δt))), parameters
 * (ln κ, δ, A), without A for a fraction.
 */
function deactivating(growing: boolean): CurveModel {
  const sign = growing ? -1 : 1;
  return (p, t, gradient) => {
    const kappa = Math.exp(p[0]!);
    const a = p[2] ?? 1;
    const { span, byDelta } = ageing(p[1]!, t);
    const g = Math.exp(-kappa * span);
    gradient[0] = -sign * a * g * kappa * span;
    gradient[1] = -sign * a * g * kappa * byDelta;
    if (p.length > 2) gradient[2] = growing ? -Math.expm1(-kappa * span) : g;
    return a * (growing ? -Math.expm1(-kappa * span) : g);
  };
}

/**
 * Fits the rivals of a simple order that have three parameters: a level that stays, and a catalyst
 * that loses activity. Both hold the first order as a limit, which stands in where the extra term
 * would turn negative. Product and conversion that level off cannot be told from first order with
 * another final value, so the plateau is tried on decays only.
 *
 * Levenspiel, J. Catal. 1972, 25, 265 (deactivation).
 *
 * @param first the first-order fit of the well
 */
export function fitDepartures(first: RelativeFit): Departure[] {
  const { problem } = first;
  if (first.kRel === null || first.amplitude === null || !(first.kRel > 0)) return [];
  const kappa = first.kRel * problem.timeScale;
  const amplitude = first.amplitude / problem.valueScale;
  const unit = problem.valueScale ** 2;
  const departures: Departure[] = [];
  const keep = (p: number[]) => {
    p[1] = Math.min(Math.max(p[1]!, -30), 1e4);
    p[0] = Math.min(Math.max(p[0]!, -30), 30);
  };

  const fraction = problem.mode === 'fraction';
  let rss = first.rss / unit;
  for (const delta of [0.5, 3]) {
    const start = [Math.log(kappa * (1 + delta / 2)), delta, ...(fraction ? [] : [amplitude])];
    const found = fitCurve(
      deactivating(problem.mode !== 'decay'),
      problem.t,
      problem.y,
      start,
      keep,
      SMALLEST_GAIN,
    );
    if (found.parameters[1]! > 0) rss = Math.min(rss, found.rss);
  }
  departures.push({ name: 'deactivating', rss: rss * unit, parameters: fraction ? 2 : 3 });

  if (problem.mode === 'decay') {
    rss = first.rss / unit;
    for (const faster of [1.3, 4]) {
      const start = [0.7 * amplitude, Math.log(kappa * faster), 0.3 * amplitude];
      const found = fitCurve(plateau, problem.t, problem.y, start, keep, SMALLEST_GAIN);
      if (found.parameters[2]! > 0 && found.parameters[0]! > 0) rss = Math.min(rss, found.rss);
    }
    departures.push({ name: 'plateau', rss: rss * unit, parameters: 3 });
  }
  return departures;
}

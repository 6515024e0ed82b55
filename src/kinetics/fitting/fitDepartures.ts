import type { RelativeFit } from './fitLaw';
import { fitShape, type ShapeRange, type TwoParameterFill } from './fitShape';

/** How well curves that are no simple order describe a well. */
export interface Departure {
  name: 'plateau' | 'deactivating';
  /** The reading's base unit, squared; that of the first order where the extra term is not wanted. */
  rss: number;
  parameters: number;
}

/** Only the sum of squares is wanted of these curves, not their constants. */
const SMALLEST_GAIN = 1e-6;

/** ln κ, and the extra term, which must not turn negative. */
const range: ShapeRange = { p: [-30, 30], q: [0, 1e4] };

/** A level that stays: y = A (e^(−κt) + β), parameters ln κ and β. */
const plateau: TwoParameterFill = (lnRate, level, t, f, byRate, byLevel) => {
  const kappa = Math.exp(lnRate);
  for (let i = 0; i < t.length; i += 1) {
    const x = kappa * t[i]!;
    const e = Math.exp(-x);
    f[i] = e + level;
    byRate[i] = -x * e;
    byLevel[i] = 1;
  }
};

/**
 * First order on a catalyst that dies exponentially: g = exp(−(κ/δ)(1 − e^(−δt))), parameters ln κ
 * and δ; shape g or 1 − g.
 */
const deactivating =
  (growing: boolean): TwoParameterFill =>
  (lnRate, delta, t, f, byRate, byDelta) => {
    const kappa = Math.exp(lnRate);
    const sign = growing ? -1 : 1;
    for (let i = 0; i < t.length; i += 1) {
      const ti = t[i]!;
      const x = delta * ti;
      // ∫ e^(−δt) dt = (1 − e^(−δt))/δ and its derivative by δ.
      let span: number;
      let spanByDelta: number;
      if (x < 1e-4) {
        span = ti * (1 - x / 2);
        spanByDelta = ti * ti * (-1 / 2 + x / 3);
      } else {
        const e = Math.exp(-x);
        span = (1 - e) / delta;
        spanByDelta = (ti * e - span) / delta;
      }
      const g = Math.exp(-kappa * span);
      f[i] = growing ? -Math.expm1(-kappa * span) : g;
      byRate[i] = -sign * g * kappa * span;
      byDelta[i] = -sign * g * kappa * spanByDelta;
    }
  };

const dyingDecay = deactivating(false);
const dyingGrowth = deactivating(true);

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
  const { mode } = problem;
  const kappa = first.kRel * problem.timeScale;
  const unit = problem.valueScale ** 2;
  const fixed = mode === 'fraction';
  const departures: Departure[] = [];

  let rss = first.rss / unit;
  for (const delta of [0.5, 3]) {
    const start = { p: Math.log(kappa * (1 + delta / 2)), q: delta };
    const fill = mode === 'decay' ? dyingDecay : dyingGrowth;
    rss = Math.min(rss, fitShape(fill, problem, start, range, fixed, SMALLEST_GAIN).rss);
  }
  departures.push({ name: 'deactivating', rss: rss * unit, parameters: fixed ? 2 : 3 });

  if (mode === 'decay') {
    rss = first.rss / unit;
    for (const faster of [1.3, 4]) {
      const start = { p: Math.log(kappa * faster), q: 0.4 };
      const found = fitShape(plateau, problem, start, range, false, SMALLEST_GAIN);
      if (found.amplitude > 0) rss = Math.min(rss, found.rss);
    }
    departures.push({ name: 'plateau', rss: rss * unit, parameters: 3 });
  }
  return departures;
}

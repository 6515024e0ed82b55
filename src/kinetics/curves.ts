import { lnRateConstantAt } from './catalyst/fitArrhenius';
import { findRateLaw, rateLawOf } from './rateLaws/registry';
import type { RateLaw } from './rateLaws/rateLaw';
import { saturatingShape } from './rateLaws/saturating';
import { intervalFactor } from './statistics/tDistribution';
import type { ArrheniusLine, LawFit, RateLawName, SeriesAnalysis } from './types';

/** A curve at given abscissae with its 95 % band; the band is null where it cannot be given. */
export interface BandedCurve {
  values: number[];
  low: number[] | null;
  high: number[] | null;
}

/** What a curve needs to know of its well. */
export type CurveOwner = Pick<
  SeriesAnalysis,
  'kind' | 'productPerReactant' | 'order' | 'dimension'
>;

/**
 * The fitted curve of one law in the unit of the readings, with the 95 % confidence band of the
 * curve (delta method, t), not of single readings.
 *
 * @param timesS s on the clock of the readings
 * @returns null where the fit does not fix a curve
 */
export function evaluateFit(
  owner: CurveOwner,
  name: RateLawName,
  fit: LawFit,
  timesS: readonly number[],
): BandedCurve | null {
  const growing = owner.kind !== 'reactant' && owner.kind !== 'signal';
  const factor = owner.kind === 'product' ? owner.productPerReactant : 1;
  const curve = curveOf(name, owner.order, fit);
  if (curve === null) return null;
  if (fit.level !== null && fit.kRel !== null) return leveledCurve(curve, growing, fit, timesS);
  if (fit.kRel === null) return straightGrowth(fit, factor, timesS);
  const amplitude = owner.kind === 'conversion' ? 1 : fit.c0;
  if (amplitude === null) return null;

  const t = fit.dof > 0 ? intervalFactor(fit.dof) : null;
  const covariance = shapeCovariance(fit, owner.kind === 'conversion');
  const sign = growing ? -1 : 1;
  const values: number[] = [];
  const half: (number | null)[] = [];
  for (const time of timesS) {
    const since = growing ? Math.max(time - fit.originS, 0) : time - fit.originS;
    const at = curve(since);
    const shape = growing ? at.converted : at.relative;
    const gradient = [
      shape,
      sign * amplitude * at.byRate,
      ...(at.byCoverage === null ? [] : [sign * amplitude * at.byCoverage]),
    ];
    values.push(factor * amplitude * shape);
    const variance = covariance === null ? null : quadratic(gradient, covariance);
    half.push(t === null || variance === null ? null : t * factor * Math.sqrt(variance));
  }
  return banded(values, half);
}

/** A curve that approaches a level, in the unit of the readings. */
function leveledCurve(
  curve: (sinceS: number) => CurvePoint,
  growing: boolean,
  fit: LawFit,
  timesS: readonly number[],
): BandedCurve {
  const { amplitude, offset, covariance } = fit.level!;
  const t = fit.dof > 0 ? intervalFactor(fit.dof) : null;
  const sign = growing ? -1 : 1;
  const points = timesS.map((time) =>
    curve(growing ? Math.max(time - fit.originS, 0) : time - fit.originS),
  );
  const shapes = points.map((at) => (growing ? at.converted : at.relative));
  return banded(
    shapes.map((shape) => amplitude * shape + offset),
    points.map((at, i) =>
      t === null || covariance === null
        ? null
        : t *
          Math.sqrt(
            quadratic([shapes[i]!, sign * amplitude * at.byRate, growing ? 0 : 1], covariance),
          ),
    ),
  );
}

/** C/c0 at a time after the fit's origin, with its derivatives. */
interface CurvePoint {
  relative: number;
  /** 1 − relative, without cancellation. */
  converted: number;
  byRate: number;
  /** By σ; null for laws that have an order. */
  byCoverage: number | null;
}

function curveOf(
  name: RateLawName,
  order: number | null,
  { kRel, saturation }: LawFit,
): ((sinceS: number) => CurvePoint) | null {
  const rate = kRel ?? 0;
  if (name !== 'saturating') {
    const law = rateLawOf(name, order);
    if (law === null) return null;
    return (since) => ({
      relative: law.relative(rate * since),
      converted: law.converted(rate * since),
      byRate: since * law.slope(rate * since),
      byCoverage: null,
    });
  }
  if (saturation === null) return null;
  const { coverage } = saturation;
  const shape = saturatingShape(coverage);
  return (since) => {
    const lnW = shape.lnRelative(rate * since);
    const w = Math.exp(lnW);
    const slope = shape.slope(rate * since);
    return {
      relative: w,
      converted: -Math.expm1(lnW),
      byRate: since * slope,
      byCoverage: w === 0 ? 0 : -slope * (1 - w + lnW),
    };
  };
}

/** Covariance of (c0, kRel[, σ]), row by row; null where the fit has none. */
function shapeCovariance(fit: LawFit, fixedAmplitude: boolean): readonly number[] | null {
  if (fit.saturation !== null) return fit.saturation.covariance;
  if (fit.kRelSe === null) return null;
  const kk = fit.kRelSe ** 2;
  if (fixedAmplitude) return [0, 0, 0, kk];
  if (fit.c0Se === null || fit.covariance === null) return null;
  return [fit.c0Se ** 2, fit.covariance, fit.covariance, kk];
}

/** gᵀ V g, at least 0. */
function quadratic(gradient: readonly number[], covariance: readonly number[]): number {
  const n = gradient.length;
  let sum = 0;
  gradient.forEach((a, i) => gradient.forEach((b, j) => (sum += a * b * covariance[n * i + j]!)));
  return Math.max(sum, 0);
}

function straightGrowth(
  fit: LawFit,
  factor: number,
  timesS: readonly number[],
): BandedCurve | null {
  if (fit.k === null) return null;
  const since = timesS.map((time) => Math.max(time, 0));
  const t = fit.dof > 0 ? intervalFactor(fit.dof) : null;
  return banded(
    since.map((time) => factor * fit.k! * time),
    since.map((time) => (t === null || fit.kSe === null ? null : t * factor * fit.kSe * time)),
  );
}

function banded(values: number[], half: readonly (number | null)[]): BandedCurve {
  const known = half.every((value) => value !== null && Number.isFinite(value));
  return {
    values,
    low: known ? values.map((value, i) => value - half[i]!) : null,
    high: known ? values.map((value, i) => value + half[i]!) : null,
  };
}

/**
 * The Arrhenius line as ln k at temperatures in K, with its 95 % band.
 *
 * @returns band null where the line has no interval
 */
export function evaluateArrhenius(
  line: ArrheniusLine,
  temperaturesK: readonly number[],
): BandedCurve {
  const at = temperaturesK.map((temperature) => lnRateConstantAt(line, temperature));
  const t = line.dof > 0 ? intervalFactor(line.dof) : null;
  return banded(
    at.map(({ lnK }) => lnK),
    at.map(({ se }) => (t === null || se === null ? null : t * se)),
  );
}

/** One reading in the coordinates that are linear under each law; null where it has none. */
export interface StraightenedReading {
  timeS: number;
  zero: number;
  first: number | null;
  second: number | null;
}

/**
 * Concentrations as C, ln C and 1/C against t, for the eye only: straightening distorts the noise,
 * so nothing is fitted here.
 *
 * @param concentrations of the reactant, base unit; what is not above 0 has no ln C and no 1/C
 */
export function straighten(
  timesS: readonly number[],
  concentrations: readonly (number | null)[],
): StraightenedReading[] {
  const within = (law: RateLaw | null, c: number) =>
    c > 0 && law !== null ? law.straighten(c) : null;
  const [first, second] = [findRateLaw('first'), findRateLaw('second')];
  return timesS.flatMap((timeS, i) => {
    const c = concentrations[i];
    if (c == null) return [];
    return [{ timeS, zero: c, first: within(first, c), second: within(second, c) }];
  });
}

/**
 * Readings as concentrations of the reactant followed: C0 − P/s for product, C0 (1 − X) for
 * conversion (1 − X where C0 is not known), the reading itself for reactant and signal.
 *
 * @returns null for product whose C0 is not known
 */
export function reactantConcentrations(
  owner: Pick<SeriesAnalysis, 'kind' | 'productPerReactant' | 'c0'>,
  values: readonly (number | null)[],
): (number | null)[] | null {
  if (owner.kind === 'reactant' || owner.kind === 'signal') return [...values];
  const c0 = owner.c0?.value ?? null;
  if (owner.kind === 'conversion') {
    return values.map((value) => (value === null ? null : (c0 ?? 1) * (1 - value)));
  }
  if (c0 === null) return null;
  return values.map((value) => (value === null ? null : c0 - value / owner.productPerReactant));
}

import type { RateLaw } from '../rateLaws/rateLaw';
import { curveSums, leveragesOfCurve, residualsOfCurve, type CurveSums } from './curveSums';
import type { FitProblem } from './problem';
import { searchExhaustion } from './searchExhaustion';
import { searchRelativeRate, type RelativeRate } from './searchRelativeRate';

/** Variances and covariance of (amplitude, kRel). */
export interface AmplitudeRateCovariance {
  aa: number;
  ak: number;
  kk: number;
}

/** One law fitted to one well, in the reading's base unit and seconds. */
export interface RelativeFit {
  law: RateLaw;
  problem: FitProblem;
  /** A of the reading mode at the problem's origin; null while growth has not run out. */
  amplitude: number | null;
  /** kRel at the problem's origin, s⁻¹; null while growth has not run out. */
  kRel: number | null;
  /** Reading's base unit s⁻¹: the constant growth before exhaustion, with its variance. */
  growth: { slope: number; variance: number | null } | null;
  covariance: AmplitudeRateCovariance | null;
  rss: number;
  parameters: number;
  dof: number;
  /** Scaled sums at the optimum; null when the Jacobian is singular, or for growth. */
  regular: CurveSums | null;
}

const SINGULAR = 1e-13;

/**
 * Nonlinear least squares of one law on the readings as measured, constant noise, amplitude free
 * (Bates & Watts 1988). Covariance from the analytic Jacobian, RSS/(n − p) (JᵀJ)⁻¹; null where it
 * is singular or the optimum lies at the end of the range.
 *
 * @param problem at least 3 readings at 2 distinct times
 */
export function fitLaw(problem: FitProblem, law: RateLaw): RelativeFit {
  if (law.order === 0) {
    const zero = searchExhaustion(problem);
    if (zero.slopeOnly !== null) return growthLine(problem, law, zero.slopeOnly);
    return completeFit(problem, law, zero);
  }
  const found = searchRelativeRate(problem, law);
  const line = found.amplitude * found.kRel;
  if (problem.mode === 'growth' && found.atBound && found.kRel < 1e-3) {
    return growthLine(problem, law, line);
  }
  return completeFit(problem, law, found);
}

/** Growth along a straight line, of a scaled slope. */
export function growthLine(problem: FitProblem, law: RateLaw, slope: number): RelativeFit {
  const { t, y, valueScale, timeScale } = problem;
  const squares = t.reduce((sum, value) => sum + value * value, 0);
  const rss = y.reduce((sum, value, i) => sum + (value - slope * t[i]!) ** 2, 0);
  const dof = t.length - 1;
  const unit = valueScale / timeScale;
  return {
    law,
    problem,
    amplitude: null,
    kRel: null,
    growth: {
      slope: slope * unit,
      variance: squares > 0 ? (rss / dof / squares) * unit * unit : null,
    },
    covariance: null,
    rss: rss * valueScale * valueScale,
    parameters: 1,
    dof,
    regular: null,
  };
}

/** What follows from an optimum: covariance, degrees of freedom, base units. */
export function completeFit(problem: FitProblem, law: RateLaw, found: RelativeRate): RelativeFit {
  const { amplitude, kRel, atBound } = found;
  const { mode, valueScale, timeScale } = problem;
  const sums = found.sums ?? curveSums(problem, law, kRel, amplitude);
  const { rss, aa, ak, kk } = sums;
  const parameters = mode === 'fraction' ? 1 : 2;
  const dof = problem.t.length - parameters;
  const determinant = aa * kk - ak * ak;
  const regular = !atBound && determinant > SINGULAR * aa * kk;
  const variance = rss / dof / determinant;
  return {
    law,
    problem,
    amplitude: amplitude * valueScale,
    kRel: kRel / timeScale,
    growth: null,
    covariance: regular
      ? {
          aa: mode === 'fraction' ? 0 : variance * kk * valueScale * valueScale,
          ak: (-variance * ak * valueScale) / timeScale,
          kk: (variance * aa) / (timeScale * timeScale),
        }
      : null,
    rss: rss * valueScale * valueScale,
    parameters,
    dof,
    regular: regular ? sums : null,
  };
}

/** y − curve in the reading's base unit, in time order. */
export function residualsOf(fit: RelativeFit): number[] {
  const { problem, law, growth } = fit;
  const { t, y, valueScale, timeScale } = problem;
  if (growth !== null) {
    const slope = (growth.slope * timeScale) / valueScale;
    return Array.from(y, (value, i) => (value - slope * t[i]!) * valueScale);
  }
  const amplitude = fit.amplitude! / valueScale;
  return residualsOfCurve(problem, law, fit.kRel! * timeScale, amplitude).map(
    (residual) => residual * valueScale,
  );
}

/** Diagonal of the hat matrix, in time order; null when the Jacobian is singular. */
export function leveragesOf(fit: RelativeFit): number[] | null {
  const { problem, law, growth, regular } = fit;
  if (growth !== null) {
    const squares = problem.t.reduce((sum, value) => sum + value * value, 0);
    return squares > 0 ? Array.from(problem.t, (value) => (value * value) / squares) : null;
  }
  if (regular === null) return null;
  return leveragesOfCurve(problem, law, fit.kRel! * problem.timeScale, regular);
}

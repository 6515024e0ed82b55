import type { RateLaw } from '../rateLaws/rateLaw';
import type { FitProblem } from './problem';
import { searchExhaustion } from './searchExhaustion';
import { searchRelativeRate } from './searchRelativeRate';

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
  /** In time order. */
  residuals: number[];
  /** Diagonal of the hat matrix; null when the Jacobian is singular. */
  leverages: number[] | null;
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
    return complete(problem, law, zero.amplitude, zero.kRel, false);
  }
  const found = searchRelativeRate(problem, law);
  const line = found.amplitude * found.kRel;
  if (problem.mode === 'growth' && found.atBound && found.kRel < 1e-3) {
    return growthLine(problem, law, line);
  }
  return complete(problem, law, found.amplitude, found.kRel, found.atBound);
}

function growthLine(problem: FitProblem, law: RateLaw, slope: number): RelativeFit {
  const { t, y, valueScale, timeScale } = problem;
  const squares = t.reduce((sum, value) => sum + value * value, 0);
  const residuals = Array.from(y, (value, i) => value - slope * t[i]!);
  const rss = residuals.reduce((sum, value) => sum + value * value, 0);
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
    residuals: residuals.map((value) => value * valueScale),
    leverages: squares > 0 ? Array.from(t, (value) => (value * value) / squares) : null,
  };
}

function complete(
  problem: FitProblem,
  law: RateLaw,
  amplitude: number,
  kRel: number,
  atBound: boolean,
): RelativeFit {
  const { t, y, mode, valueScale, timeScale } = problem;
  const n = t.length;
  const byAmplitude = new Float64Array(n);
  const byRate = new Float64Array(n);
  const residuals: number[] = [];
  let [aa, ak, kk, rss] = [0, 0, 0, 0];
  for (let i = 0; i < n; i += 1) {
    const u = kRel * t[i]!;
    const shape = mode === 'decay' ? law.relative(u) : law.converted(u);
    const slope = amplitude * t[i]! * law.slope(u) * (mode === 'decay' ? 1 : -1);
    byAmplitude[i] = mode === 'fraction' ? 0 : shape;
    byRate[i] = slope;
    const residual = y[i]! - amplitude * shape;
    residuals.push(residual * valueScale);
    rss += residual * residual;
    aa += byAmplitude[i]! ** 2;
    ak += byAmplitude[i]! * slope;
    kk += slope * slope;
  }
  const parameters = mode === 'fraction' ? 1 : 2;
  const dof = n - parameters;
  if (mode === 'fraction') [aa, ak] = [1, 0];
  const determinant = aa * kk - ak * ak;
  const regular = !atBound && determinant > SINGULAR * aa * kk;
  const variance = rss / dof;
  const scaled = valueScale / timeScale;
  return {
    law,
    problem,
    amplitude: amplitude * valueScale,
    kRel: kRel / timeScale,
    growth: null,
    covariance: regular
      ? {
          aa: mode === 'fraction' ? 0 : ((variance * kk) / determinant) * valueScale * valueScale,
          ak: (-(variance * ak) / determinant) * scaled,
          kk: (variance * aa) / determinant / (timeScale * timeScale),
        }
      : null,
    rss: rss * valueScale * valueScale,
    parameters,
    dof,
    residuals,
    leverages: regular
      ? residuals.map(
          (_, i) =>
            (kk * byAmplitude[i]! ** 2 -
              2 * ak * byAmplitude[i]! * byRate[i]! +
              aa * byRate[i]! ** 2) /
            determinant,
        )
      : null,
  };
}

import type { FitProblem } from './problem';

/** The saturating law fitted to one well, on the scaled readings. */
export interface SaturatingFit {
  amplitude: number;
  /** Scaled kRel = r0/C0. */
  kRel: number;
  /** σ = K C0/(1 + K C0), 0 to 1. */
  coverage: number;
  rss: number;
  /** The readings ask for no more than this limit of the law; null inside. */
  limit: 'first' | 'zero' | null;
  /** (JᵀJ)⁻¹ of (amplitude, kRel, coverage), row by row; null at a limit or where it is singular. */
  inverse: Float64Array | null;
}

const MOST_STEPS = 60;
/** Beyond these the law is its limit. */
const LOWEST_COVERAGE = 1e-9;
const HIGHEST_COVERAGE = 1 - 1e-9;
const SMALL_STEP = 1e-6;
const MOST_DAMPING = 1e12;
const SINGULAR = 1e-14;

/** Up to this change of ln w four terms of its exponential give the last digits. */
const SHORT = 2e-4;

/** Σ of f y, f f, and their first and second derivatives by kRel (r) and σ (s). */
interface ProfileSums {
  p: number;
  q: number;
  pr: number;
  ps: number;
  prr: number;
  prs: number;
  pss: number;
  qr: number;
  qs: number;
  qrr: number;
  qrs: number;
  qss: number;
}

/**
 * One pass along the readings: (1 − σ) ln w + σ w = σ − u solved by Halley's method on ln w, which
 * starts from the Taylor series about the reading before and mostly needs one exponential.
 *
 * @param visit called with index, w, ∂w/∂kRel and ∂w/∂σ where it is given
 */
function profileSums(
  problem: FitProblem,
  kRel: number,
  coverage: number,
  out: ProfileSums,
  visit: ((i: number, w: number, byRate: number, byCoverage: number) => void) | null,
): void {
  const { t, y, mode } = problem;
  const sign = mode === 'decay' ? 1 : -1;
  const offset = mode === 'decay' ? 0 : 1;
  const free = 1 - coverage;
  let x = 0;
  let w = 1;
  /** 1/(1 − σ + σ w). */
  let id = 1;
  let before = 0;
  let [p, q, pr, ps, prr, prs, pss, qr, qs, qrr, qrs, qss] = [0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0];
  for (let i = 0; i < t.length; i += 1) {
    const ti = t[i]!;
    const u = kRel * ti;
    if (u !== before) {
      const h = (u - before) * id;
      const c = coverage * w * id;
      x += h * (-1 + h * (-0.5 * c + (h * c * (free * id - 2 * c)) / 6));
      before = u;
      for (let j = 0; j < 50; j += 1) {
        w = Math.exp(x);
        id = 1 / (free + coverage * w);
        const newton = (free * x + coverage * (w - 1) + u) * id;
        const step = -newton * (1 + 0.5 * newton * coverage * w * id);
        x += step;
        if (step < SHORT && step > -SHORT) {
          w *= 1 + step * (1 + step * (0.5 + step * (1 / 6 + step / 24)));
          id *= 2 - id * (free + coverage * w);
          break;
        }
      }
    }
    const v = w * id;
    const l = 1 - w + x;
    const byW = free * id * id;
    const wr = -ti * v;
    const ws = v * l;
    const mixed = byW * l + (1 - w) * id;
    const wrr = -ti * byW * wr;
    const wrs = mixed * wr;
    const wss = mixed * ws + v * l * (1 - w) * id;
    if (visit !== null) visit(i, w, wr, ws);
    const f = offset + sign * w;
    const sy = sign * y[i]!;
    const sf = sign * f;
    p += f * y[i]!;
    q += f * f;
    pr += wr * sy;
    ps += ws * sy;
    prr += wrr * sy;
    prs += wrs * sy;
    pss += wss * sy;
    qr += sf * wr;
    qs += sf * ws;
    qrr += wr * wr + sf * wrr;
    qrs += wr * ws + sf * wrs;
    qss += ws * ws + sf * wss;
  }
  out.p = p;
  out.q = q;
  out.pr = pr;
  out.ps = ps;
  out.prr = prr;
  out.prs = prs;
  out.pss = pss;
  out.qr = 2 * qr;
  out.qs = 2 * qs;
  out.qrr = 2 * qrr;
  out.qrs = 2 * qrs;
  out.qss = 2 * qss;
}

const trial: ProfileSums = {
  p: 0,
  q: 0,
  pr: 0,
  ps: 0,
  prr: 0,
  prs: 0,
  pss: 0,
  qr: 0,
  qs: 0,
  qrr: 0,
  qrs: 0,
  qss: 0,
};

/** Where the search stands: the objective with its exact gradient and Hessian. */
interface Place {
  kRel: number;
  coverage: number;
  rss: number;
  gr: number;
  gs: number;
  hrr: number;
  hrs: number;
  hss: number;
}

function placeAt(problem: FitProblem, yy: number, kRel: number, coverage: number): Place {
  profileSums(problem, kRel, coverage, trial, null);
  const { p, q, pr, ps, prr, prs, pss, qr, qs, qrr, qrs, qss } = trial;
  if (problem.mode === 'fraction') {
    return {
      kRel,
      coverage,
      rss: yy - 2 * p + q,
      gr: qr - 2 * pr,
      gs: qs - 2 * ps,
      hrr: qrr - 2 * prr,
      hrs: qrs - 2 * prs,
      hss: qss - 2 * pss,
    };
  }
  const a = p / q;
  const ar = (pr - a * qr) / q;
  const as = (ps - a * qs) / q;
  return {
    kRel,
    coverage,
    rss: yy - a * p,
    gr: a * (a * qr - 2 * pr),
    gs: a * (a * qs - 2 * ps),
    hrr: 2 * ar * (a * qr - pr) + a * (a * qrr - 2 * prr),
    hrs: 2 * as * (a * qr - pr) + a * (a * qrs - 2 * prs),
    hss: 2 * as * (a * qs - ps) + a * (a * qss - 2 * pss),
  };
}

/** A damped Newton step; the coverage stays where its range and the gradient hold it. */
function stepFrom(at: Place, damping: number): { kRel: number; coverage: number } {
  const held = (at.coverage <= 0 && at.gs > 0) || (at.coverage >= HIGHEST_COVERAGE && at.gs < 0);
  if (held) {
    const curvature = Math.abs(at.hrr) * (1 + damping) + 1e-300;
    return { kRel: -at.gr / curvature, coverage: 0 };
  }
  let extra = damping;
  for (;;) {
    const rr = at.hrr + extra * (Math.abs(at.hrr) + 1e-300);
    const ss = at.hss + extra * (Math.abs(at.hss) + 1e-300);
    const determinant = rr * ss - at.hrs * at.hrs;
    if (rr > 0 && ss > 0 && determinant > SINGULAR * rr * ss) {
      return {
        kRel: (at.gs * at.hrs - at.gr * ss) / determinant,
        coverage: (at.gr * at.hrs - at.gs * rr) / determinant,
      };
    }
    extra = extra === 0 ? 1e-3 : extra * 4;
    if (!(extra < MOST_DAMPING)) return { kRel: 0, coverage: 0 };
  }
}

function descend(problem: FitProblem, yy: number, kRel: number, coverage: number): Place {
  let at = placeAt(problem, yy, kRel, coverage);
  let damping = 0;
  for (let i = 0; i < MOST_STEPS && damping < MOST_DAMPING; i += 1) {
    const step = stepFrom(at, damping);
    const nextRate = Math.min(Math.max(at.kRel + step.kRel, at.kRel / 4), at.kRel * 4);
    const nextCoverage = Math.min(Math.max(at.coverage + step.coverage, 0), HIGHEST_COVERAGE);
    const moved = Math.abs(nextRate / at.kRel - 1) + Math.abs(nextCoverage - at.coverage);
    const next = placeAt(problem, yy, nextRate, nextCoverage);
    if (next.rss <= at.rss + 1e-15 * yy) {
      at = next;
      if (moved < SMALL_STEP) break;
      damping = damping < 1e-4 ? 0 : damping / 8;
    } else {
      if (moved < 1e-9) break;
      damping = damping === 0 ? 1e-2 : damping * 6;
    }
  }
  return at;
}

/**
 * Least squares of the saturating law in kRel and the coverage at the start, the amplitude profiled
 * out, by Newton's method with the exact Hessian. Both limits lie in the range, so that its sum of
 * squares is never above that of first or zero order.
 *
 * @param first scaled kRel and rss of the first-order fit; @param zero of the zero-order fit
 */
export function fitSaturating(
  problem: FitProblem,
  first: { kRel: number; rss: number },
  zero: { kRel: number; rss: number },
): SaturatingFit {
  let yy = 0;
  for (let i = 0; i < problem.y.length; i += 1) yy += problem.y[i]! * problem.y[i]!;
  const rate = first.kRel > 1e-3 ? first.kRel : 1e-3;
  // Growth leaves amplitude and kRel a long valley, where one start is not enough.
  const growing = problem.mode === 'growth';
  if (!growing && first.rss < zero.rss && first.kRel > 1e-3) {
    const bare = placeAt(problem, yy, first.kRel, 0);
    if (bare.gs > 0) return finishSaturating(problem, bare);
  }
  // The better a limit fits, the nearer to it the search begins.
  const [a, b] = [Math.sqrt(first.rss), Math.sqrt(zero.rss)];
  const start = growing || !(a + b > 0) ? 0.4 : Math.min(Math.max(a / (a + b), 0.05), 0.9);
  const between = !growing && zero.kRel > 0 ? rate * (zero.kRel / rate) ** start : 0.8 * rate;
  let at = descend(problem, yy, between, start);
  const least = Math.min(first.rss, zero.rss);
  const unsettled = at.rss > least + 1e-13 * yy;
  if (growing || (unsettled && zero.rss < first.rss)) {
    // Growth that has not run out yet has no kRel of zero order.
    const again = descend(problem, yy, zero.kRel > 0 ? zero.kRel : 1, 0.97);
    if (again.rss < at.rss) at = again;
  }
  if (unsettled && (growing || zero.rss >= first.rss)) {
    const again = descend(problem, yy, rate, 0.03);
    if (again.rss < at.rss) at = again;
  }
  return finishSaturating(problem, at);
}

/** The curve at an optimum with its derivatives by kRel and coverage, on the scaled readings. */
function curveAt(problem: FitProblem, kRel: number, coverage: number) {
  const n = problem.y.length;
  const f = new Float64Array(n);
  const byRate = new Float64Array(n);
  const byCoverage = new Float64Array(n);
  const growing = problem.mode !== 'decay';
  const sign = growing ? -1 : 1;
  profileSums(problem, kRel, coverage, trial, (i, w, wr, ws) => {
    f[i] = growing ? 1 - w : w;
    byRate[i] = sign * wr;
    byCoverage[i] = sign * ws;
  });
  const { roots, y } = problem;
  let amplitude = problem.mode === 'fraction' ? 1 : trial.p / trial.q;
  if (roots !== null) {
    let [fy, ff] = [0, 0];
    for (let i = 0; i < n; i += 1) {
      f[i]! *= roots[i]!;
      byRate[i]! *= roots[i]!;
      byCoverage[i]! *= roots[i]!;
      fy += f[i]! * y[i]!;
      ff += f[i]! * f[i]!;
    }
    if (problem.mode !== 'fraction') amplitude = fy / ff;
  }
  return { f, byRate, byCoverage, amplitude };
}

/** Readings less the curve, in the reading's base unit, in time order. */
export function saturatingResiduals(problem: FitProblem, fit: SaturatingFit): number[] {
  const { f } = curveAt(problem, fit.kRel, fit.coverage);
  return Array.from(problem.y, (y, i) => (y - fit.amplitude * f[i]!) * problem.valueScale);
}

/** Diagonal of the hat matrix; null at a limit of the law. */
export function saturatingLeverages(problem: FitProblem, fit: SaturatingFit): number[] | null {
  const { inverse } = fit;
  if (inverse === null) return null;
  const { f, byRate, byCoverage } = curveAt(problem, fit.kRel, fit.coverage);
  const fixed = problem.mode === 'fraction';
  return Array.from(f, (value, i) => {
    const row = [fixed ? 0 : value, fit.amplitude * byRate[i]!, fit.amplitude * byCoverage[i]!];
    return row.reduce(
      (sum, a, r) => sum + a * row.reduce((s, b, c) => s + b * inverse[3 * r + c]!, 0),
      0,
    );
  });
}

/** The fit at an optimum, with its inverse normal matrix. */
export function finishSaturating(
  problem: FitProblem,
  { kRel, coverage }: Pick<Place, 'kRel' | 'coverage'>,
): SaturatingFit {
  const { y, mode } = problem;
  const { f, byRate, byCoverage, amplitude } = curveAt(problem, kRel, coverage);
  let [rss, ff, rr, rs, ss, fr, fs] = [0, 0, 0, 0, 0, 0, 0];
  for (let i = 0; i < y.length; i += 1) {
    const [r, s] = [amplitude * byRate[i]!, amplitude * byCoverage[i]!];
    rss += (y[i]! - amplitude * f[i]!) ** 2;
    ff += f[i]! * f[i]!;
    rr += r * r;
    rs += r * s;
    ss += s * s;
    fr += f[i]! * r;
    fs += f[i]! * s;
  }
  const limit = coverage < LOWEST_COVERAGE ? 'first' : coverage >= HIGHEST_COVERAGE ? 'zero' : null;
  const fixed = mode === 'fraction';
  const inverse =
    limit !== null ? null : fixed ? invert(1, 0, 0, rr, rs, ss) : invert(ff, fr, fs, rr, rs, ss);
  if (inverse !== null && fixed) inverse[0] = 0;
  return { amplitude, kRel, coverage, rss, limit, inverse };
}

/** Inverse of a symmetric 3 × 3 matrix, row by row; null where it is not safely positive. */
function invert(
  a: number,
  b: number,
  c: number,
  d: number,
  e: number,
  f: number,
): Float64Array | null {
  const [m0, m1, m2] = [d * f - e * e, c * e - b * f, b * e - c * d];
  const determinant = a * m0 + b * m1 + c * m2;
  if (!(determinant > SINGULAR * a * d * f)) return null;
  const inverse = new Float64Array([
    m0,
    m1,
    m2,
    m1,
    a * f - c * c,
    b * c - a * e,
    m2,
    b * c - a * e,
    a * d - b * b,
  ]);
  return inverse.map((value) => value / determinant);
}

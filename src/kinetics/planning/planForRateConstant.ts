import { MODE } from '../fitting/problem';
import { intervalFactor } from '../statistics/tDistribution';
import { dOptimalPair, type ResponseGradient } from './dOptimalPair';
import { expectedConversion, type ExpectedCurve } from './plannedWell';
import { gatheredTimes, type SamplingLimits } from './samplingTimes';

/** Half width of the 95 % interval of kRel, as a share of it, at which k is tied down. */
export const TARGET_RATE_HALF_WIDTH = 0.1;

/** When to read a well of known law so that its rate constant comes out best. */
export interface RateConstantPlan {
  /** s: the D-optimal times, two, or one where C0 is known. */
  pointsS: number[];
  /** s, ascending: the readings, shared out over these. */
  timesS: number[];
  readings: number;
  /** Conversion at the last of the points. */
  conversion: number;
  /** Expected half width of the 95 % interval of kRel over kRel, at `timesS`. */
  relativeHalfWidth: number;
  /** Readings that are expected to reach the target; `readings` where they do already. */
  readingsForTarget: number;
}

/** u at which a zero order is read last; its best time, u = 1, is where it runs out. */
const SHORT_OF_EXHAUSTION = 0.95;
/** Beyond these the spacing of readings, not their number, decides. */
const MOST_READINGS = 400;

/**
 * D-optimal sampling for C0 and k of one law (Box & Lucas, Biometrika 1959, 46, 77), and the
 * interval expected from it.
 *
 * For C = C0 g(u), u = kRel t, of any whole order the best times are the start and u = 1: the
 * determinant is u |g'(u)| = u gⁿ there, whose derivative vanishes where n u = 1 + (n−1) u. First
 * order is read at 0 and 1/k, at 63 % conversion. Product, whose start says nothing, is read at
 * the end of the run and between.
 *
 * @param readings as many as the well had, at least 3
 * @param firstS s, the earliest reading
 * @param lastS s, the latest reading allowed
 * @returns null where no times determine k
 */
export function planForRateConstant(
  curve: ExpectedCurve,
  readings: number,
  firstS: number,
  lastS: number,
  { shortestIntervalS }: Pick<SamplingLimits, 'shortestIntervalS'>,
  target = TARGET_RATE_HALF_WIDTH,
): RateConstantPlan | null {
  const fixed = MODE[curve.kind] === 'fraction';
  const gradient = gradientOf(curve);
  const latest = latestUseful(curve, lastS);
  if (!(latest > firstS)) return null;
  const pointsS = fixed
    ? [Math.min(Math.max(curve.originS + 1 / curve.kRel, firstS), latest)]
    : dOptimalPair(gradient, [firstS, latest]);
  if (pointsS === null) return null;
  const judge = (count: number) => {
    const timesS = gatheredTimes(pointsS, count, firstS, lastS, shortestIntervalS);
    return { timesS, width: relativeHalfWidth(curve, gradient, timesS, fixed) };
  };
  const { timesS, width } = judge(readings);
  if (width === null) return null;
  let readingsForTarget = readings;
  while (
    readingsForTarget < MOST_READINGS &&
    (judge(readingsForTarget).width ?? Infinity) > target
  ) {
    readingsForTarget = Math.ceil(readingsForTarget * 1.1);
  }
  return {
    pointsS: [...pointsS],
    timesS,
    readings,
    conversion: expectedConversion(curve, pointsS[pointsS.length - 1]!),
    relativeHalfWidth: width,
    readingsForTarget,
  };
}

/** ∂y/∂A and ∂y/∂ln kRel. */
function gradientOf({ law, kind, amplitude, kRel, originS }: ExpectedCurve): ResponseGradient {
  const mode = MODE[kind];
  const sign = mode === 'decay' ? 1 : -1;
  return (timeS) => {
    const u = kRel * (timeS - originS);
    return [
      mode === 'decay' ? law.relative(u) : law.converted(u),
      sign * amplitude * u * law.slope(u),
    ];
  };
}

/** A zero order that has run out tells nothing more of its decay, so readings stop short of that. */
function latestUseful({ law, kind, kRel, originS }: ExpectedCurve, lastS: number): number {
  return law.order === 0 && MODE[kind] === 'decay'
    ? Math.min(lastS, originS + SHORT_OF_EXHAUSTION / kRel)
    : lastS;
}

function relativeHalfWidth(
  { residualSd }: ExpectedCurve,
  gradient: ResponseGradient,
  timesS: readonly number[],
  fixed: boolean,
): number | null {
  let [aa, ak, kk] = [0, 0, 0];
  for (const timeS of timesS) {
    const [byAmplitude, byRate] = gradient(timeS);
    aa += byAmplitude * byAmplitude;
    ak += byAmplitude * byRate;
    kk += byRate * byRate;
  }
  const information = fixed ? kk : kk - (ak * ak) / aa;
  const dof = timesS.length - (fixed ? 1 : 2);
  if (!(information > 0) || dof < 1) return null;
  return (intervalFactor(dof) * residualSd) / Math.sqrt(information);
}

import { invertPositive, solvePositive } from '../../statistics/positiveDefinite';
import type { OneStepLaw } from './oneStepLaw';
import { wellTerms, type OneStepWell, type WellTerms } from './wellTerms';

/** The shared constants with what each well says about its own. */
export interface OneStepSolution {
  /** For each constant its ln at the centre and its slope over the scaled x. */
  shared: number[];
  lnAmplitudes: number[];
  /** Of `shared`, for the variances given; null where it is singular. */
  covariance: number[][] | null;
  /** For each well the information on its own ln constants, its amplitude eliminated. */
  information: number[][][];
  chi2: number;
  readings: number;
  /** Fitted amplitudes and shared constants. */
  parameters: number;
  converged: boolean;
}

const MOST_STEPS = 60;
const MOST_DAMPING = 1e10;
/** Squared step in units of its own error that is the last one worth taking. */
const SETTLED = 1e-9;
/** The same for short steps: the end of a zero order is a kink, into which they creep. */
const CREEPING = 1e-3;
const CREEPING_DAMPING = 1;

/** The well's share of the normal equations once its amplitude is eliminated. */
function eliminate({ shared, cross, own, sharedRight, ownRight }: WellTerms, damping: number) {
  const damped = own * (1 + damping);
  if (own === 0) return { matrix: shared, right: sharedRight };
  return {
    matrix: shared.map((row, a) => row.map((value, b) => value - (cross[a]! * cross[b]!) / damped)),
    right: sharedRight.map((value, a) => value - (cross[a]! * ownRight) / damped),
  };
}

/** Adds a well's matrix over its ln constants to that over (level, slope) pairs. */
function spread(normal: number[][], matrix: readonly (readonly number[])[], x: number): void {
  const z = [1, x];
  matrix.forEach((row, a) =>
    row.forEach((value, b) => {
      for (const i of [0, 1])
        for (const j of [0, 1]) normal[2 * a + i]![2 * b + j]! += value * z[i]! * z[j]!;
    }),
  );
}

const zeros = (n: number) => Array.from({ length: n }, () => new Array<number>(n).fill(0));

interface State {
  shared: number[];
  lnAmplitudes: number[];
  terms: WellTerms[];
  chi2: number;
}

/**
 * Weighted nonlinear least squares of all readings of all wells under one law, the constants on
 * straight lines against 1/T and one amplitude per well (Bates & Watts 1988). Gauss–Newton steps
 * with damping (Marquardt 1963); the normal matrix has the shape of an arrow, so the amplitudes are
 * eliminated well by well and only the shared constants are solved for together.
 *
 * Breaks first where the start is far off: it is meant to begin at the answer of the single wells.
 *
 * @param start shared (level, slope) pairs, ln of base units and the wells' scaled x
 */
export function solveOneStep(
  law: OneStepLaw,
  wells: readonly OneStepWell[],
  start: readonly number[],
): OneStepSolution {
  const at = (shared: number[], lnAmplitudes: number[]): State => {
    const terms = wells.map((well, i) => wellTerms(law, well, shared, lnAmplitudes[i]!));
    return {
      shared,
      lnAmplitudes,
      terms,
      chi2: terms.reduce((sum, term) => sum + term.chi2, 0),
    };
  };
  let state = at(
    [...start],
    wells.map((well) => well.lnAmplitude),
  );
  const readings = wells.reduce((sum, well) => sum + well.values.length, 0);
  const parameters = start.length + wells.filter((well) => well.mode !== 'fraction').length;
  const noise = () => state.chi2 / Math.max(readings - parameters, 1);
  let damping = 0;
  let converged = false;
  for (let step = 0; step < MOST_STEPS && !converged; step += 1) {
    const move = stepFrom(state, wells, damping);
    const next =
      move === null
        ? null
        : at(
            state.shared.map((value, i) => value + move.shared[i]!),
            state.lnAmplitudes.map((value, i) => value + move.lnAmplitudes[i]!),
          );
    const creeps = damping >= CREEPING_DAMPING;
    const settled = move !== null && move.size <= (creeps ? CREEPING : SETTLED) * noise();
    if (next !== null && next.chi2 <= state.chi2) {
      state = next;
      damping = damping > 1e-8 ? damping / 10 : 0;
      converged = settled;
      continue;
    }
    // Rounding alone keeps a settled search from going further down.
    converged = settled || (move !== null && move.largest < 1e-9);
    damping = Math.max(damping * 10, 1e-4);
    if (damping > MOST_DAMPING) break;
  }
  const information = state.terms.map((terms) => eliminate(terms, 0).matrix);
  const normal = zeros(start.length);
  information.forEach((matrix, i) => spread(normal, matrix, wells[i]!.x));
  return {
    shared: state.shared,
    lnAmplitudes: state.lnAmplitudes,
    covariance: invertPositive(normal),
    information,
    chi2: state.chi2,
    readings,
    parameters,
    converged: converged && Number.isFinite(state.chi2),
  };
}

/** One damped step; null where the normal matrix is singular. */
function stepFrom(state: State, wells: readonly OneStepWell[], damping: number) {
  const normal = zeros(state.shared.length);
  const diagonal = zeros(state.shared.length);
  const right = state.shared.map(() => 0);
  state.terms.forEach((terms, i) => {
    const x = wells[i]!.x;
    const reduced = eliminate(terms, damping);
    spread(normal, reduced.matrix, x);
    spread(diagonal, terms.shared, x);
    reduced.right.forEach((value, a) => {
      right[2 * a]! += value;
      right[2 * a + 1]! += value * x;
    });
  });
  normal.forEach((row, i) => (row[i]! += damping * diagonal[i]![i]!));
  const shared = solvePositive(normal, right);
  if (shared?.every(Number.isFinite) !== true) return null;
  let size = shared.reduce((sum, value, i) => sum + value * right[i]!, 0);
  const lnAmplitudes = state.terms.map(({ own, ownRight, cross }, i) => {
    if (own === 0) return 0;
    const x = wells[i]!.x;
    const moved = cross.reduce(
      (sum, value, a) => sum + value * (shared[2 * a]! + shared[2 * a + 1]! * x),
      0,
    );
    size += ownRight ** 2 / (own * (1 + damping));
    return (ownRight - moved) / (own * (1 + damping));
  });
  const largest = Math.max(...[...shared, ...lnAmplitudes].map(Math.abs));
  return { shared, lnAmplitudes, size, largest };
}

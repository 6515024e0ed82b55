import { levenbergMarquardt } from 'ml-levenberg-marquardt';
import { saturatingShape } from '../../kinetics/rateLaws/saturating';
import type { BenchSeries } from './benchSeries';

type Curve = (parameters: number[]) => (t: number) => number;

/** Curves of C0 and kRel, and the coverage for the saturating one, times scaled to 1. */
const CURVES: readonly Curve[] = [
  ([c0, k]) =>
    (t) =>
      c0! * Math.max(1 - k! * t, 0),
  ([c0, k]) =>
    (t) =>
      c0! * Math.exp(-k! * t),
  ([c0, k]) =>
    (t) =>
      c0! / (1 + k! * t),
  ([c0, k, s]) => {
    const shape = saturatingShape(Math.min(Math.max(s!, 0), 1 - 1e-9));
    return (t) => c0! * shape.relative(k! * t);
  },
];

/** The same laws by the package ml-levenberg-marquardt, with steps that suit scaled readings. */
export function fitByPackage(series: readonly BenchSeries[], laws: 3 | 4): number {
  let sum = 0;
  for (const { times, values } of series) {
    const span = times[times.length - 1]!;
    const top = Math.max(...values);
    const x = times.map((t) => t / span);
    const y = values.map((value) => value / top);
    for (const curve of CURVES.slice(0, laws)) {
      const saturating = curve === CURVES[3];
      const found = levenbergMarquardt({ x, y }, curve, {
        initialValues: saturating ? [1, 1, 0.4] : [1, 1],
        minValues: saturating ? [0, 1e-6, 0] : [0, 1e-6],
        gradientDifference: saturating ? [1e-6, 1e-6, 1e-6] : [1e-6, 1e-6],
        damping: 1e-3,
        maxIterations: 100,
        errorTolerance: 0,
        improvementThreshold: 1e-10,
      });
      sum += found.parameterError;
    }
  }
  return sum;
}

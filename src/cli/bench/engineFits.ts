import { scaleReadings } from '../../kinetics/fitting/problem';
import type { Readings } from '../../kinetics/fitting/readings';
import { rateLaws } from '../../kinetics/rateLaws/registry';
import { estimate } from '../../kinetics/statistics/estimate';
import { fitOrder, fitSaturation } from '../../kinetics/verdict/fittedLaw';
import { seriesOf } from '../../calibration/judgeWells';
import type { BenchSeries } from './benchSeries';

/** Readings ready to fit, made once: no fitter is charged for them. */
export function prepare(series: readonly BenchSeries[]) {
  return series.map(({ times, values }) => {
    const readings: Readings = {
      times,
      values,
      indices: times.map((_, i) => i),
      excluded: 0,
      unsorted: false,
      distinctTimes: times.length,
    };
    return { series: seriesOf({ timesS: times, values }), readings };
  });
}

/**
 * Fits zero, first and second order, and the saturating law with four, to each series: k with
 * standard error, AICc and interval.
 *
 * @returns a sum over the answers, so that nothing is left out as unused
 */
export function fitAll(prepared: ReturnType<typeof prepare>, laws: 3 | 4): number {
  let sum = 0;
  for (const { series, readings } of prepared) {
    const problem = scaleReadings(readings, series.kind);
    const fits = rateLaws.map((law) => fitOrder(problem, law, series, readings));
    const all =
      laws === 3
        ? fits
        : [...fits, fitSaturation(problem, fits[1]!.relative, fits[0]!.relative, series, readings)];
    for (const fitted of all) {
      if (fitted === null) continue;
      const k = estimate(fitted.fit.k, fitted.fit.kSe, fitted.fit.dof);
      sum += (k?.high ?? 0) + (fitted.fit.aicc ?? 0);
    }
  }
  return sum;
}

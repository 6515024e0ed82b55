import type { ArrheniusLine, ReferenceConditions, WarningCode } from '../types';
import type { PooledWell } from './pooledWell';
import { bendWarnings } from './bendWarnings';
import { referenceConcentration } from './lawBasis';
import { countTemperatures, SAME_TEMPERATURE_K } from './temperatures';

/** J/mol; below it external transport is likely to set the rate (common practice). */
const LOW_ACTIVATION_ENERGY = 20_000;
/** A reference concentration this far outside the measured range still counts as inside. */
const CONCENTRATION_SLACK = 1.1;

/** Warnings about the Arrhenius line and about reading it where nothing was measured. */
export function warnOfTemperatures(
  wells: readonly PooledWell[],
  line: ArrheniusLine | null,
  reference: ReferenceConditions,
): WarningCode[] {
  const warnings: WarningCode[] = [];
  const temperatures = wells.map((well) => well.series.temperatureK);
  const count = countTemperatures(temperatures);
  if (count === 1) warnings.push('one-temperature');
  if (count === 2) warnings.push('two-temperatures');
  if (line !== null) {
    if (line.activationEnergy < 0) warnings.push('negative-activation-energy');
    else if (line.activationEnergy < LOW_ACTIVATION_ENERGY) warnings.push('low-activation-energy');
    warnings.push(...bendWarnings(wells, line.points));
  }
  const t = reference.temperatureK;
  if (
    t !== null &&
    (t < Math.min(...temperatures) - SAME_TEMPERATURE_K ||
      t > Math.max(...temperatures) + SAME_TEMPERATURE_K)
  ) {
    warnings.push('extrapolated-temperature');
  }
  if (outsideMeasured(wells, reference)) warnings.push('extrapolated-concentration');
  return warnings;
}

function outsideMeasured(wells: readonly PooledWell[], reference: ReferenceConditions): boolean {
  const c = referenceConcentration(reference, wells[0]?.analysis.dimension ?? 'ratio');
  if (c === null) return false;
  const ranges = wells.flatMap(({ firstConcentration, analysis }) =>
    firstConcentration === null
      ? []
      : [[firstConcentration, firstConcentration * (1 - (analysis.conversion ?? 0))] as const],
  );
  if (ranges.length === 0) return false;
  const high = Math.max(...ranges.map(([first]) => first));
  const low = Math.min(...ranges.map(([, last]) => last));
  return c > high * CONCENTRATION_SLACK || c < low / CONCENTRATION_SLACK;
}

import type { DecaySeries, ReferenceConditions } from '../kinetics/types';
import {
  dimensionOf,
  toBaseReading,
  toGrams,
  toGramsPerLitre,
  toKelvin,
  toLitres,
  toMolPerKg,
  toSeconds,
} from '../kinetics/units';
import type { BatchReference, BatchSeries } from './batchSchema';

/** A series of a batch as the engine takes it, in base units. */
export function decaySeriesOf(series: BatchSeries): DecaySeries {
  const { reading, time } = series;
  const initial = series.initialConcentration ?? reading.initialConcentration;
  const mass = series.catalystMass && toGrams(series.catalystMass.value, series.catalystMass.unit);
  const volume = series.volume && toLitres(series.volume.value, series.volume.unit);
  const kind = reading.kind ?? 'reactant';
  const density = series.siteDensity;
  return {
    id: series.id,
    catalyst: series.catalyst ?? null,
    role: series.role ?? 'sample',
    block: series.block ?? null,
    temperatureK: toKelvin(series.temperature.value, series.temperature.unit),
    timesS: time.values.map((value) => toSeconds(value, time.unit)),
    values: reading.values.map((value) =>
      value === null ? null : toBaseReading(value, reading.unit),
    ),
    dimension:
      kind === 'conversion' && initial ? dimensionOf(initial.unit) : dimensionOf(reading.unit),
    kind,
    initialConcentration: initial ? toBaseReading(initial.value, initial.unit) : null,
    productPerReactant: series.productPerReactant ?? reading.productPerReactant ?? 1,
    loadingGPerL: mass === undefined || volume === undefined ? null : mass / volume,
    siteDensityMolPerKg: density ? toMolPerKg(density.value, density.unit) : null,
    nu: series.nu ?? 1,
    law: series.law ?? 'auto',
    level: series.residual === true || (series.baseline ?? reading.baseline) === true,
  };
}

/** Reference conditions in base units; what is not given is null. */
export function referenceOf(reference: BatchReference): ReferenceConditions {
  const { temperature, concentration, catalystLoading, targetConversion } = reference;
  return {
    temperatureK: temperature ? toKelvin(temperature.value, temperature.unit) : null,
    concentration: concentration ? toBaseReading(concentration.value, concentration.unit) : null,
    concentrationDimension: concentration ? dimensionOf(concentration.unit) : null,
    loadingGPerL: catalystLoading
      ? toGramsPerLitre(catalystLoading.value, catalystLoading.unit)
      : null,
    targetConversion: targetConversion ?? null,
  };
}

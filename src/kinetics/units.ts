import type { ReadingDimension } from './types';

/** Kelvin at 0 °C, exact. */
const ICE_POINT_K = 273.15;

/** Accepted units and their factor to the base unit. */
const TIME_UNITS = { ms: 1e-3, s: 1, min: 60, h: 3600, d: 86_400 } as const;
const MASS_UNITS = { g: 1, mg: 1e-3, kg: 1e3 } as const;
const VOLUME_UNITS = { L: 1, mL: 1e-3, uL: 1e-6 } as const;
const SITE_DENSITY_UNITS = { 'umol/g': 1e-3, 'mol/kg': 1 } as const;
const LOADING_UNITS = { 'g/L': 1, 'mg/L': 1e-3, 'mg/mL': 1, 'kg/L': 1e3 } as const;
const CONCENTRATION_UNITS = { 'mol/L': 1, 'mmol/L': 1e-3, 'umol/L': 1e-6 } as const;
const PRESSURE_UNITS = { Pa: 1, kPa: 1e3, bar: 1e5, mbar: 100 } as const;
const RATIO_UNITS = { '1': 1, '%': 0.01 } as const;
const READING_UNITS = { ...CONCENTRATION_UNITS, ...PRESSURE_UNITS, ...RATIO_UNITS };

export type TemperatureUnit = 'K' | 'degC';
export type TimeUnit = keyof typeof TIME_UNITS;
export type MassUnit = keyof typeof MASS_UNITS;
export type VolumeUnit = keyof typeof VOLUME_UNITS;
export type SiteDensityUnit = keyof typeof SITE_DENSITY_UNITS;
export type LoadingUnit = keyof typeof LOADING_UNITS;
export type ConcentrationUnit = keyof typeof CONCENTRATION_UNITS;
export type PressureUnit = keyof typeof PRESSURE_UNITS;
export type RatioUnit = keyof typeof RATIO_UNITS;
export type ReadingUnit = ConcentrationUnit | PressureUnit | RatioUnit;

const keysOf = <T extends object>(units: T) => Object.keys(units) as (keyof T & string)[];

export const temperatureUnits: readonly TemperatureUnit[] = ['K', 'degC'];
export const timeUnits = keysOf(TIME_UNITS);
export const massUnits = keysOf(MASS_UNITS);
export const volumeUnits = keysOf(VOLUME_UNITS);
export const siteDensityUnits = keysOf(SITE_DENSITY_UNITS);
export const loadingUnits = keysOf(LOADING_UNITS);
export const concentrationUnits = keysOf(CONCENTRATION_UNITS);
export const pressureUnits = keysOf(PRESSURE_UNITS);
export const ratioUnits = keysOf(RATIO_UNITS);
export const readingUnits: readonly ReadingUnit[] = [
  ...concentrationUnits,
  ...pressureUnits,
  ...ratioUnits,
];

/**
 * Value × factor, dividing where the factor is a reciprocal of a whole number, so that 25 µmol/L
 * is 2.5e-5 mol/L to the last digit.
 */
function scale(value: number, factor: number): number {
  return factor < 1 ? value / Math.round(1 / factor) : value * factor;
}

/** Temperature in K. */
export function toKelvin(value: number, unit: TemperatureUnit): number {
  return unit === 'K' ? value : value + ICE_POINT_K;
}

/** Time in s. */
export const toSeconds = (value: number, unit: TimeUnit) => scale(value, TIME_UNITS[unit]);

/** Mass in g. */
export const toGrams = (value: number, unit: MassUnit) => scale(value, MASS_UNITS[unit]);

/** Volume in L. */
export const toLitres = (value: number, unit: VolumeUnit) => scale(value, VOLUME_UNITS[unit]);

/** Active sites in mol/kg. */
export const toMolPerKg = (value: number, unit: SiteDensityUnit) =>
  scale(value, SITE_DENSITY_UNITS[unit]);

/** Catalyst loading in g/L. */
export const toGramsPerLitre = (value: number, unit: LoadingUnit) =>
  scale(value, LOADING_UNITS[unit]);

/** The dimension of a reading's unit. */
export function dimensionOf(unit: ReadingUnit): ReadingDimension {
  if (unit in CONCENTRATION_UNITS) return 'concentration';
  return unit in PRESSURE_UNITS ? 'pressure' : 'ratio';
}

/** A reading in the base unit of its dimension: mol/L, Pa or 1. */
export function toBaseReading(value: number, unit: ReadingUnit): number {
  return scale(value, READING_UNITS[unit]);
}

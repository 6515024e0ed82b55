import type { ReadingDimension, ReadingKind } from '../../kinetics/types';

/** A unit to show in, and what a base-unit value is multiplied with to get there. */
export interface DisplayUnit {
  /** Empty for plain numbers. */
  unit: string;
  factor: number;
}

const readingUnits: Record<ReadingDimension, readonly DisplayUnit[]> = {
  concentration: [
    { unit: 'mol/L', factor: 1 },
    { unit: 'mmol/L', factor: 1e3 },
    { unit: 'µmol/L', factor: 1e6 },
    { unit: 'nmol/L', factor: 1e9 },
  ],
  pressure: [
    { unit: 'bar', factor: 1e-5 },
    { unit: 'kPa', factor: 1e-3 },
    { unit: 'Pa', factor: 1 },
  ],
  ratio: [{ unit: '', factor: 1 }],
};

const timeUnits: readonly DisplayUnit[] = [
  { unit: 'd', factor: 1 / 86_400 },
  { unit: 'h', factor: 1 / 3600 },
  { unit: 'min', factor: 1 / 60 },
  { unit: 's', factor: 1 },
];

/** The unit in which the largest reading is at least 1, from mol/L, Pa or 1. */
export function readingUnitFor(dimension: ReadingDimension, largest: number): DisplayUnit {
  const units = readingUnits[dimension];
  const fits = units.find(({ factor }) => Math.abs(largest) * factor >= 0.9995);
  return fits ?? (units.at(-1) as DisplayUnit);
}

/** The unit in which the longest time is at least 3, from seconds. */
export function timeUnitFor(longestS: number): DisplayUnit {
  return timeUnits.find(({ factor }) => longestS * factor >= 3) ?? { unit: 's', factor: 1 };
}

/** What a reading of this kind is called on an axis. */
export function readingName(kind: ReadingKind, reactant: string): string {
  switch (kind) {
    case 'reactant':
      return reactant;
    case 'product':
      return 'Product';
    case 'conversion':
      return 'Conversion';
    case 'signal':
      return `Signal of ${reactant}`;
  }
}

/** `name, unit`, or the name alone for plain numbers. */
export function withUnit(name: string, unit: string): string {
  return unit === '' ? name : `${name}, ${unit}`;
}

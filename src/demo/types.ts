import type { ReadingDimension, WellRole } from '../kinetics/types';

/** How a catalyst of the demo really behaves; what an analysis should find again. */
export interface CatalystTruth {
  code: string;
  law: 'zero' | 'first' | 'second' | 'saturating' | 'deactivating' | 'none';
  /** At the campaign's reference temperature and loading, in mol/L and s; 0 for `none`. */
  k: number;
  /** J/mol. */
  activationEnergy: number;
  /** L/mol at the reference temperature; only for `saturating`. */
  adsorptionConstant: number | null;
  /** J/mol; only for `saturating`. */
  adsorptionEnthalpy: number | null;
  /** s⁻¹, deactivation C = C0 exp(−(k/kd)(1 − e^(−kd t))); only for `deactivating`. */
  deactivationRate: number | null;
  /** Factor on the screen's noise; 1 for an ordinary well. */
  noiseFactor: number;
  /** What a chemist should make of it. */
  story: 'clear' | 'undecidable' | 'dead' | 'deactivating' | 'transport-limited';
}

/** A catalyst's card. */
export interface DemoCatalyst {
  code: string;
  composition: string;
  support: string;
  /** Mass percent. */
  metalLoadingPercent: number;
  lot: string;
  siteDensityMolPerKg: number | null;
  surfaceAreaM2PerG: number | null;
  particleSizeUm: number | null;
  hazards: string | null;
}

export interface DemoScreen {
  name: string;
  /** ISO date. */
  performedOn: string;
  /** A role, not a person. */
  operator: string;
  fileName: string;
  /** An .xlsx workbook, read like any upload. */
  bytes: Uint8Array;
}

export interface DemoCampaign {
  name: string;
  reactant: string;
  nu: number;
  dimension: ReadingDimension;
  referenceTemperatureK: number;
  /** mol/L. */
  referenceConcentration: number;
  referenceLoadingGPerL: number;
  targetConversion: number;
  /** Gas and pressure, co-reactant, solvent, pH, stirring. */
  conditions: string;
  /** What a candidate has to reach, in words. */
  thresholds: string;
  benchmark: string;
  catalysts: DemoCatalyst[];
  screens: DemoScreen[];
}

export interface DemoGroup {
  name: string;
  campaigns: DemoCampaign[];
}

export interface Demo {
  groups: DemoGroup[];
}

/** One well of a generated screen, before it is written to a workbook. */
export interface GeneratedWell {
  plate: string;
  position: string;
  catalyst: string | null;
  role: WellRole;
  temperatureC: number;
  measuredTemperatureC: number | null;
  massMg: number;
  volumeMl: number;
  replicate: number;
  timesMin: number[];
  /** mmol/L, rounded as an instrument would. */
  readings: number[];
}

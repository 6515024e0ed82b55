import type { CatalystTruth } from './types';

/** Shorthands; `ea` and `enthalpy` in kJ/mol. */
const base = {
  adsorptionConstant: null,
  adsorptionEnthalpy: null,
  deactivationRate: null,
  noiseFactor: 1,
  story: 'clear',
} as const satisfies Partial<CatalystTruth>;

const simple = (
  code: string,
  law: 'zero' | 'first' | 'second',
  k: number,
  ea: number,
): CatalystTruth => ({ ...base, code, law, k, activationEnergy: ea * 1000 });

const saturating = (
  code: string,
  k: number,
  ea: number,
  adsorptionConstant: number,
  enthalpy: number,
): CatalystTruth => ({
  ...base,
  code,
  law: 'saturating',
  k,
  activationEnergy: ea * 1000,
  adsorptionConstant,
  adsorptionEnthalpy: enthalpy * 1000,
});

const deactivating = (code: string, k: number, ea: number, deactivationRate: number) => ({
  ...simple(code, 'first', k, ea),
  law: 'deactivating' as const,
  deactivationRate,
  story: 'deactivating' as const,
});

const undecidable = (code: string, k: number, ea: number, noiseFactor: number) => ({
  ...simple(code, 'first', k, ea),
  noiseFactor,
  story: 'undecidable' as const,
});

const dead = (code: string): CatalystTruth => ({
  ...base,
  code,
  law: 'none',
  k: 0,
  activationEnergy: 0,
  story: 'dead',
});

/** The benchmark of *Bromate hydrogenation in water*. */
export const MARLBECK_BENCHMARK = simple('MB-00', 'first', 4.6e-4, 47);

/** The 24 candidates; k at 60 °C and 2.5 g/L. */
export const MARLBECK_TRUTHS: readonly CatalystTruth[] = [
  simple('MB-01', 'first', 3.4e-4, 52),
  saturating('MB-02', 1.25e-6, 58, 1500, -24),
  undecidable('MB-03', 9e-6, 55, 1),
  simple('MB-04', 'second', 0.16, 49),
  simple('MB-05', 'first', 6.2e-4, 44),
  dead('MB-06'),
  saturating('MB-07', 1.9e-6, 55, 1100, -28),
  simple('MB-08', 'zero', 5.6e-7, 61),
  simple('MB-09', 'first', 2.5e-4, 63),
  { ...simple('MB-10', 'first', 7.4e-4, 11), story: 'transport-limited' },
  saturating('MB-11', 8.6e-7, 64, 2200, -20),
  undecidable('MB-12', 1e-4, 50, 18),
  simple('MB-13', 'first', 4.9e-4, 57),
  simple('MB-14', 'second', 0.27, 43),
  deactivating('MB-15', 6.5e-4, 48, 5.5e-4),
  saturating('MB-16', 1.5e-6, 51, 900, -31),
  simple('MB-17', 'first', 2.9e-4, 46),
  undecidable('MB-18', 1.2e-5, 60, 1.5),
  simple('MB-19', 'zero', 4.4e-7, 53),
  dead('MB-20'),
  simple('MB-21', 'first', 8.4e-4, 50),
  saturating('MB-22', 1.1e-6, 60, 1800, -26),
  simple('MB-23', 'second', 0.2, 55),
  simple('MB-24', 'first', 5.5e-4, 41),
];

/** Eight further candidates, in the workbook that a newcomer uploads. */
export const SAMPLE_TRUTHS: readonly CatalystTruth[] = [
  simple('MB-25', 'first', 9.6e-4, 49),
  saturating('MB-26', 1.7e-6, 56, 1300, -25),
  simple('MB-27', 'first', 3.1e-4, 54),
  simple('MB-28', 'second', 0.23, 47),
  undecidable('MB-29', 1.1e-5, 52, 1),
  simple('MB-30', 'first', 5.2e-4, 59),
  deactivating('MB-31', 8e-4, 45, 6e-4),
  simple('MB-32', 'zero', 6.3e-7, 57),
];

/** The benchmark and candidates of *Oxime hydrogenation in ethanol*; k at 50 °C and 4 g/L. */
export const TARNSIDE_BENCHMARK = simple('TS-00', 'first', 3.2e-4, 51);
export const TARNSIDE_TRUTHS: readonly CatalystTruth[] = [
  simple('TS-01', 'first', 5.1e-4, 46),
  simple('TS-02', 'zero', 6.4e-6, 55),
  simple('TS-03', 'first', 2.3e-4, 62),
  dead('TS-04'),
];

/** What every catalyst of the demo really does, by code. */
export const DEMO_TRUTHS: ReadonlyMap<string, CatalystTruth> = new Map(
  [
    MARLBECK_BENCHMARK,
    ...MARLBECK_TRUTHS,
    ...SAMPLE_TRUTHS,
    TARNSIDE_BENCHMARK,
    ...TARNSIDE_TRUTHS,
  ].map((truth) => [truth.code, truth]),
);

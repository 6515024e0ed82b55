import type { DemoCatalyst } from './types';

const SURFACES: Record<string, { area: number; particle: number; hazards: string }> = {
  SiO2: { area: 210, particle: 45, hazards: 'Fine dust; avoid breathing it in.' },
  Al2O3: { area: 155, particle: 60, hazards: 'Fine dust; avoid breathing it in.' },
  TiO2: { area: 52, particle: 25, hazards: 'Fine dust; avoid breathing it in.' },
  ZrO2: { area: 68, particle: 30, hazards: 'Fine dust; avoid breathing it in.' },
  CeO2: { area: 84, particle: 20, hazards: 'Fine dust; avoid breathing it in.' },
  C: { area: 870, particle: 35, hazards: 'May ignite in air when dry and loaded with hydrogen.' },
};

/** g/mol (IUPAC 2021, abridged). */
const MOLAR_MASS: Record<string, number> = {
  Pd: 106.42,
  Pt: 195.08,
  Ru: 101.07,
  Rh: 102.91,
  Ir: 192.22,
  Ni: 58.693,
};

/** code, metal mass percent, metal, support, share of metal atoms at the surface. */
type Recipe = [string, number, string, string, number];

const MARLBECK: readonly Recipe[] = [
  ['MB-00', 1, 'Pd', 'Al2O3', 0.31],
  ['MB-01', 2, 'Pd', 'SiO2', 0.24],
  ['MB-02', 1, 'Pt', 'TiO2', 0.36],
  ['MB-03', 5, 'Ni', 'Al2O3', 0.08],
  ['MB-04', 1, 'Ru', 'C', 0.29],
  ['MB-05', 2, 'Pd', 'C', 0.33],
  ['MB-06', 3, 'Ni', 'SiO2', 0.06],
  ['MB-07', 2, 'Pt', 'CeO2', 0.41],
  ['MB-08', 1, 'Rh', 'Al2O3', 0.38],
  ['MB-09', 1, 'Pd', 'ZrO2', 0.27],
  ['MB-10', 5, 'Pd', 'C', 0.19],
  ['MB-11', 0.5, 'Pt', 'ZrO2', 0.52],
  ['MB-12', 1, 'Ir', 'TiO2', 0.22],
  ['MB-13', 1, 'Pd', 'TiO2', 0.35],
  ['MB-14', 2, 'Ru', 'Al2O3', 0.21],
  ['MB-15', 2, 'Ru', 'TiO2', 0.26],
  ['MB-16', 1, 'Pt', 'Al2O3', 0.44],
  ['MB-17', 0.5, 'Pd', 'SiO2', 0.46],
  ['MB-18', 2, 'Ir', 'SiO2', 0.17],
  ['MB-19', 0.5, 'Rh', 'CeO2', 0.49],
  ['MB-20', 2, 'Ni', 'CeO2', 0.05],
  ['MB-21', 2, 'Pd', 'CeO2', 0.39],
  ['MB-22', 0.5, 'Pt', 'C', 0.55],
  ['MB-23', 1, 'Ru', 'ZrO2', 0.3],
  ['MB-24', 2, 'Rh', 'TiO2', 0.34],
];

const TARNSIDE: readonly Recipe[] = [
  ['TS-00', 5, 'Pd', 'C', 0.2],
  ['TS-01', 3, 'Pd', 'TiO2', 0.28],
  ['TS-02', 2, 'Pt', 'C', 0.32],
  ['TS-03', 1, 'Rh', 'SiO2', 0.4],
  ['TS-04', 5, 'Ni', 'TiO2', 0.07],
];

function card([code, percent, metal, support, exposed]: Recipe, index: number): DemoCatalyst {
  const surface = SURFACES[support]!;
  const sites = ((percent / 100) * 1000 * exposed) / MOLAR_MASS[metal]!;
  return {
    code,
    composition: `${percent} % ${metal}/${support}`,
    support,
    metalLoadingPercent: percent,
    lot: `L${String(2400 + 7 * index)}`,
    // The dead nickel lots were never titrated, so their turnover frequency has no value.
    siteDensityMolPerKg: metal === 'Ni' ? null : Number(sites.toPrecision(3)),
    surfaceAreaM2PerG: surface.area,
    particleSizeUm: surface.particle,
    hazards: metal === 'Ni' ? `${surface.hazards} Nickel: skin sensitiser.` : surface.hazards,
  };
}

export const MARLBECK_CARDS: readonly DemoCatalyst[] = MARLBECK.map(card);
export const TARNSIDE_CARDS: readonly DemoCatalyst[] = TARNSIDE.map(card);

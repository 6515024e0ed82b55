import type { CatalystAnalysis, LawFit, SeriesAnalysis } from '../kinetics/types';

/** What results of engine 0.1 do not say; analyses are kept as they were made. */
const laterOfFit = { saturation: null, level: null } satisfies Partial<LawFit>;
const laterOfSeries = {
  adsorptionConstant: null,
  level: null,
  net: null,
} satisfies Partial<SeriesAnalysis>;
const laterOfCatalyst = {
  adsorption: null,
  eyring: null,
  oneStep: null,
  massOrder: null,
} satisfies Partial<CatalystAnalysis>;

/** A well's stored result, of this engine or an earlier one. */
export function readSeriesAnalysis(json: string): SeriesAnalysis {
  const stored = JSON.parse(json) as SeriesAnalysis;
  const fits = Object.entries(stored.fits).map(([name, fit]) => [name, { ...laterOfFit, ...fit }]);
  return { ...laterOfSeries, ...stored, fits: Object.fromEntries(fits) as SeriesAnalysis['fits'] };
}

/** A catalyst's stored result, of this engine or an earlier one. */
export function readCatalystAnalysis(json: string): CatalystAnalysis {
  return { ...laterOfCatalyst, ...(JSON.parse(json) as CatalystAnalysis) };
}

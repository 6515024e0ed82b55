import { batchCatalyst, batchSeriesResult } from '../contracts/batchResponse';
import { analyseWell, type AnalysedWell } from '../kinetics/analyseWell';
import { concludeScreen } from '../kinetics/analyseScreen';
import type { DecaySeries, ReferenceConditions, WellRole } from '../kinetics/types';
import { thinDecay } from '../screening/sparkline';

/** For whom results are written: a batch answer, or the database. */
export type Form = 'batch' | 'screen';

/** A result as it leaves the thread: text, since objects would be copied between threads for long. */
export interface WrittenResult {
  /** Id of a well, code of a catalyst. */
  name: string;
  verdict: string;
  json: string;
  /** Of a stored catalyst. */
  sparkline?: string;
}

/** Wells that are analysed together: whole catalysts, whose wells decide together. */
export interface Part {
  /** Places in the whole list, ascending. */
  places: number[];
  series: DecaySeries[];
}

export interface PartAnswer {
  places: number[];
  /** One for each place. */
  series: WrittenResult[];
  /** In the order of first appearance, with the place of the first well. */
  catalysts: (WrittenResult & { first: number })[];
}

/** What all parts of a screen share. */
export interface PartSetting {
  form: Form;
  reference: ReferenceConditions;
  /** All blanks of the screen. */
  blanks: DecaySeries[];
}

const RANKED: readonly WellRole[] = ['sample', 'benchmark'];
const BLANK: readonly WellRole[] = ['blank', 'support-blank'];
/** Points of a stored sparkline. */
const SPARKLINE_POINTS = 16;

/** The blanks of a screen. */
export const blanksOf = (series: readonly DecaySeries[]) =>
  series.filter(({ role }) => BLANK.includes(role));

/** Divides a screen into parts of at least `size` wells without parting a catalyst's wells. */
export function divide(series: readonly DecaySeries[], size: number): Part[] {
  const groups = new Map<string, number[]>();
  series.forEach(({ catalyst, role }, place) => {
    const key = catalyst !== null && RANKED.includes(role) ? `c ${catalyst}` : `w ${place}`;
    const group = groups.get(key);
    if (group === undefined) groups.set(key, [place]);
    else group.push(place);
  });
  const parts: number[][] = [];
  let open: number[] = [];
  for (const group of groups.values()) {
    open.push(...group);
    if (open.length < size) continue;
    parts.push(open);
    open = [];
  }
  if (open.length > 0) parts.push(open);
  return parts.map((places) => {
    places.sort((a, b) => a - b);
    return { places, series: places.map((place) => series[place]!) };
  });
}

/** Returns a function that analyses parts of one screen; the blanks are analysed once. */
export function partAnalyser({ form, reference, blanks }: PartSetting): (part: Part) => PartAnswer {
  let analysedBlanks: AnalysedWell[] | null = null;
  return ({ places, series }) => {
    analysedBlanks ??= blanks.map(analyseWell);
    const wells = series.map(analyseWell);
    const analysis = concludeScreen(wells, reference, analysedBlanks);
    const placeOf = new Map(series.map(({ id }, i) => [id, places[i]!]));
    const seriesOfId = new Map(series.map((one) => [one.id, one]));
    return {
      places,
      series: analysis.series.map((one) => ({
        name: one.id,
        verdict: one.verdict,
        json: JSON.stringify(form === 'batch' ? batchSeriesResult(one) : one),
      })),
      catalysts: analysis.catalysts.map((one) => {
        const written = {
          name: one.catalyst,
          verdict: one.verdict,
          json: JSON.stringify(form === 'batch' ? batchCatalyst(one) : one),
          first: placeOf.get(one.seriesIds[0]!) ?? 0,
        };
        if (form === 'batch') return written;
        const members = new Set(one.seriesIds);
        const decays = analysis.series.filter(({ id }) => members.has(id));
        const points = thinDecay(decays, (id) => seriesOfId.get(id) ?? null, SPARKLINE_POINTS);
        return { ...written, sparkline: JSON.stringify(points) };
      }),
    };
  };
}

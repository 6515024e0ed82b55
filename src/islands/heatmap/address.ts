import type { RateLawName } from '../../kinetics/types';
import { metricIds, type MetricId } from './metrics';

const lawNames = ['zero', 'first', 'second', 'saturating', 'order'] as const;

/** How a person looks at the heatmap; all of it stands in the address. */
export interface HeatmapLook {
  metric: MetricId;
  /** Whose k is shown; null for the first law there is. */
  law: RateLawName | null;
  /** `code`, or the set temperature in °C whose column is sorted. */
  sort: 'code' | number;
  direction: 'asc' | 'desc';
  /** Cells as numbers, or as discs filled by conversion. */
  cells: 'numbers' | 'discs';
}

export const firstHeatmapLook: HeatmapLook = {
  metric: 'rate',
  law: null,
  sort: 'code',
  direction: 'asc',
  cells: 'numbers',
};

/** The direction that a column begins with: codes from A, values from the highest. */
export function firstDirection(sort: HeatmapLook['sort']): 'asc' | 'desc' {
  return sort === 'code' ? 'asc' : 'desc';
}

/** Reads a look from a query string; what is not known is passed over. */
export function readHeatmapLook(query: string): HeatmapLook {
  const parameters = new URLSearchParams(query);
  const given = parameters.get('sort');
  const celsius = given === null || given.trim() === '' ? NaN : Number(given);
  const sort = Number.isFinite(celsius) ? celsius : 'code';
  const direction = parameters.get('dir');
  return {
    metric: metricIds.find((id) => id === parameters.get('metric')) ?? firstHeatmapLook.metric,
    law: lawNames.find((law) => law === parameters.get('law')) ?? null,
    sort,
    direction: direction === 'asc' || direction === 'desc' ? direction : firstDirection(sort),
    cells: parameters.get('cells') === 'discs' ? 'discs' : 'numbers',
  };
}

/** The query string of a look, empty for the first one; other parameters of `query` stay. */
export function writeHeatmapLook(look: HeatmapLook, query = ''): string {
  const parameters = new URLSearchParams(query);
  for (const key of ['metric', 'law', 'sort', 'dir', 'cells']) parameters.delete(key);
  if (look.metric !== firstHeatmapLook.metric) parameters.set('metric', look.metric);
  if (look.metric === 'k' && look.law !== null) parameters.set('law', look.law);
  if (look.sort !== 'code') parameters.set('sort', String(look.sort));
  if (look.direction !== firstDirection(look.sort)) parameters.set('dir', look.direction);
  if (look.cells !== firstHeatmapLook.cells) parameters.set('cells', look.cells);
  const written = parameters.toString();
  return written === '' ? '' : `?${written}`;
}

/** The same look sorted by a column: a second time turns the direction. */
export function heatmapSortedBy(look: HeatmapLook, sort: HeatmapLook['sort']): HeatmapLook {
  const turned = look.direction === 'asc' ? 'desc' : 'asc';
  return { ...look, sort, direction: look.sort === sort ? turned : firstDirection(sort) };
}

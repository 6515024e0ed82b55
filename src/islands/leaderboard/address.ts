import type { DecisionState } from '../../contracts/decisions';
import type { Verdict } from '../../kinetics/types';
import { decisionStates } from '../../screening/decisions';

export const verdicts = [
  'zero',
  'first',
  'second',
  'saturating',
  'other',
  'forced',
  'undetermined',
  'no-reaction',
  'unusable',
] as const satisfies readonly Verdict[];

/** The leaderboard's columns, in their order. */
export const columnIds = [
  'candidate',
  'verdict',
  'decay',
  'rate',
  'time',
  'k',
  'ea',
  'conversion',
  'residual',
  'decision',
  'tags',
  'wells',
  'perGram',
  'turnover',
] as const;
export type ColumnId = (typeof columnIds)[number];

/** What the table can be sorted by, with the direction that it begins with. */
export const sortDirections = {
  rate: 'desc',
  perGram: 'desc',
  turnover: 'desc',
  time: 'asc',
  k: 'desc',
  ea: 'asc',
  conversion: 'desc',
  residual: 'asc',
  candidate: 'asc',
  verdict: 'asc',
  decision: 'asc',
  wells: 'desc',
} as const satisfies Partial<Record<ColumnId, 'asc' | 'desc'>>;
export type SortId = keyof typeof sortDirections;
const sortIds = Object.keys(sortDirections) as SortId[];

/** Columns that are there only when asked for. */
export const hiddenAtFirst: readonly ColumnId[] = ['turnover'];

/** How a person looks at the leaderboard; all of it stands in the address. */
export interface LeaderboardLook {
  sort: SortId;
  direction: 'asc' | 'desc';
  search: string;
  verdicts: Verdict[];
  states: DecisionState[];
  tags: string[];
  hidden: ColumnId[];
}

export const firstLook: LeaderboardLook = {
  sort: 'rate',
  direction: 'desc',
  search: '',
  verdicts: [],
  states: [],
  tags: [],
  hidden: [...hiddenAtFirst],
};

const longestSearch = 100;

function chosen<T extends string>(given: string | null, known: readonly T[]): T[] {
  const parts = new Set((given ?? '').split(','));
  return known.filter((one) => parts.has(one));
}

/** Reads a look from a query string; what is not known is passed over. */
export function readLook(query: string): LeaderboardLook {
  const parameters = new URLSearchParams(query);
  const sort = sortIds.find((id) => id === parameters.get('sort')) ?? firstLook.sort;
  const direction = parameters.get('dir');
  const shown = chosen(parameters.get('show'), columnIds);
  const hidden = chosen(parameters.get('hide'), columnIds);
  return {
    sort,
    direction: direction === 'asc' || direction === 'desc' ? direction : sortDirections[sort],
    search: (parameters.get('q') ?? '').slice(0, longestSearch),
    verdicts: chosen(parameters.get('verdict'), verdicts),
    states: chosen(parameters.get('state'), decisionStates),
    tags: [...new Set(parameters.getAll('tag'))].filter((tag) => tag !== '').slice(0, 20),
    hidden: columnIds.filter(
      (id) =>
        id !== 'candidate' &&
        (hidden.includes(id) || (hiddenAtFirst.includes(id) && !shown.includes(id))),
    ),
  };
}

/** The query string of a look, empty for the first one; other parameters of `query` stay. */
export function writeLook(look: LeaderboardLook, query = ''): string {
  const parameters = new URLSearchParams(query);
  for (const key of ['sort', 'dir', 'q', 'verdict', 'state', 'tag', 'show', 'hide']) {
    parameters.delete(key);
  }
  const set = (key: string, value: string) => value !== '' && parameters.set(key, value);
  if (look.sort !== firstLook.sort) set('sort', look.sort);
  if (look.direction !== sortDirections[look.sort]) set('dir', look.direction);
  set('q', look.search.trim());
  set('verdict', look.verdicts.join(','));
  set('state', look.states.join(','));
  for (const tag of look.tags) parameters.append('tag', tag);
  set('show', hiddenAtFirst.filter((id) => !look.hidden.includes(id)).join(','));
  set('hide', look.hidden.filter((id) => !hiddenAtFirst.includes(id)).join(','));
  const written = parameters.toString().replaceAll('%2C', ',');
  return written === '' ? '' : `?${written}`;
}

/** True when rows may be left out of this look. */
export function isNarrowed(look: LeaderboardLook): boolean {
  const { search, verdicts: chosenVerdicts, states, tags } = look;
  return search.trim() !== '' || chosenVerdicts.length + states.length + tags.length > 0;
}

/** The same look sorted by a column: a second time turns the direction. */
export function sortedBy(look: LeaderboardLook, sort: SortId): LeaderboardLook {
  const turned = look.direction === 'asc' ? 'desc' : 'asc';
  return { ...look, sort, direction: look.sort === sort ? turned : sortDirections[sort] };
}

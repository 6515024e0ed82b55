import type { LeaderboardRow } from '../../contracts/leaderboard';
import type { Estimate } from '../../kinetics/types';
import { decisionStates } from '../../screening/decisions';
import { kGroupOf, type RankedMeasure } from '../../screening/rankedMeasures';
import { printedUnit } from '../candidate/figures';
import { verdicts, type LeaderboardLook, type SortId } from './address';
import { keepsRow } from './filterRows';
import { isBracket, measureIds, measures, type Measure, type MeasureId } from './measures';

/** One line of the table. */
export type LeaderboardLine =
  | { kind: 'heading'; id: string; title: string; note: string; section: Section }
  | { kind: 'row'; row: LeaderboardRow; rank: Rank | null; section: Section };

/** A place in the ranking; `tied` when it cannot be told from the best at 95 %. */
export interface Rank {
  place: number;
  tied: boolean;
  /** 95 % rank interval; null where the figure has no error. */
  low: number | null;
  high: number | null;
  /** 0 to 1: to be among the first few. */
  chanceAmongFirst: number | null;
}

/** Rows that are compared with one another. */
export interface Section {
  id: string;
  title: string;
  note: string;
  rows: LeaderboardRow[];
  /** Best of the section where it is ranked. */
  leader: Estimate | null;
  ranks: Map<string, Rank>;
}

/** The measure that a look is sorted by; null for words and counts. */
export function sortedMeasure(sort: SortId): Measure | null {
  const id = measureIds.find((one): one is MeasureId => one === sort);
  return id ? measures[id] : null;
}

const orderNames = new Map([
  [0, 'Zero order'],
  [1, 'First order'],
  [2, 'Second order'],
]);

/** Puts the rows of one section in order and says which cannot be told from the best. */
function ranked(rows: readonly LeaderboardRow[], measure: Measure) {
  const { better, estimateOf } = measure;
  const valued = rows
    .map((row) => ({ row, estimate: estimateOf(row) }))
    .filter((one): one is { row: LeaderboardRow; estimate: Estimate } => one.estimate !== null)
    .sort((a, b) => (a.estimate.value - b.estimate.value) * (better === 'high' ? -1 : 1));
  const ranks = new Map<string, Rank>();
  if (better === null) return { rows: valued.map(({ row }) => row), ranks, leader: null };
  const ranked = measure.id === 'ea' ? null : (measure.id satisfies RankedMeasure);
  for (const { row } of valued) {
    const ranking = ranked === null ? null : row.ranks[ranked];
    if (ranking === null) continue;
    const { rank: place, rankLow: low, rankHigh: high, chanceAmongFirst, tiedWithBest } = ranking;
    ranks.set(row.catalystId, { place, tied: tiedWithBest, low, high, chanceAmongFirst });
  }
  const alone = [...ranks.values()].filter(({ tied }) => tied).length < 2;
  if (alone) for (const rank of ranks.values()) rank.tied = false;
  return {
    rows: valued.map(({ row }) => row),
    ranks,
    leader: valued[0] && valued[0].estimate.value > 0 ? valued[0].estimate : null,
  };
}

function unranked(id: string, title: string, note: string, rows: LeaderboardRow[]): Section {
  return { id, title, note, rows, leader: null, ranks: new Map() };
}

/** The sections of a whole campaign under one sort, best first. Empty sections are left out. */
export function sectionsFor(rows: readonly LeaderboardRow[], sort: SortId): Section[] {
  const measure = sortedMeasure(sort);
  if (!measure) return [unranked('all', '', '', sortPlain(rows, sort))];
  const has = (row: LeaderboardRow) => measure.estimateOf(row) !== null;
  const without = rows.filter((row) => !has(row));
  const sections = measure.id === 'k' ? byOrder(rows.filter(has), measure) : [];
  if (measure.id !== 'k') {
    const bracketed = rows.filter((row) => has(row) && isBracket(row, measure));
    const plain = rows.filter((row) => has(row) && !isBracket(row, measure));
    const best = ranked(plain, measure);
    sections.push({ id: 'ranked', title: '', note: '', ...best });
    const title = 'Order undetermined';
    const note = 'only a bracket between zero and second order; not ranked';
    sections.push(unranked('bracket', title, note, ranked(bracketed, measure).rows));
  }
  const [title, note] =
    measure.id === 'k'
      ? ['Without a rate constant', 'no order was found, so there is no k']
      : ['Without a figure', 'the readings do not give one'];
  sections.push(unranked('none', title, note, byCode(without)));
  return sections.filter((section) => section.rows.length > 0);
}

/** One section for each order and unit: k of different units is never ranked together. */
function byOrder(rows: readonly LeaderboardRow[], measure: Measure): Section[] {
  const groups = new Map<string, LeaderboardRow[]>();
  for (const row of rows) {
    const key = kGroupOf(row) ?? '';
    groups.set(key, [...(groups.get(key) ?? []), row]);
  }
  const orderOf = ([first]: LeaderboardRow[]) => first?.order ?? Infinity;
  return [...groups.entries()]
    .sort(([, a], [, b]) => orderOf(a) - orderOf(b))
    .map(([id, own]) => {
      const order = own[0]?.order ?? null;
      const name = order === null ? 'Saturating surface' : orderNames.get(order);
      const title = name ?? `Order ${order}`;
      const note = `k in ${printedUnit(own[0]?.kUnit ?? '')}`;
      return { id, title, note, ...ranked(own, measure) };
    });
}

const byCode = (rows: readonly LeaderboardRow[]) =>
  [...rows].sort((a, b) => a.code.localeCompare(b.code, 'en', { numeric: true }));

function sortPlain(rows: readonly LeaderboardRow[], sort: SortId): LeaderboardRow[] {
  const keyOf = (row: LeaderboardRow): number | null => {
    switch (sort) {
      case 'conversion':
        return row.conversion;
      case 'residual':
        return row.relativeResidualSd;
      case 'wells':
        return row.wells;
      case 'verdict':
        return verdicts.indexOf(row.verdict);
      case 'decision':
        return decisionStates.indexOf(row.decision.state);
      default:
        return 0;
    }
  };
  // byCode comes first, so that equal rows stand in the order of their codes.
  return byCode(rows).sort((a, b) => (keyOf(a) ?? Infinity) - (keyOf(b) ?? Infinity));
}

function hasKey(row: LeaderboardRow, sort: SortId): boolean {
  if (sort === 'conversion') return row.conversion !== null;
  return sort === 'residual' ? row.relativeResidualSd !== null : true;
}

/**
 * The table's lines: sections in their order, rows turned as asked, rows without a value last
 * whichever way. Ranks are those of the whole campaign, not of what a filter leaves.
 */
export function arrange(rows: readonly LeaderboardRow[], look: LeaderboardLook): LeaderboardLine[] {
  const measure = sortedMeasure(look.sort);
  const naturally = measure?.better === 'high' ? 'desc' : 'asc';
  const turned = look.direction !== naturally;
  return sectionsFor(rows, look.sort).flatMap((section) => {
    const kept = section.rows.filter((row) => keepsRow(row, look));
    if (kept.length === 0) return [];
    const valued = kept.filter((row) => hasKey(row, look.sort));
    const rest = kept.filter((row) => !hasKey(row, look.sort));
    const inOrder = turned && section.id !== 'none' ? valued.reverse() : valued;
    const lines: LeaderboardLine[] = [...inOrder, ...rest].map((row) => ({
      kind: 'row',
      row,
      rank: section.ranks.get(row.catalystId) ?? null,
      section,
    }));
    const { id, title, note } = section;
    return title === ''
      ? lines
      : [{ kind: 'heading' as const, id, title, note, section }, ...lines];
  });
}

import { createContext, useContext } from 'react';
import type { CampaignSummary, LeaderboardRow } from '../../contracts/leaderboard';
import type { Estimate } from '../../kinetics/types';
import { printedUnit } from '../candidate/figures';
import { sectionsFor, sortedMeasure, type Section } from './arrange';
import type { SortId } from './address';
import { buildForestAxis, scaleEstimate, type ForestAxis } from './forestAxis';
import { measureIds, measures, unitOf, type MeasureId, type MeasureUnit } from './measures';

/** How the figures of one column are drawn and written; the axis is in the column's unit. */
export interface ColumnSetting extends MeasureUnit {
  axis: ForestAxis | null;
}

/** What all cells share: axes, units, the sorted column and its leader. */
export interface ForestSetting {
  campaign: CampaignSummary;
  columns: Record<Exclude<MeasureId, 'k'>, ColumnSetting>;
  /** By section, only while the table is sorted by k. */
  kAxes: Map<string, ColumnSetting>;
  sorted: MeasureId | null;
  /** By section: the leader's figure, whose interval runs down the page. */
  leaders: Map<string, Estimate | null>;
}

/** Axes over the whole campaign, so that a filter never moves a dot. */
export function buildForestSetting(
  campaign: CampaignSummary,
  rows: readonly LeaderboardRow[],
  sort: SortId,
): ForestSetting {
  const columns = Object.fromEntries(
    measureIds.filter((id) => id !== 'k').map((id) => [id, columnSetting(id, campaign, rows)]),
  ) as ForestSetting['columns'];
  const sections = sectionsFor(rows, sort);
  const first = sections.find((section) => section.leader !== null)?.leader ?? null;
  return {
    campaign,
    columns,
    kAxes: new Map(sort === 'k' ? sections.map((one) => [one.id, kSetting(one)]) : []),
    sorted: sortedMeasure(sort)?.id ?? null,
    leaders: new Map(sections.map(({ id, leader }) => [id, sort === 'k' ? leader : first])),
  };
}

function columnSetting(
  id: Exclude<MeasureId, 'k'>,
  campaign: CampaignSummary,
  rows: readonly LeaderboardRow[],
): ColumnSetting {
  const { estimateOf, scale } = measures[id];
  const unit = unitOf(id, campaign.dimension, rows);
  const scaled = rows.map((row) => scaleEstimate(estimateOf(row), unit.factor));
  return { ...unit, axis: buildForestAxis(scaled, scale) };
}

function kSetting({ rows }: Section): ColumnSetting {
  const { estimateOf, scale } = measures.k;
  return {
    unit: printedUnit(rows[0]?.kUnit ?? ''),
    factor: 1,
    axis: buildForestAxis(rows.map(estimateOf), scale),
  };
}

const ForestContext = createContext<ForestSetting | null>(null);

export const ForestProvider = ForestContext.Provider;

export function useForest(): ForestSetting {
  const setting = useContext(ForestContext);
  if (!setting) throw new Error('ForestProvider is missing above this cell');
  return setting;
}

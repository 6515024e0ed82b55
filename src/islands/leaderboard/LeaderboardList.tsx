import { useState } from 'react';
import { candidateHref } from '../../contracts/links';
import type { CampaignSummary, LeaderboardRow } from '../../contracts/leaderboard';
import { stateLabels } from '../candidate/decisionWords';
import { formulaText } from '../formula';
import { formatPercent } from '../numbers';
import { sortDirections, type LeaderboardLook, type SortId } from './address';
import type { LeaderboardLine } from './arrange';
import type { LeaderboardColumn } from './columns';
import { FigureCell, RateConstantCell } from './FigureCell';
import { ForestAxisMarks } from './ForestPlot';
import { useForest } from './forestSetting';
import { measureIds, type MeasureId } from './measures';
import { RankMark } from './RankMark';
import { WhyButton } from './WhyButton';

const step = 100;

export interface LeaderboardListProps {
  lines: LeaderboardLine[];
  columns: readonly LeaderboardColumn[];
  campaign: CampaignSummary;
  look: LeaderboardLook;
  onChange: (look: LeaderboardLook) => void;
}

/** The leaderboard where there is no room for a table: the sorted figure of each candidate. */
export function LeaderboardList(props: LeaderboardListProps) {
  const { lines, columns, campaign, look, onChange } = props;
  const [shown, setShown] = useState(step);
  const measure = measureIds.find((id) => id === look.sort) ?? 'rate';
  return (
    <div>
      <div className="list-sort">
        <label>
          Sort by{' '}
          <select
            value={look.sort}
            onChange={(event) => {
              const sort = event.target.value as SortId;
              onChange({ ...look, sort, direction: sortDirections[sort] });
            }}
          >
            {columns
              .filter(({ meta }) => meta?.sort)
              .map(({ id, header }) => (
                <option key={id} value={id}>
                  {header}
                </option>
              ))}
          </select>
        </label>
        <button
          type="button"
          onClick={() =>
            onChange({ ...look, direction: look.direction === 'asc' ? 'desc' : 'asc' })
          }
        >
          {look.direction === 'asc' ? 'lowest first' : 'highest first'}
        </button>
      </div>
      {measure !== 'k' && <ListAxis id={measure} />}
      <ol className="candidates">
        {lines.slice(0, shown).map((line) =>
          line.kind === 'heading' ? (
            <li key={`heading ${line.id}`} className="heading">
              <span className="font-semibold">{line.title}</span>
              <span className="text-quiet">, {line.note}</span>
            </li>
          ) : (
            <ListItem
              key={line.row.catalystId}
              line={line}
              campaign={campaign}
              measure={measure}
              sort={look.sort}
            />
          ),
        )}
      </ol>
      {lines.length > shown && (
        <button type="button" className="more" onClick={() => setShown(shown + step)}>
          Show the next {Math.min(step, lines.length - shown)} of {lines.length}
        </button>
      )}
    </div>
  );
}

function ListAxis({ id }: { id: Exclude<MeasureId, 'k'> }) {
  const { axis, unit } = useForest().columns[id];
  if (!axis) return null;
  return (
    <div className="list-axis">
      <ForestAxisMarks axis={axis} />
      <span className="text-quiet text-[12.5px]">{unit}</span>
    </div>
  );
}

function ListItem(props: {
  line: Extract<LeaderboardLine, { kind: 'row' }>;
  campaign: CampaignSummary;
  measure: MeasureId;
  sort: SortId;
}) {
  const { line, campaign, measure, sort } = props;
  const { row, rank, section } = line;
  return (
    <li>
      <div className="flex items-start gap-2">
        <span className="min-w-7 flex-none text-[13px]">
          <RankMark rank={rank} />
        </span>
        <a
          className="inline-block min-h-6 font-semibold"
          href={candidateHref(campaign.groupId, campaign.id, row.catalystId, {
            screenId: row.screenId,
          })}
        >
          {row.code}
        </a>
        <span className="text-quiet min-w-0 flex-1 truncate text-[13px]">
          {formulaText(row.composition ?? '')}
        </span>
        <span className="flex-none text-[13px]">
          <WhyButton row={row} />
        </span>
      </div>
      <div className="flex flex-wrap items-center gap-x-4 pl-9">
        {measure === 'k' ? (
          <RateConstantCell row={row} section={section.id} />
        ) : (
          <FigureCell row={row} id={measure} section={section.id} height={30} />
        )}
        <ListFact row={row} sort={sort} />
      </div>
    </li>
  );
}

function ListFact({ row, sort }: { row: LeaderboardRow; sort: SortId }) {
  const facts = [
    sort === 'conversion' && row.conversion !== null
      ? `${formatPercent(row.conversion)} conversion`
      : '',
    sort === 'residual' && row.relativeResidualSd !== null
      ? `residual ${formatPercent(row.relativeResidualSd)} of C₀`
      : '',
    sort === 'wells' ? `${row.wells} wells` : '',
    row.decision.state === 'open' ? '' : stateLabels[row.decision.state],
  ].filter(Boolean);
  return facts.length === 0 ? null : (
    <span className="ml-auto text-[13px] font-semibold">{facts.join(', ')}</span>
  );
}

import type { ColumnDef, RowData } from '@tanstack/react-table';
import { candidateHref } from '../../contracts/links';
import type { CampaignSummary, LeaderboardRow } from '../../contracts/leaderboard';
import { stateLabels } from '../candidate/decisionWords';
import { formulaText } from '../formula';
import { formatPercent } from '../numbers';
import { WellDisc } from '../WellDisc';
import { sortDirections, type ColumnId, type SortId } from './address';
import { FigureCell, RateConstantCell } from './FigureCell';
import { labelIn, type MeasureId } from './measures';
import { Sparkline } from './Sparkline';
import { WhyButton } from './WhyButton';

declare module '@tanstack/react-table' {
  interface ColumnMeta<TData extends RowData, TValue> {
    /** Phantom: keeps the library's own type parameters in use. */
    of?: [TData, TValue];
    /** px. */
    width: number;
    numeric?: boolean;
    measure?: Exclude<MeasureId, 'k'>;
    sort?: SortId;
  }
}

const isSort = (id: string): id is SortId => id in sortDirections;

type Cell = (row: LeaderboardRow, section: string) => React.ReactNode;

export type LeaderboardColumn = ColumnDef<LeaderboardRow> & {
  id: ColumnId;
  header: string;
  /** Draws the cell; `section` names the rows that it is compared with. */
  draw: Cell;
};

function column(
  id: ColumnId,
  header: string,
  width: number,
  draw: Cell,
  meta: { numeric?: boolean; measure?: Exclude<MeasureId, 'k'> } = {},
): LeaderboardColumn {
  return {
    id,
    header,
    draw,
    meta: { width, ...meta, ...(isSort(id) ? { sort: id } : {}) },
  };
}

/** The leaderboard's columns for one campaign. */
export function leaderboardColumns(campaign: CampaignSummary, sort: SortId): LeaderboardColumn[] {
  const figure = (id: Exclude<MeasureId, 'k'>, width: number) =>
    column(
      id,
      labelIn(id, campaign),
      width,
      (row, section) => <FigureCell row={row} id={id} section={section} />,
      { measure: id },
    );
  return [
    column('candidate', 'Candidate', 118, (row) => <Candidate row={row} campaign={campaign} />),
    column('verdict', 'Verdict', 126, (row) => <WhyButton row={row} />),
    column('decay', 'Decay', 62, (row) => <Sparkline readings={row.sparkline} />),
    figure('rate', 192),
    figure('time', 192),
    column('k', 'Rate constant k', sort === 'k' ? 256 : 158, (row, section) => (
      <RateConstantCell row={row} section={section} />
    )),
    figure('ea', 184),
    column('conversion', 'Conversion', 88, ({ conversion }) => (
      <span className="flex items-center gap-2">
        <WellDisc conversion={conversion} tint="var(--accent)" />
        {conversion === null ? 'none' : formatPercent(conversion)}
      </span>
    )),
    column('residual', 'Residual s.d.', 116, (row) => <Residual row={row} />),
    column('decision', 'Decision', 94, ({ decision }) => (
      <span className={decision.state === 'open' ? 'text-quiet' : 'font-semibold'}>
        {stateLabels[decision.state]}
      </span>
    )),
    column('tags', 'Tags', 132, ({ tags }) => (
      <span title={tags.join(', ')}>{tags.join(', ')}</span>
    )),
    column('wells', 'Wells', 64, ({ wells }) => wells, { numeric: true }),
    figure('perGram', 216),
    figure('turnover', 216),
  ];
}

function Candidate({ row, campaign }: { row: LeaderboardRow; campaign: CampaignSummary }) {
  const { code, catalystId, composition, screenId, screenName, otherScreens } = row;
  const more = otherScreens > 0 ? `, and ${otherScreens} more` : '';
  return (
    <div className="leading-[18px]" title={`From ${screenName}${more}`}>
      <a
        href={candidateHref(campaign.groupId, campaign.id, catalystId, { screenId })}
        className="row-link block font-semibold"
      >
        {code}
      </a>
      <div className="text-quiet truncate text-[12.5px]">{formulaText(composition ?? '')}</div>
    </div>
  );
}

function Residual({ row }: { row: LeaderboardRow }) {
  const { relativeResidualSd, wellsWithLackOfFit, wells } = row;
  return (
    <div className="leading-[18px]">
      <div>{relativeResidualSd === null ? '–' : `${formatPercent(relativeResidualSd)} of C₀`}</div>
      {wellsWithLackOfFit > 0 && (
        <div className="text-warning text-[12.5px] whitespace-nowrap">
          misfit in {wellsWithLackOfFit} of {wells}
        </div>
      )}
    </div>
  );
}

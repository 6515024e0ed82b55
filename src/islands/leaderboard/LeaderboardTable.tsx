import { getCoreRowModel, useReactTable } from '@tanstack/react-table';
import { memo, useMemo } from 'react';
import type { LeaderboardRow } from '../../contracts/leaderboard';
import type { LeaderboardLook, SortId } from './address';
import type { LeaderboardLine } from './arrange';
import type { LeaderboardColumn } from './columns';
import { rowHeight } from './FigureCell';
import { ForestAxisMarks } from './ForestPlot';
import { useForest } from './forestSetting';
import { ColumnHeader } from './ColumnHeader';
import { Spacer } from '../Spacer';
import { useVirtualLines } from '../virtualLines';
import { RankMark, rankWidth } from './RankMark';

export interface LeaderboardTableProps {
  rows: LeaderboardRow[];
  lines: LeaderboardLine[];
  columns: LeaderboardColumn[];
  look: LeaderboardLook;
  onSort: (sort: SortId) => void;
  /** True while the sheet is printed: then every line is drawn. */
  printing: boolean;
}

export function LeaderboardTable(props: LeaderboardTableProps) {
  const { rows, lines, columns, look, onSort, printing } = props;
  const { scroller, first, last, before, after } = useVirtualLines(
    lines.length,
    rowHeight,
    printing,
  );
  const columnVisibility = useMemo(
    () => Object.fromEntries(look.hidden.map((id) => [id, false])),
    [look.hidden],
  );
  const table = useReactTable({
    data: rows,
    columns,
    getRowId: (row) => row.catalystId,
    getCoreRowModel: getCoreRowModel(),
    // Rows are sorted and grouped by `arrange`: units never mix, ranks stay under a filter.
    manualSorting: true,
    manualFiltering: true,
    state: {
      columnVisibility,
      sorting: [{ id: look.sort, desc: look.direction === 'desc' }],
    },
  });
  // Rows that stay are not drawn anew while the table scrolls.
  const leaves = table.getVisibleLeafColumns();
  const visible = useMemo(
    () => leaves.map(({ columnDef }) => columnDef as LeaderboardColumn),
    [leaves],
  );
  const width = visible.reduce((sum, one) => sum + (one.meta?.width ?? 0), rankWidth);
  return (
    <div
      ref={scroller}
      className="forest-scroller"
      tabIndex={0}
      role="region"
      aria-label="Candidates, a table that scrolls"
    >
      <table
        className="forest"
        style={{ width }}
        aria-rowcount={lines.length + 1}
        aria-describedby="leaderboard-key"
      >
        <colgroup>
          <col style={{ width: rankWidth }} />
          {visible.map(({ id, meta }) => (
            <col key={id} style={{ width: meta?.width }} />
          ))}
        </colgroup>
        <thead>
          <tr aria-rowindex={1}>
            <th
              scope="col"
              className="rank"
              title="Place, and in brackets the ranks it takes in 95 % of draws from the candidates’ uncertainties"
            >
              Rank
            </th>
            {visible.map((column) => (
              <ColumnHeader key={column.id} column={column} look={look} onSort={onSort} />
            ))}
          </tr>
        </thead>
        <tbody>
          <Spacer height={before} />
          {lines.slice(first, last + 1).map((line, index) => (
            <Line
              key={line.kind === 'row' ? line.row.catalystId : `heading ${line.id}`}
              line={line}
              columns={visible}
              rowIndex={first + index + 2}
            />
          ))}
          <Spacer height={after} />
        </tbody>
      </table>
    </div>
  );
}

const Line = memo(function Line(props: {
  line: LeaderboardLine;
  columns: LeaderboardColumn[];
  rowIndex: number;
}) {
  const { line, columns, rowIndex } = props;
  if (line.kind === 'heading') {
    return <Heading line={line} columns={columns} rowIndex={rowIndex} />;
  }
  const { row, rank, section } = line;
  return (
    <tr aria-rowindex={rowIndex}>
      <td className="rank">
        <RankMark rank={rank} />
      </td>
      {columns.map(({ id, draw, meta }) =>
        id === 'candidate' ? (
          <th key={id} scope="row" className="candidate">
            {draw(row, section.id)}
          </th>
        ) : (
          <td key={id} className={meta?.numeric ? 'text-right' : undefined}>
            {draw(row, section.id)}
          </td>
        ),
      )}
    </tr>
  );
});

/** Names the rows that follow; for k it carries their own axis. */
function Heading(props: {
  line: Extract<LeaderboardLine, { kind: 'heading' }>;
  columns: LeaderboardColumn[];
  rowIndex: number;
}) {
  const { line, columns, rowIndex } = props;
  const axis = useForest().kAxes.get(line.section.id)?.axis ?? null;
  const at = columns.findIndex((column) => column.id === 'k');
  const before = axis && at > 0 ? at : columns.length;
  return (
    <tr aria-rowindex={rowIndex} className="heading">
      <th scope="rowgroup" colSpan={before + 1}>
        <span className="heading-words">
          <span className="font-semibold">{line.title}</span>
          <span className="text-quiet">, {line.note}</span>
        </span>
      </th>
      {axis && at > 0 && (
        <td colSpan={columns.length - at} className="align-bottom">
          <ForestAxisMarks axis={axis} />
        </td>
      )}
    </tr>
  );
}

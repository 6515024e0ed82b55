import { getCoreRowModel, useReactTable, type Table } from '@tanstack/react-table';
import { useVirtualizer } from '@tanstack/react-virtual';
import { memo, useRef } from 'react';
import type { LeaderboardRow } from '../../contracts/leaderboard';
import type { LeaderboardLook, SortId } from './address';
import type { LeaderboardLine } from './arrange';
import type { LeaderboardColumn } from './columns';
import { rowHeight } from './FigureCell';
import { ForestAxisMarks } from './ForestPlot';
import { useForest } from './forestSetting';
import { ColumnHeader } from './ColumnHeader';
import { RankMark, rankWidth } from './RankMark';

/** Up to so many lines all are in the page, where the browser's search finds them. */
const virtualFrom = 80;

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
  const scroller = useRef<HTMLDivElement>(null);
  const table = useReactTable({
    data: rows,
    columns,
    getRowId: (row) => row.catalystId,
    getCoreRowModel: getCoreRowModel(),
    // Rows are sorted and grouped by `arrange`: units never mix, ranks stay under a filter.
    manualSorting: true,
    manualFiltering: true,
    state: {
      columnVisibility: Object.fromEntries(look.hidden.map((id) => [id, false])),
      sorting: [{ id: look.sort, desc: look.direction === 'desc' }],
    },
  });
  const virtual = useVirtualizer({
    count: lines.length,
    getScrollElement: () => scroller.current,
    estimateSize: () => rowHeight,
    overscan: 12,
    initialRect: { width: 1200, height: 900 },
    enabled: lines.length > virtualFrom && !printing,
  });
  const all = lines.length <= virtualFrom || printing;
  const shown = all ? [] : virtual.getVirtualItems();
  const first = all ? 0 : (shown[0]?.index ?? 0);
  const last = all ? lines.length - 1 : (shown.at(-1)?.index ?? -1);
  const visible = visibleColumns(table);
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
            <th scope="col" className="rank">
              <span className="sr-only">Rank</span>
            </th>
            {visible.map((column) => (
              <ColumnHeader key={column.id} column={column} look={look} onSort={onSort} />
            ))}
          </tr>
        </thead>
        <tbody>
          <Spacer height={first * rowHeight} />
          {lines.slice(first, last + 1).map((line, index) => (
            <Line
              key={line.kind === 'row' ? line.row.catalystId : `heading ${line.id}`}
              line={line}
              columns={visible}
              rowIndex={first + index + 2}
            />
          ))}
          <Spacer height={(lines.length - 1 - last) * rowHeight} />
        </tbody>
      </table>
    </div>
  );
}

function visibleColumns(table: Table<LeaderboardRow>): LeaderboardColumn[] {
  return table.getVisibleLeafColumns().map(({ columnDef }) => columnDef as LeaderboardColumn);
}

function Spacer({ height }: { height: number }) {
  if (height <= 0) return null;
  return (
    <tr aria-hidden="true" className="spacer">
      <td style={{ height }} />
    </tr>
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

import { memo, type CSSProperties, type KeyboardEvent } from 'react';
import { candidateHref } from '../../contracts/links';
import type { Heatmap, HeatmapRow } from '../../contracts/leaderboard';
import { DecayMark } from '../DecayMark';
import { formatKelvinAsCelsius } from '../numbers';
import { Spacer } from '../Spacer';
import { useVirtualLines } from '../virtualLines';
import type { HeatmapLook } from './address';
import { HeatCell } from './HeatCell';
import { metricNames, type MetricScale } from './metrics';
import { celsiusOf } from './sortRows';

const rowHeight = 36;

export interface HeatTableProps {
  heatmap: Heatmap;
  rows: HeatmapRow[];
  scale: MetricScale;
  look: HeatmapLook;
  onSort: (sort: HeatmapLook['sort']) => void;
  /** Told which place the pointer or the focus is on. */
  onPlace: (place: { catalystId: string; column: number } | null) => void;
  printing: boolean;
}

const steps: Record<string, [row: number, column: number]> = {
  ArrowLeft: [0, -1],
  ArrowRight: [0, 1],
  ArrowUp: [-1, 0],
  ArrowDown: [1, 0],
};

/** Arrow keys go from cell to cell, past places that were not measured. */
function stepFocus(event: KeyboardEvent<HTMLTableElement>) {
  const step = steps[event.key];
  const cell = (event.target as Element).closest('td');
  if (!step || !cell) return;
  const table = event.currentTarget;
  let row = (cell.parentElement as HTMLTableRowElement).rowIndex + step[0];
  let column = cell.cellIndex + step[1];
  for (;;) {
    const next = table.rows[row]?.cells[column];
    if (!next) return;
    const link = next.tagName === 'TD' ? next.querySelector('a') : null;
    if (link) {
      event.preventDefault();
      link.focus();
      return;
    }
    row += step[0];
    column += step[1];
  }
}

function placeOf(target: EventTarget) {
  const cell = (target as Element).closest<HTMLElement>('td[data-column]');
  const row = cell?.parentElement?.dataset['catalyst'];
  return cell && row ? { catalystId: row, column: Number(cell.dataset['column']) } : null;
}

/** Catalyst against temperature, as a table whose cells are coloured. */
export function HeatTable(props: HeatTableProps) {
  const { heatmap, rows, scale, look, onSort, onPlace, printing } = props;
  const { temperaturesK } = heatmap;
  const { scroller, first, last, before, after } = useVirtualLines(
    rows.length,
    rowHeight,
    printing,
  );
  return (
    <div ref={scroller} className="heat-scroller" role="region" aria-label="Heatmap" tabIndex={0}>
      <table
        className="heat"
        style={{ '--columns': temperaturesK.length } as CSSProperties}
        aria-rowcount={rows.length + 1}
        onKeyDown={stepFocus}
        onMouseOver={(event) => onPlace(placeOf(event.target))}
        onFocus={(event) => onPlace(placeOf(event.target))}
      >
        <caption className="sr-only">
          {metricNames[scale.id]}
          {scale.unit && ` in ${scale.unit}`}, candidates down, temperatures across
        </caption>
        <colgroup>
          <col className="code-width" />
          {temperaturesK.map((temperatureK) => (
            <col key={temperatureK} className="cell-width" />
          ))}
        </colgroup>
        <thead>
          <tr aria-rowindex={1}>
            <SortHeader sort="code" name="Candidate" look={look} onSort={onSort} />
            {temperaturesK.map((temperatureK) => (
              <SortHeader
                key={temperatureK}
                sort={celsiusOf(temperatureK)}
                name={formatKelvinAsCelsius(temperatureK)}
                look={look}
                onSort={onSort}
              />
            ))}
          </tr>
        </thead>
        <tbody>
          <Spacer height={before} />
          {rows.slice(first, last + 1).map((row, index) => (
            <Line
              key={row.catalystId}
              row={row}
              rowIndex={first + index + 2}
              heatmap={heatmap}
              scale={scale}
              cells={look.cells}
            />
          ))}
          <Spacer height={after} />
        </tbody>
      </table>
    </div>
  );
}

function SortHeader(props: {
  sort: HeatmapLook['sort'];
  name: string;
  look: HeatmapLook;
  onSort: (sort: HeatmapLook['sort']) => void;
}) {
  const { sort, name, look, onSort } = props;
  const sorted = look.sort === sort;
  const ascending = look.direction === 'asc';
  return (
    <th
      scope="col"
      aria-sort={sorted ? (ascending ? 'ascending' : 'descending') : undefined}
      className={sort === 'code' ? 'code' : undefined}
    >
      <button
        type="button"
        className={sorted ? 'sort sorted' : 'sort'}
        title={`Sort by ${sort === 'code' ? 'code' : `the column of ${name}`}`}
        onClick={() => onSort(sort)}
      >
        {name}
        <span aria-hidden="true" className="arrow">
          {sorted ? (ascending ? '↑' : '↓') : ''}
        </span>
      </button>
    </th>
  );
}

const Line = memo(function Line(props: {
  row: HeatmapRow;
  rowIndex: number;
  heatmap: Heatmap;
  scale: MetricScale;
  cells: HeatmapLook['cells'];
}) {
  const { row, rowIndex, heatmap, scale, cells } = props;
  const { campaign } = heatmap;
  return (
    <tr aria-rowindex={rowIndex} data-catalyst={row.catalystId}>
      <th scope="row" className="code">
        <span className="flex items-center justify-between gap-2">
          <a href={candidateHref(campaign.groupId, campaign.id, row.catalystId)}>{row.code}</a>
          <DecayMark verdict={row.verdict} className="text-quiet" />
        </span>
      </th>
      {row.cells.map((cell, column) => (
        <td key={column} data-column={column}>
          <HeatCell row={row} cell={cell} campaign={campaign} scale={scale} cells={cells} />
        </td>
      ))}
    </tr>
  );
});

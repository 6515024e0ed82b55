import { sortDirections, type LeaderboardLook, type SortId } from './address';
import type { LeaderboardColumn } from './columns';
import { ForestAxisMarks } from './ForestPlot';
import { useForest } from './forestSetting';

export interface ColumnHeaderProps {
  column: LeaderboardColumn;
  look: LeaderboardLook;
  onSort: (sort: SortId) => void;
}

/** A column's name with its unit, the button that sorts by it, and its shared axis. */
export function ColumnHeader({ column, look, onSort }: ColumnHeaderProps) {
  const { columns } = useForest();
  const { id, header, meta } = column;
  const sort = meta?.sort;
  const sorted = sort !== undefined && look.sort === sort;
  const setting = meta?.measure ? columns[meta.measure] : null;
  const arrow = sorted ? (look.direction === 'asc' ? '↑' : '↓') : '';
  return (
    <th
      scope="col"
      aria-sort={sorted ? (look.direction === 'asc' ? 'ascending' : 'descending') : undefined}
      className={`${id} ${meta?.numeric ? 'text-right' : ''}`}
    >
      {sort === undefined ? (
        <span>{header}</span>
      ) : (
        <button
          type="button"
          onClick={() => onSort(sort)}
          title={`Sort by ${header.toLowerCase()}, ${wordFor(sort, look, sorted)}`}
          className={sorted ? 'sort sorted' : 'sort'}
        >
          {header}
          <span aria-hidden="true" className="arrow">
            {arrow}
          </span>
        </button>
      )}
      {setting && <div className="unit">{setting.unit}</div>}
      {setting?.axis && <ForestAxisMarks axis={setting.axis} />}
    </th>
  );
}

function wordFor(sort: SortId, look: LeaderboardLook, sorted: boolean): string {
  const current = sorted ? look.direction : null;
  const next = current === null ? sortDirections[sort] : current === 'asc' ? 'desc' : 'asc';
  return next === 'asc' ? 'lowest first' : 'highest first';
}

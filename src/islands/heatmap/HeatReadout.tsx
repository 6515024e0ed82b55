import type { HeatmapRow } from '../../contracts/leaderboard';
import { VerdictText } from '../DecayMark';
import { formatKelvinAsCelsius, formatPercent } from '../numbers';
import { WellDisc } from '../WellDisc';
import { metricNames, type MetricScale } from './metrics';
import { cellValue } from './summary';

/** The place under the pointer or the focus, in full. */
export function HeatReadout(props: {
  row: HeatmapRow | null;
  column: number;
  temperaturesK: readonly number[];
  scale: MetricScale;
}) {
  const { row, column, temperaturesK, scale } = props;
  const temperatureK = temperaturesK[column];
  if (!row || temperatureK === undefined) {
    return (
      <p className="text-quiet">
        Point at a cell, or reach it with Tab and the arrow keys, to read it in full. A cell opens
        its wells.
      </p>
    );
  }
  const cell = row.cells[column];
  return (
    <div>
      <p className="font-semibold">
        {row.code} at {formatKelvinAsCelsius(temperatureK)}
      </p>
      {cell ? (
        <dl className="readout">
          {scale.id !== 'verdict' && scale.id !== 'conversion' && (
            <>
              <dt>{metricNames[scale.id]}</dt>
              <dd>{cellValue(cell, scale) ?? 'no value'}</dd>
            </>
          )}
          <dt>Verdict</dt>
          <dd>
            <VerdictText verdict={cell.verdict} order={cell.order} />
          </dd>
          <dt>Conversion</dt>
          <dd className="flex items-center gap-2">
            <WellDisc conversion={cell.conversion} tint="var(--accent)" size={18} />
            {cell.conversion === null ? 'none' : formatPercent(cell.conversion)}
          </dd>
          <dt>Wells</dt>
          <dd>
            {cell.wells}
            {cell.wellsWithLackOfFit > 0 && (
              <span className="text-warning">, misfit in {cell.wellsWithLackOfFit}</span>
            )}
          </dd>
        </dl>
      ) : (
        <p className="text-quiet">Not measured.</p>
      )}
    </div>
  );
}

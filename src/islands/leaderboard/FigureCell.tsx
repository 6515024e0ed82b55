import type { LeaderboardRow } from '../../contracts/leaderboard';
import { printedUnit } from '../candidate/figures';
import { figureText, type FigureText } from './figureText';
import { forestMark, scaleEstimate } from './forestAxis';
import { ForestPlot } from './ForestPlot';
import { useForest } from './forestSetting';
import { isBracket, measures, type MeasureId } from './measures';

/** px. */
export const rowHeight = 44;

const none = (
  <span className="text-quiet">
    <span aria-hidden="true">–</span>
    <span className="sr-only">none</span>
  </span>
);

/** A figure on the axis of its column, with its number beside it. */
export function FigureCell(props: {
  row: LeaderboardRow;
  id: Exclude<MeasureId, 'k'>;
  section: string;
  /** px; the row's. */
  height?: number;
}) {
  const { row, id, section, height = rowHeight } = props;
  const { columns, sorted, leaders } = useForest();
  const measure = measures[id];
  const { axis, factor } = columns[id];
  const estimate = scaleEstimate(measure.estimateOf(row), factor);
  const bracket = isBracket(row, measure);
  return (
    <div className="flex items-center gap-2">
      <ForestPlot
        mark={forestMark(estimate, axis, bracket)}
        axis={axis}
        leader={sorted === id ? scaleEstimate(leaders.get(section) ?? null, factor) : null}
        height={height}
      />
      {estimate ? (
        <FigureNumber text={figureText(estimate, { bracket, log: measure.scale === 'log' })} />
      ) : (
        none
      )}
    </div>
  );
}

/** k with its own unit; on the axis of its order while the table is sorted by it. */
export function RateConstantCell({ row, section }: { row: LeaderboardRow; section: string }) {
  const { kAxes, sorted, leaders } = useForest();
  const k = measures.k.estimateOf(row);
  if (!k) return sorted === 'k' ? <div className="flex items-center">{none}</div> : none;
  const text = figureText(k, { bracket: false, log: true });
  if (sorted !== 'k') {
    return (
      <div className="leading-[18px] whitespace-nowrap">
        <div>
          <FigureNumber text={text} />
        </div>
        <div className="text-quiet text-[12.5px]">{printedUnit(row.kUnit ?? '')}</div>
      </div>
    );
  }
  const axis = kAxes.get(section)?.axis ?? null;
  return (
    <div className="flex items-center gap-2">
      <ForestPlot
        mark={forestMark(k, axis, false)}
        axis={axis}
        leader={leaders.get(section) ?? null}
        height={rowHeight}
      />
      <FigureNumber text={text} />
    </div>
  );
}

/** Value in ink, uncertainty and power quieter. */
export function FigureNumber({ text }: { text: FigureText }) {
  switch (text.kind) {
    case 'bracket':
      return (
        <span className="text-quiet leading-[18px]">
          <span className="sr-only">between </span>
          {text.low}
          <span className="sr-only"> and </span>
          <span aria-hidden="true"> to </span>
          {text.high}
        </span>
      );
    case 'below':
      return <span className="whitespace-nowrap">below {text.high}</span>;
    case 'value':
      return (
        <span className="whitespace-nowrap">
          {text.power && text.uncertainty && '('}
          {text.value}
          {text.uncertainty && <span className="text-quiet"> ± {text.uncertainty}</span>}
          {text.power && text.uncertainty && ')'}
          {text.power}
        </span>
      );
  }
}

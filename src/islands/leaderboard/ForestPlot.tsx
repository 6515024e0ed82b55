import type { Estimate } from '../../kinetics/types';
import { plotNumber } from '../charts/plotNumber';
import { placeOn, type ForestAxis, type ForestMark } from './forestAxis';

/** px; the same in header and cells, so that dots stand under their ticks. */
export const forestWidth = 84;
const inset = 5;
const inner = forestWidth - 2 * inset;
const at = (place: number) => Number((inset + inner * place).toFixed(1));

const arrowLeft = (y: number) => `M${at(0) + 4} ${y - 3}L${at(0)} ${y}L${at(0) + 4} ${y + 3}`;
const arrowRight = (y: number) => `M${at(1) - 4} ${y - 3}L${at(1)} ${y}L${at(1) - 4} ${y + 3}`;

export interface ForestPlotProps {
  mark: ForestMark | null;
  axis: ForestAxis | null;
  /** The leader's interval, drawn as a faint band through the cell. */
  leader: Estimate | null;
  /** px; the row's, so that the bands of all rows meet. */
  height: number;
}

/** One row of the forest plot. What it shows is said by the number beside it. */
export function ForestPlot({ mark, axis, leader, height }: ForestPlotProps) {
  const y = height / 2;
  return (
    <svg width={forestWidth} height={height} aria-hidden="true" className="block flex-none">
      {axis && leader && <LeaderBand axis={axis} leader={leader} height={height} />}
      {mark?.kind === 'dot' && (
        <g className="stroke-ink">
          {mark.whisker && (
            <path
              fill="none"
              strokeWidth={1.4}
              d={
                `M${at(mark.whisker.from)} ${y}H${at(mark.whisker.to)}` +
                (mark.whisker.openLeft ? arrowLeft(y) : `M${at(mark.whisker.from)} ${y - 3}v6`) +
                (mark.whisker.openRight ? arrowRight(y) : `M${at(mark.whisker.to)} ${y - 3}v6`)
              }
            />
          )}
          <circle
            cx={at(mark.place)}
            cy={y}
            r={3.6}
            className={mark.whisker ? 'fill-ink' : 'fill-sheet'}
            strokeWidth={mark.whisker ? 0 : 1.4}
          />
        </g>
      )}
      {mark?.kind === 'bracket' && (
        <g className="stroke-quiet" fill="none" strokeWidth={1.2}>
          <rect
            x={at(mark.from)}
            y={y - 3.5}
            width={Math.max(2, at(mark.to) - at(mark.from))}
            height={7}
            strokeDasharray="3 2"
          />
          {mark.openLeft && <path d={arrowLeft(y)} />}
          {mark.openRight && <path d={arrowRight(y)} />}
        </g>
      )}
      {mark?.kind === 'below' && (
        <path
          className="stroke-ink"
          fill="none"
          strokeWidth={1.4}
          d={`${arrowLeft(y)}M${at(0)} ${y}H${at(mark.to)}M${at(mark.to)} ${y - 3}v6`}
        />
      )}
    </svg>
  );
}

function LeaderBand(props: { axis: ForestAxis; leader: Estimate; height: number }) {
  const { axis, leader, height } = props;
  const clip = (value: number) => Math.min(1, Math.max(0, placeOn(axis, value)));
  const from = at(clip(leader.low ?? leader.value));
  const to = at(clip(leader.high ?? leader.value));
  return (
    <rect x={from} y={0} width={Math.max(1.5, to - from)} height={height} className="fill-wash" />
  );
}

/** The axis above a column: ticks and two or three numbers. */
export function ForestAxisMarks({ axis }: { axis: ForestAxis }) {
  const labels: { place: number; text: string }[] = [];
  for (const { major, place, value } of axis.ticks) {
    const text = plotNumber(value, 3);
    const last = labels.at(-1);
    const room = last ? (text.length + last.text.length) * 3.4 + 5 : 0;
    if (major && (!last || at(place) - at(last.place) > room)) labels.push({ place, text });
  }
  return (
    <svg
      width={forestWidth}
      height={22}
      aria-hidden="true"
      className="fill-quiet stroke-quiet block overflow-visible text-[11px]"
    >
      {labels.map(({ place, text }) => (
        <text key={text} x={at(place)} y={11} textAnchor="middle" stroke="none">
          {text}
        </text>
      ))}
      <path
        fill="none"
        d={
          `M${at(0)} 21.5H${at(1)}` +
          axis.ticks.map(({ place, major }) => `M${at(place)} 21.5v${major ? -5 : -2.5}`).join('')
        }
      />
    </svg>
  );
}

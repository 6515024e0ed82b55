import type { Verdict } from '../../kinetics/types';
import { shareOf } from '../../screening/ramps';
import { VerdictText } from '../DecayMark';
import { niceScale } from '../charts/niceScale';
import { metricNames, type MetricScale } from './metrics';

const width = 260;
const height = 14;
const steps = 52;

function ticksOf({ domain, scale }: MetricScale): number[] {
  if (!domain) return [];
  const [low, high] = domain;
  if (scale === 'linear') {
    const { min, interval } = niceScale(low, high, 4);
    return Array.from({ length: 6 }, (_, index) =>
      Number((min + index * interval).toPrecision(12)),
    ).filter((tick) => tick >= low && tick <= high);
  }
  const decades = Math.log10(high / low);
  const digits = decades > 2 ? [1] : decades > 1 ? [1, 3] : [1, 2, 5];
  const first = Math.floor(Math.log10(low));
  const last = Math.ceil(Math.log10(high));
  return Array.from({ length: last - first + 1 }, (_, index) => first + index)
    .flatMap((power) => digits.map((digit) => Number(`${digit}e${power}`)))
    .filter((tick) => tick >= low && tick <= high);
}

/** What the colours mean: the ramp with its ticks and unit, or the verdicts' marks. */
export function HeatLegend(props: { scale: MetricScale; verdicts: readonly Verdict[] }) {
  const { scale, verdicts } = props;
  if (scale.id === 'verdict') {
    return (
      <ul className="m-0 grid list-none gap-1 p-0">
        {verdicts.map((verdict) => (
          <li key={verdict}>
            <VerdictText verdict={verdict} />
          </li>
        ))}
      </ul>
    );
  }
  const ticks = ticksOf(scale);
  return (
    <div>
      <p className="mb-1">
        {metricNames[scale.id]}
        {scale.unit && <span className="text-quiet">, {scale.unit}</span>}
      </p>
      <svg
        width={width}
        height={height + 22}
        className="block overflow-visible text-[12px]"
        aria-hidden="true"
      >
        {Array.from({ length: steps }, (_, index) => (
          <rect
            key={index}
            x={(index * width) / steps}
            width={width / steps + 0.4}
            height={height}
            fill={scale.ramp(index / (steps - 1))}
          />
        ))}
        <rect width={width} height={height} fill="none" className="stroke-edge" />
        {scale.domain &&
          ticks.map((tick) => {
            const x = width * shareOf(tick, scale.domain ?? [0, 1], scale.scale);
            return (
              <g key={tick} className="fill-quiet stroke-quiet">
                <path d={`M${x} ${height}v4`} />
                <text x={x} y={height + 17} textAnchor="middle" stroke="none">
                  {scale
                    .format(tick)
                    .replace(/(\.\d*?)0+(?=$| )/, '$1')
                    .replace(/\.(?=$| )/, '')}
                </text>
              </g>
            );
          })}
      </svg>
      <p className="text-quiet mt-2 flex items-center gap-2">
        <span className="heat-missing small" aria-hidden="true" /> not measured
        <span className="ml-3" aria-hidden="true">
          –
        </span>{' '}
        measured, but no value
      </p>
    </div>
  );
}

const width = 52;
const height = 26;
const pad = 2.5;

/** A candidate's best-followed decay in small: readings as dots, C/C0 from 0 to 1. */
export function Sparkline({ readings }: { readings: readonly [number, number][] }) {
  if (readings.length < 2) return null;
  const last = Math.max(...readings.map(([time]) => time)) || 1;
  const x = (time: number) => (pad + ((width - 2 * pad) * time) / last).toFixed(1);
  const y = (share: number) =>
    (height - pad - (height - 2 * pad) * Math.min(1.05, Math.max(-0.05, share))).toFixed(1);
  return (
    <svg width={width} height={height} aria-hidden="true" className="block overflow-visible">
      <path d={`M${pad} ${height - 0.5}H${width - pad}`} className="stroke-rule" fill="none" />
      <path
        d={`M${readings.map(([time, share]) => `${x(time)} ${y(share)}`).join('L')}`}
        className="stroke-quiet"
        fill="none"
        strokeWidth={0.8}
      />
      {readings.map(([time, share]) => (
        <circle key={time} cx={x(time)} cy={y(share)} r={1.3} className="fill-ink" />
      ))}
    </svg>
  );
}

import { useId } from 'react';

export interface WellDiscProps {
  /** 0 to 1; null where the well gave no value. */
  conversion: number | null;
  /** What is filled; the ink when left out. */
  tint?: string;
  /** True when a person has intervened: an exclusion or a law by force. */
  ringed?: boolean;
  /** px. */
  size?: number;
  /** Accessible name; left out where the words stand beside it. */
  label?: string;
}

/** A well from above: the filled part of its area is the conversion reached. */
export function WellDisc(props: WellDiscProps) {
  const { conversion, tint = 'currentColor', ringed = false, size = 20, label } = props;
  const hatch = useId();
  const name = label ? { role: 'img' as const, 'aria-label': label } : { 'aria-hidden': true };
  const filled = 8 * Math.sqrt(Math.min(1, Math.max(0, conversion ?? 0)));
  return (
    <svg {...name} width={size} height={size} viewBox="0 0 24 24" fill="none" className="shrink-0">
      {conversion === null && (
        <pattern
          id={hatch}
          width={3.5}
          height={3.5}
          patternUnits="userSpaceOnUse"
          patternTransform="rotate(45)"
        >
          <path d="M0 0V3.5" stroke="currentColor" strokeWidth={1.2} opacity={0.55} />
        </pattern>
      )}
      {ringed && <circle cx={12} cy={12} r={11} stroke="currentColor" strokeWidth={1.2} />}
      <circle
        cx={12}
        cy={12}
        r={8}
        stroke="currentColor"
        strokeWidth={1}
        strokeDasharray={conversion === null ? '2 1.6' : undefined}
        fill={conversion === null ? `url(#${hatch})` : 'none'}
      />
      {filled > 0 && <circle cx={12} cy={12} r={filled} fill={tint} />}
    </svg>
  );
}

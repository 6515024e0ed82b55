import type { Verdict } from '../kinetics/types';
import { decayMark, markHeight, markWidth, verdictWord } from '../screening/decayMarks';

export interface DecayMarkProps {
  verdict: Verdict;
  order?: number | null;
  /** Height in px; the width follows. */
  height?: number;
  /** Set where the word stands beside the mark already. */
  silent?: boolean;
  className?: string;
}

/** The drawing that stands for a verdict. Without a word beside it, it says its own name. */
export function DecayMark(props: DecayMarkProps) {
  const { verdict, order = null, height = markHeight, silent = false, className = '' } = props;
  const name = silent
    ? { 'aria-hidden': true as const }
    : { role: 'img' as const, 'aria-label': verdictWord(verdict, order) };
  return (
    <svg
      {...name}
      className={`shrink-0 ${className}`}
      width={(height * markWidth) / markHeight}
      height={height}
      viewBox={`0 0 ${markWidth} ${markHeight}`}
      fill="none"
      stroke="currentColor"
      strokeWidth={1.6}
      strokeLinecap="round"
      strokeLinejoin="round"
    >
      {decayMark(verdict, order).map(({ path, dashed }) => (
        <path
          key={path}
          d={path}
          strokeDasharray={dashed ? '2 2.2' : undefined}
          strokeWidth={dashed ? 1.2 : undefined}
        />
      ))}
    </svg>
  );
}

/** Mark and word together, as a verdict is told wherever there is room. */
export function VerdictText({
  verdict,
  order = null,
}: {
  verdict: Verdict;
  order?: number | null;
}) {
  return (
    <span className="inline-flex items-center gap-2 whitespace-nowrap">
      <DecayMark verdict={verdict} order={order} silent />
      {verdictWord(verdict, order)}
    </span>
  );
}

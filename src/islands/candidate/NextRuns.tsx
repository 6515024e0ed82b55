import type { CandidateView } from '../../contracts/candidate';
import { RANGE_BEYOND_MEASURED_K } from '../../kinetics/planning/proposal';

export interface NextRunsProps {
  proposals: CandidateView['proposals'];
  className?: string;
}

/** Which readings and temperatures would settle what these wells leave open. */
export function NextRuns({ proposals, className = '' }: NextRunsProps) {
  if (proposals.length === 0) return null;
  return (
    <section aria-labelledby="next-runs" className={className}>
      <h2 id="next-runs" className="font-semibold">
        What to run next
      </h2>
      <ul className="border-rule mt-1 list-none space-y-2 border-l-2 p-0 pl-4">
        {proposals.map(({ code, sentence }) => (
          <li key={`${code}-${sentence}`} className="max-w-[72ch]">
            {sentence}
          </li>
        ))}
      </ul>
      <p className="text-quiet mt-2 max-w-[72ch] text-[13px] leading-5">
        Expected from the rates and the noise of these wells; temperatures up to{' '}
        {RANGE_BEYOND_MEASURED_K} K beyond the measured ones were considered.
      </p>
    </section>
  );
}

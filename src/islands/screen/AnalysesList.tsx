import type { AnalysisSummary } from '../../contracts/screens';
import { formatInstant } from '../dates';
import { progressWords } from './progressWords';

/** Every analysis of a screen, newest first; a later one never overwrites an earlier one. */
export function AnalysesList({ analyses }: { analyses: readonly AnalysisSummary[] }) {
  if (analyses.length === 0) return null;
  return (
    <section aria-labelledby="analyses">
      <h2 id="analyses" className="mb-2 text-[18px] font-semibold">
        Analyses
      </h2>
      <ol className="m-0 list-none p-0 text-[13.5px] leading-5">
        {analyses.map((analysis) => (
          <li
            key={analysis.id}
            className="border-rule flex flex-wrap items-baseline gap-x-6 border-b py-1.5"
          >
            <time dateTime={analysis.requestedAt} className="tabular-nums">
              {formatInstant(analysis.requestedAt)}
            </time>
            <span>{analysis.requestedBy}</span>
            <span className="text-quiet">engine {analysis.engine}</span>
            <span className={analysis.status === 'failed' ? 'text-refusal' : 'text-quiet'}>
              {progressWords(analysis, null)}
            </span>
          </li>
        ))}
      </ol>
    </section>
  );
}

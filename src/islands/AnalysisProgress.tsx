import { useEffect } from 'react';
import type { AnalysisSummary } from '../contracts/screens';
import { Button, buttonLook } from './Button';
import { ProgressBar } from './screen/ProgressBar';
import { isOver, progressWords } from './screen/progressWords';
import { useAnalysis } from './screen/useAnalysis';

export interface AnalysisProgressProps {
  analysis: AnalysisSummary;
  leaderboardHref: string;
  /** Starts it again; absent for those who may not. */
  onRetry?: (() => void) | undefined;
  onEnd?: (analysis: AnalysisSummary) => void;
}

/** A running analysis: how far it has come, and where to go when it is done. */
export function AnalysisProgress(props: AnalysisProgressProps) {
  const { leaderboardHref, onRetry, onEnd } = props;
  const { analysis, trouble, leftS } = useAnalysis(props.analysis);
  const over = isOver(analysis);
  useEffect(() => {
    if (over) onEnd?.(analysis);
  }, [over, analysis, onEnd]);
  const words = progressWords(analysis, leftS);
  return (
    <div className="max-w-xl">
      {!over && (
        <ProgressBar
          label="Analysis"
          share={analysis.total > 0 ? analysis.done / analysis.total : null}
          words={words}
        />
      )}
      {trouble && !over && (
        <p className="text-warning text-[13.5px]">
          {trouble.title}. The analysis goes on by itself; this page asks again.
        </p>
      )}
      <div aria-live="polite">
        {analysis.status === 'done' && (
          <div className="flex flex-wrap items-center gap-3">
            <p className="mr-2">{words}.</p>
            <a href={leaderboardHref} className={buttonLook('main')}>
              See the leaderboard
            </a>
            <Button onClick={() => location.reload()}>Show the verdicts here</Button>
          </div>
        )}
        {analysis.status === 'failed' && (
          <div className="border-refusal border-l-2 py-1 pl-4">
            <p className="text-refusal font-semibold">{words}</p>
            <p>{analysis.failure ?? 'No reason was noted.'} Earlier analyses are untouched.</p>
            {onRetry && (
              <Button className="mt-2" onClick={onRetry}>
                Analyse again
              </Button>
            )}
          </div>
        )}
      </div>
    </div>
  );
}

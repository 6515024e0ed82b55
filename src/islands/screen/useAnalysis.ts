import { useEffect, useRef, useState } from 'react';
import type { AnalysisSummary } from '../../contracts/screens';
import type { ApiError } from '../api';
import { followAnalysis } from './followAnalysis';
import { isOver, timeLeftS } from './progressWords';

/**
 * A running analysis as it goes on, with an estimate of the time left. Mount it anew (`key`) for
 * another analysis.
 */
export function useAnalysis(given: AnalysisSummary) {
  const [analysis, setAnalysis] = useState(given);
  const [trouble, setTrouble] = useState<ApiError | null>(null);
  const begun = useRef<{ at: number; done: number } | null>(null);
  const [leftS, setLeftS] = useState<number | null>(null);
  useEffect(() => {
    if (isOver(given)) return;
    return followAnalysis(given.id, {
      onStep: (step) => {
        const now = performance.now();
        begun.current ??= { at: now, done: step.done };
        const { at, done } = begun.current;
        setLeftS(timeLeftS(step.done - done, step.total - done, (now - at) / 1000));
        setAnalysis(step);
      },
      onTrouble: setTrouble,
    });
  }, [given]);
  return { analysis, trouble, leftS };
}

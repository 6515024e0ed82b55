import type { AnalysisSummary } from '../../contracts/screens';

/** Time left in s from the pace so far; null before 5 s or without progress. */
export function timeLeftS(done: number, total: number, elapsedS: number): number | null {
  if (elapsedS < 5 || done <= 0 || done > total) return null;
  return ((total - done) * elapsedS) / done;
}

/** How far an analysis has come: `Wells 34 of 192, about 20 s left`. */
export function progressWords(
  { status, done, total }: Pick<AnalysisSummary, 'status' | 'done' | 'total'>,
  leftS: number | null,
): string {
  switch (status) {
    case 'queued':
      return 'Waiting for its turn';
    case 'running': {
      if (done >= total && total > 0) return 'Comparing wells and catalysts';
      const left = leftS === null ? '' : `, about ${roundedSpan(leftS)} left`;
      return `Wells ${done} of ${total}${left}`;
    }
    case 'done':
      return `${total} ${total === 1 ? 'well' : 'wells'} analysed`;
    case 'failed':
      return 'The analysis failed';
  }
}

function roundedSpan(seconds: number): string {
  if (seconds >= 90) return `${Math.round(seconds / 60)} min`;
  return `${Math.max(5, Math.round(seconds / 5) * 5)} s`;
}

export function isOver({ status }: Pick<AnalysisSummary, 'status'>): boolean {
  return status === 'done' || status === 'failed';
}

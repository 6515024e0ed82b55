import { z } from 'zod/v4';
import type { AnalysisSummary } from '../../contracts/screens';
import { asApiError, requestJson, type ApiError } from '../api';
import { isOver } from './progressWords';

const pollEveryMs = 2000;

const summarySchema: z.ZodType<AnalysisSummary> = z.object({
  id: z.string(),
  screenId: z.string(),
  status: z.enum(['queued', 'running', 'done', 'failed']),
  done: z.number(),
  total: z.number(),
  engine: z.string(),
  requestedBy: z.string(),
  requestedAt: z.string(),
  finishedAt: z.string().nullable(),
  failure: z.string().nullable(),
});

/** The state that one event carries; null when it is not one. */
export function readProgress(text: string): AnalysisSummary | null {
  try {
    const summary = summarySchema.safeParse(JSON.parse(text));
    return summary.success ? summary.data : null;
  } catch {
    return null;
  }
}

export interface AnalysisListener {
  onStep: (analysis: AnalysisSummary) => void;
  /** The connection is bad; it is tried again. Null when it is well again. */
  onTrouble: (error: ApiError | null) => void;
}

/**
 * Follows an analysis until it has ended: by server-sent events, and by asking now and then where
 * those do not come through.
 *
 * @returns a function that stops following
 */
export function followAnalysis(analysisId: string, listener: AnalysisListener): () => void {
  const path = `/api/v1/analyses/${encodeURIComponent(analysisId)}`;
  let ended = false;
  let timer: ReturnType<typeof setTimeout> | undefined;
  let events: EventSource | null = null;
  const stop = () => {
    ended = true;
    clearTimeout(timer);
    events?.close();
  };
  const take = (analysis: AnalysisSummary) => {
    if (ended) return;
    listener.onTrouble(null);
    listener.onStep(analysis);
    if (isOver(analysis)) stop();
  };
  const poll = async () => {
    try {
      take((await requestJson<{ analysis: AnalysisSummary }>(path)).analysis);
    } catch (error) {
      if (!ended) listener.onTrouble(asApiError(error));
    }
    if (!ended) timer = setTimeout(() => void poll(), pollEveryMs);
  };
  if (typeof EventSource === 'undefined') {
    void poll();
    return stop;
  }
  events = new EventSource(`${path}/events`);
  events.addEventListener('progress', ({ data }: MessageEvent<string>) => {
    const analysis = readProgress(data);
    if (analysis) take(analysis);
  });
  events.addEventListener('error', () => {
    // A stream that ends is also an error to the browser; asking tells which it was.
    events?.close();
    if (!ended) void poll();
  });
  return stop;
}

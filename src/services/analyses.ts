import { groupIdsOf, type Viewer } from '../auth/viewer';
import { batchResponse, type BatchResponse } from '../contracts/batchResponse';
import type { AnalysisSummary } from '../contracts/screens';
import type { Database } from '../db/client';
import { findAnalysis, listCatalystResults, listWellFits } from '../db/repositories/analyses';
import { problems } from '../errors';
import { summariseAnalysis } from './screens';
import type { Services } from './services';
import { readCatalystAnalysis, readSeriesAnalysis } from './storedResults';

/** The state of an analysis; with its results once it is done. */
export interface AnalysisView {
  analysis: AnalysisSummary;
  results: BatchResponse | null;
}

/** @throws Problem 404 for an analysis of another group. */
export async function loadAnalysis(
  db: Database,
  viewer: Viewer,
  analysisId: string,
): Promise<AnalysisSummary> {
  const row = await findAnalysis(db, groupIdsOf(viewer), analysisId);
  if (!row) throw problems.notFound();
  return summariseAnalysis(row);
}

/** @throws Problem 404 for an analysis of another group. */
export async function viewAnalysis(
  db: Database,
  viewer: Viewer,
  analysisId: string,
): Promise<AnalysisView> {
  const row = await findAnalysis(db, groupIdsOf(viewer), analysisId);
  if (!row) throw problems.notFound();
  const analysis = summariseAnalysis(row);
  if (analysis.status !== 'done') return { analysis, results: null };
  const { groupId } = row.analysis;
  const [fits, catalysts] = await Promise.all([
    listWellFits(db, groupId, analysisId),
    listCatalystResults(db, groupId, [analysisId]),
  ]);
  return {
    analysis,
    results: batchResponse({
      engine: analysis.engine,
      series: fits.map((fit) => readSeriesAnalysis(fit.result)),
      catalysts: catalysts.map((one) => readCatalystAnalysis(one.result)),
    }),
  };
}

const ended = (analysis: AnalysisSummary) =>
  analysis.status === 'done' || analysis.status === 'failed';

const askEveryMs = 1000;

/**
 * The states of an analysis from now until it has ended. Steps of this server come at once; those of
 * another are seen in the database within a second.
 *
 * @throws Problem 404 for an analysis of another group, before anything is sent.
 */
export async function followAnalysis(
  services: Services,
  viewer: Viewer,
  analysisId: string,
  signal: AbortSignal,
): Promise<AsyncGenerator<AnalysisSummary>> {
  const first = await loadAnalysis(services.db, viewer, analysisId);
  return follow(services, viewer, first, signal);
}

async function* follow(
  services: Services,
  viewer: Viewer,
  first: AnalysisSummary,
  signal: AbortSignal,
): AsyncGenerator<AnalysisSummary> {
  let latest = 0;
  let wake = () => undefined as void;
  const stop = services.runner.watch(first.id, ({ done }) => {
    latest = Math.max(latest, done);
    wake();
  });
  try {
    let state = first;
    yield state;
    while (!ended(state) && !signal.aborted) {
      await new Promise<void>((resolve) => {
        const timer = setTimeout(resolve, askEveryMs);
        wake = () => {
          clearTimeout(timer);
          resolve();
        };
      });
      const stored = await loadAnalysis(services.db, viewer, first.id);
      state = ended(stored) ? stored : { ...stored, done: Math.max(stored.done, latest) };
      yield state;
    }
  } finally {
    stop();
  }
}

import type { MessagePort } from 'node:worker_threads';
import { analyseScreen } from '../kinetics/analyseScreen';
import type { DecaySeries, ReferenceConditions, ScreenAnalysis } from '../kinetics/types';

/** One stored screen and where to report progress. */
export interface ScreenTask {
  series: DecaySeries[];
  reference: ReferenceConditions;
  port?: Pick<MessagePort, 'postMessage'>;
}

/** Reports at most this often, so that messages stay few beside the work. */
const REPORTS = 50;

/** Analyses a screen and posts `{done, total}` on the port as it goes. */
export function analyseScreenWithProgress({ series, reference, port }: ScreenTask): ScreenAnalysis {
  const step = Math.max(1, Math.ceil(series.length / REPORTS));
  return analyseScreen(series, reference, (done, total) => {
    if (port !== undefined && (done % step === 0 || done === total)) {
      port.postMessage({ done, total });
    }
  });
}

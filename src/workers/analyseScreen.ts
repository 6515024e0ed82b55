import type { MessagePort } from 'node:worker_threads';
import { concludeScreen } from '../kinetics/analyseScreen';
import { analyseWellsShared, type Helper } from './sharedWells';
import type { DecaySeries, ReferenceConditions, ScreenAnalysis } from '../kinetics/types';

/** One stored screen and where to report progress. */
export interface ScreenTask {
  series: DecaySeries[];
  reference: ReferenceConditions;
  port?: Pick<MessagePort, 'postMessage'>;
  helpers?: Helper[];
}

/** Reports at most this often, so that messages stay few beside the work. */
const REPORTS = 50;

/** Analyses a screen and posts `{done, total}` on the port as it goes. */
export function analyseScreenWithProgress({
  series,
  reference,
  port,
  helpers = [],
}: ScreenTask): ScreenAnalysis {
  const step = Math.max(1, Math.ceil(series.length / REPORTS));
  let reported = 0;
  const wells = analyseWellsShared(series, helpers, (done, total) => {
    if (port === undefined || (done - reported < step && done < total)) return;
    reported = done;
    port.postMessage({ done, total });
  });
  return concludeScreen(wells, reference);
}

import type { MessagePort } from 'node:worker_threads';
import type { DecaySeries, ReferenceConditions } from '../kinetics/types';
import { analyseShared, type Helper, type WrittenScreen } from './shareParts';

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
}: ScreenTask): WrittenScreen {
  const step = Math.max(1, Math.ceil(series.length / REPORTS));
  let reported = 0;
  return analyseShared(series, { form: 'screen', reference }, helpers, (done, total) => {
    if (port === undefined || (done - reported < step && done < total)) return;
    reported = done;
    port.postMessage({ done, total });
  });
}

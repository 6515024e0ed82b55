import { receiveMessageOnPort, type MessagePort } from 'node:worker_threads';
import { analyseWell, type AnalysedWell } from '../kinetics/analyseWell';
import type { DecaySeries } from '../kinetics/types';

/** Another thread that fits wells for this one. */
export interface Helper {
  port: MessagePort;
  /** Two 32-bit numbers: its messages so far, to sleep until the next, and 1 once it may go. */
  signal: SharedArrayBuffer;
}

/** A well without its series, which the thread that shares out has already. */
export type WellAnswer = Omit<AnalysedWell, 'series'>;

export type HelperMessage = { ready: true } | { start: number; wells: WellAnswer[] };

/** Wells that go to a helper at a time: few messages, and no long wait at the end. */
const CHUNK = 48;
/** Wells that this thread fits before it looks at its messages. */
const OWN_CHUNK = 12;
/** A helper silent for so long is given up; its wells are fitted here. */
const PATIENCE_MS = 30_000;
/** Places in a helper's signal. */
const MESSAGES = 0;
const DISMISSED = 1;

interface Given {
  start: number;
  end: number;
}

/**
 * Fits wells on all threads that help, in the order given. Which thread fits a well changes nothing
 * of its answer.
 *
 * @param onProgress called with the number done
 * @throws RangeError as `analyseWell` does
 */
export function analyseWellsShared(
  series: readonly DecaySeries[],
  helpers: readonly Helper[],
  onProgress?: (done: number, total: number) => void,
): AnalysedWell[] {
  const wells = new Array<AnalysedWell>(series.length);
  const given = new Map<Helper, Given | null>();
  let [next, done] = [0, 0];

  const report = (count: number) => {
    done = Math.min(done + count, series.length);
    onProgress?.(done, series.length);
  };
  const fitHere = (start: number, end: number) => {
    for (let i = start; i < end; i += 1) wells[i] = analyseWell(series[i]!);
    report(end - start);
  };
  const give = (helper: Helper) => {
    if (next >= series.length) {
      given.set(helper, null);
      return;
    }
    const start = next;
    next = Math.min(next + CHUNK, series.length);
    given.set(helper, { start, end: next });
    helper.port.postMessage({ start, series: series.slice(start, next) });
  };
  const collect = () => {
    for (const helper of helpers) {
      for (;;) {
        const message = receiveMessageOnPort(helper.port);
        if (message === undefined) break;
        const said = message.message as HelperMessage;
        if ('wells' in said) {
          const { start, wells: answers } = said;
          answers.forEach((answer, i) => {
            wells[start + i] = { ...answer, series: series[start + i]! };
          });
          report(answers.length);
        }
        give(helper);
      }
    }
  };

  while (next < series.length) {
    collect();
    if (next >= series.length) break;
    const start = next;
    next = Math.min(next + OWN_CHUNK, series.length);
    fitHere(start, next);
  }
  for (const helper of helpers) {
    for (;;) {
      const seen = Atomics.load(new Int32Array(helper.signal), MESSAGES);
      collect();
      const open = given.get(helper) ?? null;
      if (open === null) break;
      const woken = Atomics.wait(new Int32Array(helper.signal), MESSAGES, seen, PATIENCE_MS);
      if (woken !== 'timed-out') continue;
      given.set(helper, null);
      fitHere(open.start, open.end);
    }
  }
  return wells;
}

/** Lets the helpers go, whether they were needed or not. */
export function dismiss(helpers: readonly Helper[]): void {
  for (const { port, signal } of helpers) {
    Atomics.store(new Int32Array(signal), DISMISSED, 1);
    port.postMessage(null);
    port.close();
  }
}

/** Fits what another thread sends, until that thread closes the port. */
export function helpWithWells({ port, signal }: Helper): Promise<void> {
  const counter = new Int32Array(signal);
  const send = (message: HelperMessage) => {
    port.postMessage(message);
    Atomics.add(counter, MESSAGES, 1);
    Atomics.notify(counter, MESSAGES);
  };
  return new Promise((resolve) => {
    // One that comes too late hears nothing of a port closed before.
    if (Atomics.load(counter, DISMISSED) === 1) {
      port.close();
      resolve();
      return;
    }
    port.on('close', resolve);
    port.on('message', (task: { start: number; series: DecaySeries[] } | null) => {
      if (task === null) {
        port.close();
        resolve();
        return;
      }
      const { start, series } = task;
      const wells = series.map((one): WellAnswer => {
        const { series: _, ...answer } = analyseWell(one);
        return answer;
      });
      send({ start, wells });
    });
    send({ ready: true });
  });
}

import { receiveMessageOnPort, type MessagePort } from 'node:worker_threads';
import type { DecaySeries } from '../kinetics/types';
import {
  blanksOf,
  divide,
  partAnalyser,
  type Part,
  type PartAnswer,
  type PartSetting,
  type WrittenResult,
} from './answerPart';

/** Another thread that analyses parts for this one. */
export interface Helper {
  port: MessagePort;
  /** Two 32-bit numbers: its messages so far, to sleep until the next, and 1 once it may go. */
  signal: SharedArrayBuffer;
}

/** All results of a screen, in the order of its wells and of first appearance. */
export interface WrittenScreen {
  series: WrittenResult[];
  catalysts: WrittenResult[];
}

type FromHelper = { ready: true } | { answer: PartAnswer };
type ToHelper = { setting: PartSetting } | { part: Part } | null;

/** Wells of a part: few messages, and no long wait at the end. */
const PART_SIZE = 32;
/** A helper silent for so long is given up; its part is analysed here. */
const PATIENCE_MS = 60_000;
/** How often a helper looks whether it may go. */
const LOOK_MS = 100;
/** Places in a helper's signal. */
const MESSAGES = 0;
const DISMISSED = 1;

/**
 * Analyses a screen on all threads that help. Which thread a part falls to changes nothing of the
 * answer.
 *
 * @param onProgress called with the number of wells done
 * @throws RangeError as `analyseWell` does
 */
export function analyseShared(
  series: readonly DecaySeries[],
  given: Omit<PartSetting, 'blanks'>,
  helpers: readonly Helper[],
  onProgress?: (done: number, total: number) => void,
): WrittenScreen {
  const setting = { ...given, blanks: blanksOf(series) };
  const parts = divide(series, PART_SIZE);
  const analyse = partAnalyser(setting);
  const gathered = gather(series.length, onProgress);
  const busy = new Map<Helper, Part | null>();
  let next = 0;

  const give = (helper: Helper) => {
    const part = parts[next] ?? null;
    if (part !== null) {
      next += 1;
      send(helper, { part });
    }
    busy.set(helper, part);
  };
  const collect = () => {
    for (const helper of helpers) {
      for (;;) {
        const received = receiveMessageOnPort(helper.port);
        if (received === undefined) break;
        const message = received.message as FromHelper;
        if ('answer' in message) gathered.take(message.answer);
        else send(helper, { setting });
        give(helper);
      }
    }
  };

  while (next < parts.length) {
    collect();
    const part = parts[next];
    if (part === undefined) break;
    next += 1;
    gathered.take(analyse(part));
  }
  for (const helper of helpers) {
    for (;;) {
      const seen = Atomics.load(new Int32Array(helper.signal), MESSAGES);
      collect();
      const open = busy.get(helper) ?? null;
      if (open === null) break;
      const woken = Atomics.wait(new Int32Array(helper.signal), MESSAGES, seen, PATIENCE_MS);
      if (woken !== 'timed-out') continue;
      busy.set(helper, null);
      gathered.take(analyse(open));
    }
  }
  return gathered.whole();
}

const send = ({ port }: Helper, message: ToHelper) => port.postMessage(message);

/** Puts the answers to parts back into one order. */
function gather(total: number, onProgress?: (done: number, total: number) => void) {
  const series = new Array<WrittenResult>(total);
  const catalysts: PartAnswer['catalysts'] = [];
  let done = 0;
  return {
    take(answer: PartAnswer) {
      answer.places.forEach((place, i) => {
        series[place] = answer.series[i]!;
      });
      catalysts.push(...answer.catalysts);
      done = Math.min(done + answer.places.length, total);
      onProgress?.(done, total);
    },
    whole: (): WrittenScreen => ({
      series,
      catalysts: catalysts
        .sort((a, b) => a.first - b.first)
        .map(({ first: _, ...written }) => written),
    }),
  };
}

/** Lets the helpers go, whether they were needed or not. */
export function dismiss(helpers: readonly Helper[]): void {
  for (const helper of helpers) {
    Atomics.store(new Int32Array(helper.signal), DISMISSED, 1);
    send(helper, null);
    helper.port.close();
  }
}

/** Analyses what another thread sends, until that thread lets it go. */
export function help({ port, signal }: Helper): Promise<void> {
  const counter = new Int32Array(signal);
  const answer = (message: FromHelper) => {
    port.postMessage(message);
    Atomics.add(counter, MESSAGES, 1);
    Atomics.notify(counter, MESSAGES);
  };
  let analyse: ReturnType<typeof partAnalyser> | null = null;
  return new Promise((resolve) => {
    const leave = () => {
      clearInterval(watch);
      port.close();
      resolve();
    };
    // A port that was closed before it came here says nothing of it.
    const watch = setInterval(() => {
      if (Atomics.load(counter, DISMISSED) === 1) leave();
    }, LOOK_MS);
    port.on('close', leave);
    port.on('message', (message: ToHelper) => {
      if (message === null) leave();
      else if ('setting' in message) analyse = partAnalyser(message.setting);
      else if (analyse !== null) answer({ answer: analyse(message.part) });
    });
    if (Atomics.load(counter, DISMISSED) === 1) leave();
    else answer({ ready: true });
  });
}

import { availableParallelism } from 'node:os';
import { resolve } from 'node:path';
import { Piscina } from 'piscina';
import { problems } from '../errors';
import type { DecaySeries, ReferenceConditions } from '../kinetics/types';
import type { ParsedWorkbook } from '../workbooks/types';
import { blanksOf, divide, type PartAnswer, type PartSetting } from '../workers/answerPart';
import type { OpenedBatch } from '../workers/batch.worker';
import { gatherParts, type WrittenScreen } from '../workers/gatherParts';

export interface BatchAnswer {
  status: number;
  contentType: string;
  body: Uint8Array;
}

export interface ScreenInput {
  series: DecaySeries[];
  reference: ReferenceConditions;
}

/** Work that would block the server, done in threads. */
export interface WorkerPools {
  /** Parses, checks, fits and writes one batch; the bytes are handed over, not copied. */
  answerBatch(bytes: Uint8Array<ArrayBuffer>): Promise<BatchAnswer>;
  analyseScreen(
    input: ScreenInput,
    onProgress: (done: number, total: number) => void,
  ): Promise<WrittenScreen>;
  /** @throws Problem 422 when reading takes too long or too much memory. */
  readWorkbook(bytes: Uint8Array, fileName: string): Promise<ParsedWorkbook>;
  close(): Promise<void>;
}

const workbookSeconds = 60;
const workbookMegabytes = 512;
const waitingBatches = 32;
const youngMegabytes = 64;
/** From this size on several threads share a batch, each some parts of it. */
const largeBatchBytes = 250_000;
const partsOfAThread = 4;
/** Wells of a screen that one thread takes at a time. */
const partSize = 64;

function workbookTooHeavy(cause: unknown) {
  return problems.workbookFaults(
    [
      {
        severity: 'stop',
        code: 'too-heavy',
        sheet: '',
        cell: null,
        found: null,
        expected: `a workbook that is read within ${workbookSeconds} s and ${workbookMegabytes} MB`,
        message:
          'The workbook is too heavy to read. Remove what does not belong to the screen, or split it.',
        cause: cause instanceof Error ? cause.name : undefined,
      },
    ],
    1,
  );
}

/** Does work on each item, at most `atATime` under way; answers in the order of the items. */
async function inTurn<T, R>(
  items: readonly T[],
  atATime: number,
  work: (item: T) => Promise<R>,
): Promise<R[]> {
  const answers = new Array<R>(items.length);
  let next = 0;
  const lane = async () => {
    while (next < items.length) {
      const i = next;
      next += 1;
      answers[i] = await work(items[i]!);
    }
  };
  await Promise.all(Array.from({ length: Math.min(atATime, items.length) }, lane));
  return answers;
}

/**
 * Opens the pools on the bundled workers in `folder`; threads start when there is work.
 *
 * @param threads that fit at a time; all cores unless given
 */
export function openWorkerPools(folder: string, threads = availableParallelism()): WorkerPools {
  const file = (name: string) => resolve(folder, `${name}.worker.mjs`);
  const engine = new Piscina({
    minThreads: 0,
    maxThreads: threads,
    idleTimeout: 60_000,
    maxQueue: waitingBatches,
    // Fits leave much that is short-lived; clearing it away less often leaves the cores to them.
    resourceLimits: { maxYoungGenerationSizeMb: youngMegabytes },
  });
  const workbooks = new Piscina({
    minThreads: 0,
    maxThreads: 1,
    idleTimeout: 5_000,
    maxQueue: waitingBatches,
    resourceLimits: { maxOldGenerationSizeMb: workbookMegabytes },
  });

  const part = { filename: file('part') };
  const batch = { filename: file('batch') };

  return {
    async answerBatch(bytes) {
      if (engine.queueSize >= waitingBatches) throw problems.busy();
      if (bytes.byteLength < largeBatchBytes || threads < 2) {
        return (await engine.run(bytes, { ...batch, transferList: [bytes.buffer] })) as BatchAnswer;
      }
      const opened = (await engine.run(
        { bytes, parts: threads * partsOfAThread },
        { ...batch, name: 'open', transferList: [bytes.buffer] },
      )) as OpenedBatch;
      if ('refusal' in opened) return opened.refusal;
      const answers = await inTurn(opened.parts, threads, async (packed) => {
        const options = {
          ...part,
          name: 'runPacked',
          transferList: [packed.buffer as ArrayBuffer],
        };
        return (await engine.run(packed, options)) as Uint8Array;
      });
      return (await engine.run(
        { wells: opened.wells, answers },
        {
          ...batch,
          name: 'close',
          transferList: answers.map(({ buffer }) => buffer as ArrayBuffer),
        },
      )) as BatchAnswer;
    },
    async analyseScreen({ series, reference }, onProgress) {
      const total = series.length;
      const setting: PartSetting = { form: 'screen', reference, blanks: blanksOf(series) };
      let done = 0;
      const answers = await inTurn(divide(series, partSize), threads, async (one) => {
        const answer = (await engine.run({ setting, part: one }, part)) as PartAnswer;
        done += one.places.length;
        onProgress(done, total);
        return answer;
      });
      return gatherParts(total, answers);
    },
    async readWorkbook(bytes, fileName) {
      try {
        return (await workbooks.run(
          { bytes, fileName },
          { filename: file('workbook'), signal: AbortSignal.timeout(workbookSeconds * 1000) },
        )) as ParsedWorkbook;
      } catch (error) {
        const name = error instanceof Error ? error.name : '';
        const code = error instanceof Error && 'code' in error ? error.code : '';
        if (name === 'AbortError' || code === 'ERR_WORKER_OUT_OF_MEMORY') {
          throw workbookTooHeavy(error);
        }
        throw error;
      }
    },
    async close() {
      await Promise.all([engine.destroy(), workbooks.destroy()]);
    },
  };
}

import { availableParallelism } from 'node:os';
import { resolve } from 'node:path';
import { MessageChannel, type Transferable } from 'node:worker_threads';
import { Piscina } from 'piscina';
import { problems } from '../errors';
import type { DecaySeries, ReferenceConditions } from '../kinetics/types';
import type { Helper, WrittenScreen } from '../workers/shareParts';
import type { ParsedWorkbook } from '../workbooks/types';

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
/** From these sizes on several threads share the work. */
const largeBatchBytes = 250_000;
const largeScreenWells = 200;

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
  });
  const workbooks = new Piscina({
    minThreads: 0,
    maxThreads: 1,
    idleTimeout: 5_000,
    maxQueue: waitingBatches,
    resourceLimits: { maxOldGenerationSizeMb: workbookMegabytes },
  });

  /**
   * Runs a task that may have helpers: the task first, so that no thread waits for one that is not
   * there yet. A helper that comes too late goes again.
   */
  const runShared = (
    name: string,
    task: object,
    transferList: Transferable[],
    large: boolean,
  ): Promise<unknown> => {
    const channels = Array.from({ length: large ? threads - 1 : 0 }, () => {
      const { port1, port2 } = new MessageChannel();
      const signal = new SharedArrayBuffer(8);
      return { own: { port: port1, signal }, other: { port: port2, signal } };
    });
    const helpers: Helper[] = channels.map(({ own }) => own);
    const running = engine.run(
      { ...task, helpers },
      { filename: file(name), transferList: [...transferList, ...helpers.map(({ port }) => port)] },
    );
    for (const { other } of channels) {
      engine
        .run(other, { filename: file('part'), transferList: [other.port] })
        // The thread that shares out fits what a lost helper leaves.
        .catch(() => undefined);
    }
    return running;
  };

  return {
    async answerBatch(bytes) {
      if (engine.queueSize >= waitingBatches) throw problems.busy();
      const large = bytes.byteLength >= largeBatchBytes;
      return (await runShared('batch', { bytes }, [bytes.buffer], large)) as BatchAnswer;
    },
    async analyseScreen(input, onProgress) {
      const { port1, port2 } = new MessageChannel();
      port1.on('message', (message: { done: number; total: number }) => {
        onProgress(message.done, message.total);
      });
      try {
        const large = input.series.length >= largeScreenWells;
        const task = { ...input, port: port2 };
        return (await runShared('screen', task, [port2], large)) as WrittenScreen;
      } finally {
        port1.close();
      }
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

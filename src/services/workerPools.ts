import { availableParallelism } from 'node:os';
import { resolve } from 'node:path';
import { MessageChannel } from 'node:worker_threads';
import { Piscina } from 'piscina';
import { problems } from '../errors';
import type { DecaySeries, ReferenceConditions, ScreenAnalysis } from '../kinetics/types';
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
  ): Promise<ScreenAnalysis>;
  /** @throws Problem 422 when reading takes too long or too much memory. */
  readWorkbook(bytes: Uint8Array, fileName: string): Promise<ParsedWorkbook>;
  close(): Promise<void>;
}

const workbookSeconds = 60;
const workbookMegabytes = 512;
const waitingBatches = 32;

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

/** Opens the pools on the bundled workers in `folder`; threads start when there is work. */
export function openWorkerPools(folder: string): WorkerPools {
  const file = (name: string) => resolve(folder, `${name}.worker.mjs`);
  const engine = new Piscina({
    minThreads: 0,
    maxThreads: availableParallelism(),
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

  return {
    async answerBatch(bytes) {
      if (engine.queueSize >= waitingBatches) throw problems.busy();
      return (await engine.run(bytes, {
        filename: file('batch'),
        transferList: [bytes.buffer],
      })) as BatchAnswer;
    },
    async analyseScreen(input, onProgress) {
      const { port1, port2 } = new MessageChannel();
      port1.on('message', (message: { done: number; total: number }) => {
        onProgress(message.done, message.total);
      });
      try {
        return (await engine.run(
          { ...input, port: port2 },
          { filename: file('screen'), transferList: [port2] },
        )) as ScreenAnalysis;
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

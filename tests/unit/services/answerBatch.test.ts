import { describe, expect, it } from 'vitest';
import type { Viewer } from '../../../src/auth/viewer';
import { answerBatch } from '../../../src/services/answerBatch';
import type { BatchAnswer, WorkerPools } from '../../../src/services/workerPools';

const viewer = (userId: string) => ({ userId }) as Viewer;
const answer: BatchAnswer = {
  status: 200,
  contentType: 'application/json',
  body: new Uint8Array(),
};

describe('batches of one person', () => {
  it('are refused with 429 beyond four at a time, and taken again once one has ended', async () => {
    const finish: (() => void)[] = [];
    const pools = {
      answerBatch: () => new Promise<BatchAnswer>((resolve) => finish.push(() => resolve(answer))),
    } as Pick<WorkerPools, 'answerBatch'> as WorkerPools;
    const send = (userId: string) => answerBatch({ pools }, viewer(userId), new Uint8Array());

    const four = Array.from({ length: 4 }, () => send('a'));
    await expect(send('a')).rejects.toMatchObject({ status: 429, retryAfterS: 5 });
    const other = send('b');
    finish[0]?.();
    await four[0];
    const fifth = send('a');
    for (const end of finish) end();
    await expect(Promise.all([...four, other, fifth])).resolves.toHaveLength(6);
  });

  it('do not count once they have failed', async () => {
    const pools = {
      answerBatch: () => Promise.reject(new Error('worker gone')),
    } as Pick<WorkerPools, 'answerBatch'> as WorkerPools;
    for (let attempt = 0; attempt < 6; attempt += 1) {
      await expect(answerBatch({ pools }, viewer('c'), new Uint8Array())).rejects.toThrow(
        'worker gone',
      );
    }
  });
});

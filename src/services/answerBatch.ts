import type { Viewer } from '../auth/viewer';
import { problems } from '../errors';
import type { Services } from './services';
import type { BatchAnswer } from './workerPools';

/** Batches that one person may have under way at a time. */
const atATime = 4;
const retryAfterS = 5;

const underWay = new Map<string, number>();

/**
 * Answers one batch in a worker thread.
 *
 * @throws Problem 429 when the caller has several under way already, 503 when the server has too many
 */
export async function answerBatch(
  { pools }: Pick<Services, 'pools'>,
  viewer: Viewer,
  bytes: Uint8Array<ArrayBuffer>,
): Promise<BatchAnswer> {
  const before = underWay.get(viewer.userId) ?? 0;
  if (before >= atATime) throw problems.tooMany(retryAfterS);
  underWay.set(viewer.userId, before + 1);
  try {
    return await pools.answerBatch(bytes);
  } finally {
    const now = (underWay.get(viewer.userId) ?? 1) - 1;
    if (now > 0) underWay.set(viewer.userId, now);
    else underWay.delete(viewer.userId);
  }
}

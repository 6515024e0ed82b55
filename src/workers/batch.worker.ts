import { answerBatch, type BatchAnswer } from './analyseBatch';

/** Answers one batch in a thread of its own. */
export default function runBatch(bytes: Uint8Array): BatchAnswer {
  return answerBatch(bytes);
}

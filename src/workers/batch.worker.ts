import { move, transferableSymbol, valueSymbol } from 'piscina';
import { answerBatch, type BatchAnswer } from './analyseBatch';
import { dismiss, type Helper } from './shareParts';

/** One batch and the threads that help with it. */
export interface BatchTask {
  bytes: Uint8Array;
  helpers?: Helper[];
}

/** Answers one batch in a thread of its own; the bytes of the answer are handed over, not copied. */
export default function runBatch({ bytes, helpers = [] }: BatchTask): BatchAnswer {
  try {
    const answer = answerBatch(bytes, helpers);
    return move({
      ...answer,
      [transferableSymbol]: answer.body.buffer,
      [valueSymbol]: answer,
    }) as unknown as BatchAnswer;
  } finally {
    dismiss(helpers);
  }
}

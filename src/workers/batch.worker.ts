import { answerBatch, type BatchAnswer } from './analyseBatch';
import { dismiss, type Helper } from './shareParts';

/** One batch and the threads that help with it. */
export interface BatchTask {
  bytes: Uint8Array;
  helpers?: Helper[];
}

/** Answers one batch in a thread of its own. */
export default function runBatch({ bytes, helpers = [] }: BatchTask): BatchAnswer {
  try {
    return answerBatch(bytes, helpers);
  } finally {
    dismiss(helpers);
  }
}

import { deserialize, serialize } from 'node:v8';
import { answerBatch, openBatch, writeAnswer, type BatchAnswer } from './analyseBatch';
import type { PartAnswer } from './answerPart';
import { handOver, ownBuffer } from './handOver';

const answered = (answer: BatchAnswer) => handOver(answer, [answer.body]);

/** Answers one batch in a thread of its own. */
export default function runBatch(bytes: Uint8Array): BatchAnswer {
  return answered(answerBatch(bytes));
}

/** A large batch, checked and divided: packed parts for `part.worker`, or the refusal. */
export type OpenedBatch = { refusal: BatchAnswer } | { wells: number; parts: Uint8Array[] };

/** Parses, checks and divides a large batch into about so many parts. */
export function open({ bytes, parts }: { bytes: Uint8Array; parts: number }): OpenedBatch {
  const opened = openBatch(bytes);
  if ('refusal' in opened) return opened;
  const { setting, wells } = opened;
  const packed = opened.divide(parts).map((part) => ownBuffer(serialize({ setting, part })));
  return handOver({ wells, parts: packed }, packed);
}

/** Puts the packed answers to all parts together. */
export function close({ wells, answers }: { wells: number; answers: Uint8Array[] }): BatchAnswer {
  return answered(
    writeAnswer(
      wells,
      answers.map((bytes) => deserialize(bytes) as PartAnswer),
    ),
  );
}

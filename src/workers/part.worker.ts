import { deserialize, serialize } from 'node:v8';
import { partAnalyser, type Part, type PartAnswer, type PartSetting } from './answerPart';
import { handOver, ownBuffer } from './handOver';

/** A part of a screen or batch with what it needs to know of the whole. */
export interface PartTask {
  setting: PartSetting;
  part: Part;
}

/** Analyses a part of a stored screen; results are text, which is quick to copy. */
export default function runPart({ setting, part }: PartTask): PartAnswer {
  return partAnalyser(setting)(part);
}

/** The same for a part of a batch, packed, so that the server's thread only passes it on. */
export function runPacked(bytes: Uint8Array): Uint8Array {
  const answer = ownBuffer(serialize(runPart(deserialize(bytes) as PartTask)));
  return handOver(answer, [answer]);
}

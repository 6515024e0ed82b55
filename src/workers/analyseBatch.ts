import { notJsonProblem, type BatchProblem } from '../contracts/batchProblem';
import { parseBatchRequest } from '../contracts/batchRequest';
import { decaySeriesOf, referenceOf } from '../contracts/batchToEngine';
import { ENGINE_VERSION } from '../kinetics/constants';
import {
  blanksOf,
  divide,
  partAnalyser,
  type Part,
  type PartAnswer,
  type PartSetting,
} from './answerPart';
import { gatherParts } from './gatherParts';

/** An HTTP answer without the server around it. */
export interface BatchAnswer {
  status: number;
  contentType: string;
  body: Uint8Array;
}

const encode = (text: string) => new TextEncoder().encode(text);

const refuse = (problem: BatchProblem) => ({
  refusal: {
    status: problem.status,
    contentType: 'application/problem+json',
    body: encode(JSON.stringify(problem)),
  },
});

/** A batch that was accepted. */
export interface OpenBatch {
  wells: number;
  setting: PartSetting;
  divide(parts: number): Part[];
}

/**
 * Parses and checks a batch.
 *
 * @param bytes the body of the request, UTF-8
 * @returns refused with 400, 413 or 422 and a problem (RFC 9457), or the batch to analyse
 */
export function openBatch(bytes: Uint8Array): { refusal: BatchAnswer } | OpenBatch {
  let document: unknown;
  try {
    document = JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(bytes));
  } catch (error) {
    const reason = error instanceof SyntaxError ? `${error.message}.` : 'The bytes are not UTF-8.';
    return refuse(notJsonProblem(reason));
  }
  const parsed = parseBatchRequest(document);
  if (!parsed.ok) return refuse(parsed.problem);
  const series = parsed.request.series.map(decaySeriesOf);
  return {
    wells: series.length,
    setting: {
      form: 'batch',
      reference: referenceOf(parsed.request.reference),
      blanks: blanksOf(series),
    },
    divide: (parts) => divide(series, Math.ceil(series.length / parts)),
  };
}

/** Writes the answer from those to all parts. */
export function writeAnswer(wells: number, answers: readonly PartAnswer[]): BatchAnswer {
  const { series, catalysts } = gatherParts(wells, answers);
  const list = (results: readonly { json: string }[]) => results.map(({ json }) => json).join(',');
  const text = `{"engine":${JSON.stringify(ENGINE_VERSION)},"series":[${list(series)}],"catalysts":[${list(catalysts)}]}`;
  return { status: 200, contentType: 'application/json', body: encode(text) };
}

/** Parses, checks, analyses and writes one batch, in this thread. */
export function answerBatch(bytes: Uint8Array): BatchAnswer {
  const opened = openBatch(bytes);
  if ('refusal' in opened) return opened.refusal;
  return writeAnswer(opened.wells, opened.divide(1).map(partAnalyser(opened.setting)));
}

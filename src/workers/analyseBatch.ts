import { notJsonProblem, type BatchProblem } from '../contracts/batchProblem';
import { parseBatchRequest } from '../contracts/batchRequest';
import { decaySeriesOf, referenceOf } from '../contracts/batchToEngine';
import { ENGINE_VERSION } from '../kinetics/constants';
import { analyseShared, type Helper } from './shareParts';

/** An HTTP answer without the server around it. */
export interface BatchAnswer {
  status: number;
  contentType: string;
  body: Uint8Array;
}

function writeJson(status: number, contentType: string, value: unknown): BatchAnswer {
  return { status, contentType, body: new TextEncoder().encode(JSON.stringify(value)) };
}

const refuse = (problem: BatchProblem) =>
  writeJson(problem.status, 'application/problem+json', problem);

/**
 * Parses, checks, analyses and writes one batch.
 *
 * @param bytes the body of the request, UTF-8
 * @param helpers threads that fit wells for this one
 * @returns status 200 with the answer, else 400, 413 or 422 with a problem (RFC 9457)
 */
export function answerBatch(bytes: Uint8Array, helpers: readonly Helper[] = []): BatchAnswer {
  let document: unknown;
  try {
    document = JSON.parse(new TextDecoder('utf-8', { fatal: true }).decode(bytes));
  } catch (error) {
    const reason = error instanceof SyntaxError ? `${error.message}.` : 'The bytes are not UTF-8.';
    return refuse(notJsonProblem(reason));
  }
  const parsed = parseBatchRequest(document);
  if (!parsed.ok) return refuse(parsed.problem);
  const { series, reference } = parsed.request;
  const given = { form: 'batch' as const, reference: referenceOf(reference) };
  const written = analyseShared(series.map(decaySeriesOf), given, helpers);
  const list = (results: readonly { json: string }[]) => results.map(({ json }) => json).join(',');
  const text = `{"engine":${JSON.stringify(ENGINE_VERSION)},"series":[${list(written.series)}],"catalysts":[${list(written.catalysts)}]}`;
  return { status: 200, contentType: 'application/json', body: new TextEncoder().encode(text) };
}

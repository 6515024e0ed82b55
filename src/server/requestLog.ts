import type { IncomingMessage, ServerResponse } from 'node:http';

/** Longest path that is written down. */
const pathLimit = 200;

/** A text that cannot break a line of the log, nor drive the terminal that shows it. */
export const oneLine = (text: string): string => text.replace(/[\p{Cc}\u2028\u2029]/gu, '?');

/** One answered request as a line of JSON; the query stays out, since it may hold what is private. */
export function requestLine(entry: {
  requestId: string;
  method: string;
  path: string;
  status: number;
  ms: number;
}): string {
  const { path, ...rest } = entry;
  return JSON.stringify({ ...rest, path: oneLine(path.slice(0, pathLimit)) });
}

/** Writes a line when the answer is out: for every request, or only for those that failed here. */
export function logRequest(
  request: IncomingMessage,
  response: ServerResponse,
  requestId: string,
  everything: boolean,
): void {
  const start = performance.now();
  const method = request.method ?? 'GET';
  const path = (request.url ?? '/').split('?')[0] ?? '/';
  response.once('close', () => {
    const status = response.statusCode;
    if (!everything && status < 500) return;
    const ms = Math.round(performance.now() - start);
    console.log(requestLine({ requestId, method, path, status, ms }));
  });
}

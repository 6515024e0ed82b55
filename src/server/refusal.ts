import type { IncomingMessage, ServerResponse } from 'node:http';

/** Refusals made before a request reaches the application. */
export interface Refusal {
  status: number;
  code: string;
  title: string;
  detail: string;
}

export const refusals = {
  badTarget: {
    status: 400,
    code: 'bad-address',
    title: 'The address cannot be read',
    detail: 'Ask for a path that begins with one slash and is properly encoded.',
  },
  notFound: {
    status: 404,
    code: 'not-found',
    title: 'Nothing is here',
    detail: 'The address is wrong.',
  },
  tooLarge: (limit: number): Refusal => ({
    status: 413,
    code: 'too-large',
    title: 'Too large',
    detail: `At most ${Math.floor(limit / 1024 / 1024)} MB are taken at once. Send less.`,
  }),
  foreignHost: (appUrl: URL): Refusal => ({
    status: 421,
    code: 'foreign-host',
    title: 'Not the address of this server',
    detail: `Open ${appUrl.origin} instead, or set APP_URL to the address that people use.`,
  }),
  unexpected: {
    status: 500,
    code: 'unexpected',
    title: 'Something went wrong here',
    detail: 'It was noted. Nothing that you had saved is lost; try again.',
  },
} as const;

/** How much of a refused body is still read, so that its sender gets to read the refusal. */
const drainedBytes = 128 * 1024 * 1024;
const drainedMs = 10_000;

/** Answers with an RFC 9457 problem body and lets the connection go once it was read. */
export function refuse(
  request: IncomingMessage,
  response: ServerResponse,
  refusal: Refusal,
  requestId: string,
): void {
  const { status, code, title, detail } = refusal;
  const body = { type: `urn:ratewell:problem:${code}`, title, status, detail, requestId };
  response.writeHead(status, {
    'content-type': 'application/problem+json',
    'cache-control': 'no-store',
    ...(request.complete ? {} : { connection: 'close' }),
  });
  response.end(request.method === 'HEAD' ? undefined : JSON.stringify(body));
  if (!request.complete) drain(request);
}

function drain(request: IncomingMessage): void {
  let left = drainedBytes;
  const giveUp = setTimeout(() => request.destroy(), drainedMs);
  request.once('close', () => {
    clearTimeout(giveUp);
  });
  request.on('data', (chunk: Buffer) => {
    left -= chunk.length;
    if (left < 0) request.destroy();
  });
  request.resume();
}

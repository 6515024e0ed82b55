import type { IncomingMessage, ServerResponse } from 'node:http';
import { createGzip, type Gzip } from 'node:zlib';

const compressible =
  /^(text\/(?!event-stream)|application\/([\w.-]+\+)?(json|xml|javascript)|image\/svg)/;

/** True when the client takes `coding`; "gzip;q=0" is a no. */
export function accepts(acceptEncoding: string | undefined, coding: string): boolean {
  return (acceptEncoding ?? '').split(',').some((offer) => {
    const [name, ...parameters] = offer.split(';').map((part) => part.trim().toLowerCase());
    return name === coding && !parameters.some((one) => /^q=0(\.0*)?$/.test(one));
  });
}

type HeaderValue = ReturnType<ServerResponse['getHeader']>;

/** True for text that gains by compression and may be changed on its way. */
export function isCompressible(contentType: HeaderValue, cacheControl?: HeaderValue): boolean {
  const isText = compressible.test(String(contentType ?? ''));
  return isText && !String(cacheControl ?? '').includes('no-transform');
}

/**
 * Makes what the application writes to `response` leave compressed, where the client takes gzip and
 * the answer is text. Event streams and what is compressed already pass as they are.
 */
export function compressAnswers(request: IncomingMessage, response: ServerResponse): void {
  if (request.method === 'HEAD' || !accepts(request.headers['accept-encoding'], 'gzip')) return;
  const plain = {
    writeHead: response.writeHead.bind(response) as (...args: unknown[]) => ServerResponse,
    write: response.write.bind(response) as (...args: unknown[]) => boolean,
    end: response.end.bind(response) as (...args: unknown[]) => ServerResponse,
  };
  let gzip = null as Gzip | null;

  const begin = (): void => {
    const empty = response.statusCode === 204 || response.statusCode === 304;
    if (empty || response.hasHeader('content-encoding')) return;
    if (!isCompressible(response.getHeader('content-type'), response.getHeader('cache-control'))) {
      return;
    }
    response.removeHeader('content-length');
    response.setHeader('content-encoding', 'gzip');
    response.appendHeader('vary', 'accept-encoding');
    gzip = createGzip({ level: 5 });
    gzip.on('data', (chunk: Buffer) => {
      if (!plain.write(chunk)) {
        gzip?.pause();
        response.once('drain', () => gzip?.resume());
      }
    });
    gzip.on('end', () => plain.end());
    gzip.on('error', (error) => response.destroy(error));
    response.once('close', () => gzip?.destroy());
  };

  response.writeHead = (status: number, ...rest: unknown[]) => {
    response.statusCode = status;
    const headers = rest.find((one) => typeof one === 'object' && one !== null);
    for (const [name, value] of Object.entries(headers ?? {})) {
      response.setHeader(name, value as string | string[]);
    }
    begin();
    return plain.writeHead(response.statusCode);
  };

  response.write = ((...args: unknown[]) => {
    if (!response.headersSent) response.writeHead(response.statusCode);
    return gzip ? gzip.write(args[0]) : plain.write(...args);
  }) as typeof response.write;

  response.end = ((...args: unknown[]) => {
    if (!response.headersSent) response.writeHead(response.statusCode);
    if (!gzip) return plain.end(...args);
    const [chunk] = args;
    if (typeof chunk === 'function' || chunk === undefined || chunk === null) gzip.end();
    else gzip.end(chunk as Buffer);
    return response;
  }) as typeof response.end;
}

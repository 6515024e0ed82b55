import type { IncomingMessage } from 'node:http';

const MB = 1024 * 1024;

/** A workbook has up to 32 MB; the form around it takes a little more. */
const uploadLimit = 33 * MB;
/** 2,000,000 readings with their times, every digit written out, take some 80 MB. */
const batchLimit = 128 * MB;
const otherLimit = 1 * MB;

/** The most bytes of body that are taken at `path`. */
export function bodyLimit(method: string, path: string): number {
  if (method !== 'POST') return otherLimit;
  switch (path.replace(/\/$/, '')) {
    case '/api/v1/screens':
      return uploadLimit;
    case '/api/v1/analyse':
      return batchLimit;
    default:
      return otherLimit;
  }
}

/** True when the request itself says that its body is above `limit`. */
export function isDeclaredTooLarge(contentLength: string | undefined, limit: number): boolean {
  return contentLength !== undefined && Number(contentLength) > limit;
}

/**
 * The body of a request as it comes in, cut off above `limit`: `onExceeded` is called once, and the
 * reader gets an error instead of more bytes.
 */
export async function* countedBody(
  request: IncomingMessage,
  limit: number,
  onExceeded: () => void,
): AsyncGenerator<Buffer, void> {
  let bytes = 0;
  // The connection stays open, so that the refusal can still be sent.
  for await (const chunk of request.iterator({ destroyOnReturn: false })) {
    bytes += (chunk as Buffer).length;
    if (bytes > limit) {
      onExceeded();
      throw new Error(`the body is above ${limit} bytes`);
    }
    yield chunk as Buffer;
  }
}

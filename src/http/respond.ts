import type { Problem } from '../errors';

const noStore = { 'cache-control': 'no-store' };

export function json(body: unknown, status = 200, headers: Record<string, string> = {}): Response {
  return new Response(JSON.stringify(body), {
    status,
    headers: { 'content-type': 'application/json', ...noStore, ...headers },
  });
}

/** 201 with the address of what was made. */
export function created(body: unknown, location: string): Response {
  return json(body, 201, { location });
}

/** 202: taken on; `location` says where to look for the outcome. */
export function accepted(body: unknown, location: string): Response {
  return json(body, 202, { location });
}

/** An RFC 9457 problem body. */
export function problemResponse(problem: Problem, requestId: string): Response {
  return new Response(
    JSON.stringify({
      type: `urn:ratewell:problem:${problem.code}`,
      title: problem.title,
      status: problem.status,
      detail: problem.detail,
      ...(problem.errors ? { errors: problem.errors } : {}),
      ...problem.extra,
      requestId,
    }),
    {
      status: problem.status,
      headers: {
        'content-type': 'application/problem+json',
        ...noStore,
        ...(problem.retryAfterS === undefined
          ? {}
          : { 'retry-after': String(problem.retryAfterS) }),
        ...(problem.status === 401 ? { 'www-authenticate': 'Bearer' } : {}),
      },
    },
  );
}

/** A file to save; the name is safe for every client (RFC 6266). */
export function download(bytes: Uint8Array, fileName: string, contentType: string): Response {
  const ascii = fileName.replace(/[^\w.-]+/g, '_');
  return new Response(new Uint8Array(bytes), {
    headers: {
      'content-type': contentType,
      'content-disposition': `attachment; filename="${ascii}"; filename*=UTF-8''${encodeURIComponent(fileName)}`,
      'x-content-type-options': 'nosniff',
      ...noStore,
    },
  });
}

const safeMethods = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * True when a request may change something: it is safe by its method, carries a Bearer token (and
 * then no cookie counts), or comes from our own pages.
 *
 * @param ownOrigin scheme, host and port that the application is reached at
 */
export function mayChange(method: string, headers: Headers, ownOrigin: string): boolean {
  if (safeMethods.has(method)) return true;
  if (/^Bearer /i.test(headers.get('authorization') ?? '')) return true;
  const origin = headers.get('origin');
  if (origin !== null) return origin === ownOrigin;
  return headers.get('sec-fetch-site') === 'same-origin';
}

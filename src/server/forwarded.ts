import type { IncomingHttpHeaders } from 'node:http';

/** Headers that say where a request came from; only a proxy of ours may be believed. */
const claims = [
  'forwarded',
  'x-forwarded-for',
  'x-forwarded-host',
  'x-forwarded-port',
  'x-forwarded-proto',
  'x-forwarded-server',
  'x-real-ip',
  'x-original-url',
  'x-rewrite-url',
];

/**
 * The caller's address: the socket's, or with `trustedHops` proxies of ours the entry that the
 * outermost of them wrote, counted from the right; what stands left of it anybody may have written.
 */
export function callerAddress(
  forwardedFor: string | undefined,
  socketAddress: string | undefined,
  trustedHops: number,
): string {
  const nearest = (socketAddress ?? 'unknown').replace(/^::ffff:(?=\d+\.)/, '');
  if (trustedHops === 0) return nearest;
  const hops = (forwardedFor ?? '')
    .split(',')
    .map((hop) => hop.trim())
    .filter(Boolean);
  return hops[Math.max(hops.length - trustedHops, 0)] ?? nearest;
}

/** Replaces in place whatever the client claims by the public address and the caller's address. */
export function setForwarded(headers: IncomingHttpHeaders, appUrl: URL, caller: string): void {
  for (const name of claims) Reflect.deleteProperty(headers, name);
  headers.host = appUrl.host;
  headers['x-forwarded-host'] = appUrl.host;
  headers['x-forwarded-proto'] = appUrl.protocol.slice(0, -1);
  headers['x-forwarded-for'] = caller;
}

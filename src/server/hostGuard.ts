const loopback = new Set(['localhost', '127.0.0.1', '[::1]']);

export type HostVerdict = 'ours' | 'loopback' | 'foreign';

/**
 * Judges the Host header against the public address: `ours` goes on, `loopback` is another name of
 * this same machine and port, `foreign` is refused.
 */
export function judgeHost(host: string | undefined, appUrl: URL): HostVerdict {
  if (!host || /[\s/\\@?#]/.test(host)) return 'foreign';
  let asked: URL;
  try {
    asked = new URL(`${appUrl.protocol}//${host}`);
  } catch {
    return 'foreign';
  }
  if (asked.host === appUrl.host) return 'ours';
  const both = loopback.has(asked.hostname) && loopback.has(appUrl.hostname);
  return both && asked.port === appUrl.port ? 'loopback' : 'foreign';
}

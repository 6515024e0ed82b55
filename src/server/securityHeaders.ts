import type { ServerResponse } from 'node:http';

/** Pages bring a policy of their own, with the hashes of their scripts, which replaces this one. */
const nothingRuns = "default-src 'none'; frame-ancestors 'none'; base-uri 'none'";

const always = {
  'x-content-type-options': 'nosniff',
  'referrer-policy': 'same-origin',
  'cross-origin-opener-policy': 'same-origin',
  'cross-origin-resource-policy': 'same-origin',
  'permissions-policy': 'camera=(), geolocation=(), microphone=(), payment=(), usb=()',
  'x-frame-options': 'DENY',
  'content-security-policy': nothingRuns,
};

/** Sets the headers that no answer goes without; a later header of the same name replaces one. */
export function setSecurityHeaders(response: ServerResponse, appUrl: URL): void {
  for (const [name, value] of Object.entries(always)) response.setHeader(name, value);
  if (appUrl.protocol === 'https:') {
    response.setHeader('strict-transport-security', 'max-age=31536000; includeSubDomains');
  }
}

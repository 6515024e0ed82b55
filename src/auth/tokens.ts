import { createHash, randomBytes } from 'node:crypto';

const prefix = 'rw_';

/** A new secret for scripts: a prefix that scanners can find, and 256 random bits. */
export function newToken(): string {
  return prefix + randomBytes(32).toString('base64url');
}

/** What is stored of a token. */
export function tokenSha256(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}

/** The token of an `Authorization: Bearer …` header; null without one. */
export function bearerToken(headers: Headers): string | null {
  const match = /^Bearer +([\w.~+/=-]+)$/i.exec(headers.get('authorization') ?? '');
  return match?.[1] ?? null;
}

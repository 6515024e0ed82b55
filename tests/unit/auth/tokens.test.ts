import { describe, expect, it } from 'vitest';
import { bearerToken, newToken, tokenSha256 } from '../../../src/auth/tokens';

describe('tokens', () => {
  it('are never the same twice and hold at least 256 bits', () => {
    const tokens = new Set(Array.from({ length: 100 }, newToken));
    expect(tokens.size).toBe(100);
    for (const token of tokens) {
      expect(Buffer.from(token.slice('rw_'.length), 'base64url')).toHaveLength(32);
    }
  });

  it('are stored as SHA-256 (test vector "abc", FIPS 180-4)', () => {
    expect(tokenSha256('abc')).toBe(
      'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad',
    );
  });

  it('are read from a Bearer header and nothing else', () => {
    const token = newToken();
    const of = (authorization: string) => bearerToken(new Headers({ authorization }));
    expect(of(`Bearer ${token}`)).toBe(token);
    expect(of(`bearer ${token}`)).toBe(token);
    expect(of(`Basic ${token}`)).toBeNull();
    expect(of(`Bearer ${token} x`)).toBeNull();
    expect(bearerToken(new Headers())).toBeNull();
  });
});

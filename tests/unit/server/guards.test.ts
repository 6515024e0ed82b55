import { describe, expect, it } from 'vitest';
import { bodyLimit, isDeclaredTooLarge } from '../../../src/server/bodyLimit';
import { accepts, isCompressible } from '../../../src/server/compression';
import { callerAddress, setForwarded } from '../../../src/server/forwarded';
import { judgeHost } from '../../../src/server/hostGuard';
import { readServerSettings } from '../../../src/server/serverSettings';

const appUrl = new URL('https://rates.lab.example');

describe('judgeHost', () => {
  it('lets in the public address and nothing that only looks like it', () => {
    expect(judgeHost('rates.lab.example', appUrl)).toBe('ours');
    expect(judgeHost('RATES.lab.example:443', appUrl)).toBe('ours');
    for (const host of [
      undefined,
      '',
      'evil.example',
      'rates.lab.example.evil.example',
      'rates.lab.example:8443',
      'rates.lab.example@evil.example',
      'rates.lab.example/path',
      '127.0.0.1',
    ]) {
      expect(judgeHost(host, appUrl)).toBe('foreign');
    }
  });

  it('knows the other names of this machine, on the same port only', () => {
    const local = new URL('http://127.0.0.1:4321');
    expect(judgeHost('localhost:4321', local)).toBe('loopback');
    expect(judgeHost('[::1]:4321', local)).toBe('loopback');
    expect(judgeHost('localhost:4322', local)).toBe('foreign');
  });
});

describe('callerAddress', () => {
  it('believes nobody unless a proxy is ours', () => {
    expect(callerAddress('203.0.113.9', '::ffff:198.51.100.7', 0)).toBe('198.51.100.7');
  });

  it('counts our proxies from the right, past what the client wrote itself', () => {
    const claimed = '192.0.2.1, 203.0.113.9, 10.0.0.2';
    expect(callerAddress(claimed, '10.0.0.1', 1)).toBe('10.0.0.2');
    expect(callerAddress(claimed, '10.0.0.1', 2)).toBe('203.0.113.9');
    expect(callerAddress(undefined, '10.0.0.1', 2)).toBe('10.0.0.1');
  });
});

describe('setForwarded', () => {
  it('replaces every claim by what this server knows', () => {
    const headers = {
      host: 'evil.example',
      forwarded: 'host=evil.example',
      'x-forwarded-host': 'evil.example',
      'x-forwarded-proto': 'http',
      'x-original-url': '/admin',
    };
    setForwarded(headers, appUrl, '198.51.100.7');
    expect(headers).toEqual({
      host: 'rates.lab.example',
      'x-forwarded-host': 'rates.lab.example',
      'x-forwarded-proto': 'https',
      'x-forwarded-for': '198.51.100.7',
    });
  });
});

describe('bodyLimit', () => {
  it('takes a large body only where one is expected', () => {
    const mb = 1024 * 1024;
    expect(bodyLimit('POST', '/api/v1/analyse')).toBe(128 * mb);
    expect(bodyLimit('POST', '/api/v1/screens')).toBe(33 * mb);
    expect(bodyLimit('PUT', '/api/v1/analyse')).toBe(mb);
    expect(bodyLimit('POST', '/api/v1/screens/x/analyses')).toBe(mb);
  });

  it('refuses by the declared length where there is one', () => {
    expect(isDeclaredTooLarge('1001', 1000)).toBe(true);
    expect(isDeclaredTooLarge('1000', 1000)).toBe(false);
    expect(isDeclaredTooLarge(undefined, 1000)).toBe(false);
  });
});

describe('compression', () => {
  it('follows what the client takes', () => {
    expect(accepts('gzip, deflate, br', 'br')).toBe(true);
    expect(accepts('gzip;q=0, br', 'gzip')).toBe(false);
    expect(accepts(undefined, 'gzip')).toBe(false);
  });

  it('leaves event streams and binary files as they are', () => {
    expect(isCompressible('application/problem+json')).toBe(true);
    expect(isCompressible('text/html; charset=utf-8')).toBe(true);
    expect(isCompressible('text/event-stream')).toBe(false);
    expect(isCompressible('image/png')).toBe(false);
    expect(isCompressible('application/json', 'no-transform')).toBe(false);
  });
});

describe('readServerSettings', () => {
  const env = {
    APP_URL: 'http://127.0.0.1:4321',
    AUTH_SECRET: 'a secret of thirty-two characters',
    DATABASE_URL: 'mysql://ratewell:x@127.0.0.1:3306/ratewell',
  };

  it('reads a full environment and fills in the rest', () => {
    expect(readServerSettings({ ...env, PORT: '' })).toMatchObject({
      port: 4321,
      host: '127.0.0.1',
      trustedHops: 0,
    });
  });

  it('names every fault at once, and never the secret itself', () => {
    const broken = {
      ...env,
      AUTH_SECRET: 'too short',
      DATABASE_URL: 'postgres://x',
      TRUST_PROXY_HOPS: '-1',
    };
    const read = () => readServerSettings(broken);
    expect(read).toThrow(/AUTH_SECRET.*DATABASE_URL.*TRUST_PROXY_HOPS/);
    expect(read).not.toThrow(/too short/);
  });

  it('refuses a public address that has a path or a user', () => {
    for (const APP_URL of ['http://lab.example/ratewell', 'http://me@lab.example', 'lab.example']) {
      expect(() => readServerSettings({ ...env, APP_URL })).toThrow(/APP_URL/);
    }
  });
});

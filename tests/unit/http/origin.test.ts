import { describe, expect, it } from 'vitest';
import { mayChange } from '../../../src/http/origin';

const own = 'https://ratewell.lab.example';
const post = (headers: Record<string, string>) => mayChange('POST', new Headers(headers), own);

describe('requests that change something', () => {
  it('pass from our own pages', () => {
    expect(post({ origin: own })).toBe(true);
    expect(post({ 'sec-fetch-site': 'same-origin' })).toBe(true);
  });

  it.each([
    ['another site', { origin: 'https://elsewhere.example' }],
    ['another port', { origin: `${own}:8443` }],
    ['plain http', { origin: 'http://ratewell.lab.example' }],
    ['an opaque origin', { origin: 'null' }],
    ['nowhere that can be told', {}],
    ['a cross-site fetch', { 'sec-fetch-site': 'cross-site' }],
    ['a sibling host', { 'sec-fetch-site': 'same-site' }],
    [
      'a foreign JSON request',
      { origin: 'https://elsewhere.example', 'content-type': 'application/json' },
    ],
  ])('are refused from %s', (_from, headers) => {
    expect(post(headers)).toBe(false);
  });

  it('pass with a Bearer token, which no other site can make a browser send', () => {
    expect(post({ authorization: 'Bearer rw_x', origin: 'https://elsewhere.example' })).toBe(true);
  });

  it('are not those that only read', () => {
    expect(mayChange('GET', new Headers({ origin: 'https://elsewhere.example' }), own)).toBe(true);
  });
});

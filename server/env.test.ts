import { describe, expect, it } from 'vitest';
import { fakesActive, parseKeys, readEnv } from './env.ts';

const key = Buffer.alloc(32, 7).toString('base64');

describe('the fakes', () => {
  const wanted = { FURLONG_FAKES: '1' };
  it.each([
    [wanted, true],
    [{ ...wanted, HOST: '::1', PUBLIC_URL: 'http://localhost:5173' }, true],
    [{}, false],
    [{ ...wanted, NODE_ENV: 'production' }, false],
    [{ ...wanted, HOST: '0.0.0.0', PUBLIC_URL: 'http://127.0.0.1:4173' }, false],
    // Listening on loopback behind a proxy is open to everyone.
    [{ ...wanted, PUBLIC_URL: 'https://vans.example.org' }, false],
  ])('with %o: %s', (source, active) => {
    expect(fakesActive(readEnv(source))).toBe(active);
  });
});

describe('readEnv', () => {
  it.each([
    [{ HOST: '0.0.0.0' }, /PUBLIC_URL must be set when HOST is 0\.0\.0\.0/],
    [{ PUBLIC_URL: 'https://vans.example.org/app' }, /PUBLIC_URL: must be an address/],
    [{ PUBLIC_URL: 'javascript:alert(1)' }, /PUBLIC_URL: must be an address/],
    [{ NODE_ENV: 'production', FURLONG_CLOCK_OFFSET_MS: '1' }, /FURLONG_CLOCK_OFFSET_MS/],
  ])('refuses %o by name', (source, words) => {
    expect(() => readEnv(source)).toThrow(words);
  });
});

describe('parseKeys', () => {
  it('reads a ring and refuses what would not open again', () => {
    expect(parseKeys(`new:${key}, old:${key}`).keys.map(({ id }) => id)).toEqual(['new', 'old']);
    // A dot or an id twice would leave sealed texts nobody can open.
    for (const bad of ['', key, `a.b:${key}`, `k:${key},k:${key}`, 'k:c2hvcnQ='])
      expect(() => parseKeys(bad), `${bad}`).toThrow('FURLONG_KEYS');
  });
});

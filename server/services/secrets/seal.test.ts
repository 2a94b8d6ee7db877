import { expect, it } from 'vitest';
import { openSeal, seal } from './seal.ts';
import { hashToken, makeToken, signatureFits, signValue } from './tokens.ts';

/** What node:crypto says when the tag does not fit text, key and associated data. */
const refused = 'unable to authenticate data';
const place = { businessId: 'b1', rowId: 'r1', field: 'gateCode' };

it('opens what it sealed, in its own place only', () => {
  const sealed = seal('4711#', place);
  expect(sealed).not.toContain('4711');
  expect(openSeal(sealed, place)).toBe('4711#');
  expect(() => openSeal(sealed, { ...place, businessId: 'b2' })).toThrow(refused);
  expect(() => openSeal(sealed, { ...place, rowId: 'r2' })).toThrow(refused);
  expect(() => openSeal(`${sealed.slice(0, -3)}AAA`, place)).toThrow(refused);
  expect(seal('4711#', place)).not.toBe(sealed);
});

it('opens nothing by a tag cut short', () => {
  const [key, nonce, tag, text] = seal('4711#', place).split('.') as [
    string,
    string,
    string,
    string,
  ];
  const cut = Buffer.from(tag, 'base64url').subarray(0, 4).toString('base64url');
  expect(() => openSeal([key, nonce, cut, text].join('.'), place)).toThrow('tag');
});

it('makes 22-letter tokens and signs for one purpose', () => {
  expect(makeToken()).toMatch(/^[\w-]{22}$/);
  expect(hashToken('a')).toMatch(/^[0-9a-f]{64}$/);
  const signature = signValue('csrf', 'session-1');
  expect(signatureFits('csrf', 'session-1', signature)).toBe(true);
  expect(signatureFits('callback', 'session-1', signature)).toBe(false);
  expect(signatureFits('csrf', 'session-2', signature)).toBe(false);
  expect(signatureFits('csrf', 'session-1', 'é'.repeat(signature.length))).toBe(false);
});

import { expect, test } from 'vitest';
import { readyUrl } from './readyUrl.mjs';

test('only the ready line gives an address', () => {
  expect(readyUrl('furlong ready http://127.0.0.1:4173/')).toBe('http://127.0.0.1:4173/');
  expect(readyUrl('furlong ready')).toBeUndefined();
  expect(readyUrl('not furlong ready http://127.0.0.1:4173/')).toBeUndefined();
});

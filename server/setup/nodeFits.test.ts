import { expect, test } from 'vitest';
import { nodeFits } from './nodeFits.mjs';

const range = '>=20.19 <21 || >=22.12';

test.each(['20.19.0', '20.20.2', '22.12.0', '24.1.0'])('Node %s will do', (version) => {
  expect(nodeFits(version, range)).toBe(true);
});

test.each(['18.20.0', '20.18.3', '21.7.0', '22.11.9'])('Node %s will not', (version) => {
  expect(nodeFits(version, range)).toBe(false);
});

test('a range it cannot read is an error, not a yes', () => {
  expect(() => nodeFits('20.20.2', '^20')).toThrow('cannot read "^20"');
});

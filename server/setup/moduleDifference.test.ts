import { expect, test } from 'vitest';
import { moduleDifference } from './moduleDifference.mjs';

const machine = { os: 'linux', cpu: 'x64' };
const wanted = {
  packages: {
    '': { version: '0.1.0' },
    'node_modules/a': { version: '1.0.0' },
    'node_modules/b-x64': { version: '2.0.0', optional: true, os: ['linux'], cpu: ['x64'] },
    'node_modules/b-arm': { version: '2.0.0', optional: true, os: ['linux'], cpu: ['arm64'] },
  },
};
const a = wanted.packages['node_modules/a'];
const x64 = wanted.packages['node_modules/b-x64'];
const arm = wanted.packages['node_modules/b-arm'];
const difference = (packages: Record<string, object>) =>
  moduleDifference(wanted, { packages }, machine);

test('the same versions, optional ones for other machines left out, are up to date', () => {
  expect(difference({ 'node_modules/a': a, 'node_modules/b-x64': x64 })).toBeUndefined();
});

test('no record of an install means it was never finished', () => {
  expect(moduleDifference(wanted, undefined, machine)).toBe('they are not installed');
});

test.each([
  ['node_modules/a is missing', {}],
  ['node_modules/a is 0.9.0, not 1.0.0', { 'node_modules/a': { version: '0.9.0' } }],
  ['node_modules/c is no longer wanted', { 'node_modules/a': a, 'node_modules/c': a }],
  ['node_modules/b-arm is for another machine', { 'node_modules/a': a, 'node_modules/b-arm': arm }],
])('stale: %s', (reason, packages) => {
  expect(difference(packages)).toBe(reason);
});

test('a package that bars a system by "!" does not fit it', () => {
  const barred = { version: '1.0.0', os: ['!linux'] };
  const lock = { packages: { 'node_modules/d': barred } };
  expect(moduleDifference(lock, lock, machine)).toBe('node_modules/d is for another machine');
});

import { expect, test } from 'vitest';
import { debianSources } from './debianSources.mjs';

test("Debian's repositories of this release, each once, and nobody else's", () => {
  const targets = [
    'http://deb.example/debian/ bookworm main Packages',
    'http://deb.example/debian/ bookworm main Packages',
    'http://deb.example/debian/ bookworm main Sources',
    'http://deb.example/debian-security/ bookworm-security main Packages',
    'https://tools.example/apt/ tools-bookworm main Packages',
    'https://node.example/ nodistro main Packages',
    '',
  ].join('\n');
  expect(debianSources(targets, 'bookworm')).toEqual({
    mirror: 'http://deb.example/debian/',
    aptSources:
      'deb http://deb.example/debian/ bookworm main\n' +
      'deb http://deb.example/debian-security/ bookworm-security main\n',
  });
});

test('a machine that never ran apt-get update is told so', () => {
  expect(() => debianSources('', 'bookworm')).toThrow('run apt-get update first');
});

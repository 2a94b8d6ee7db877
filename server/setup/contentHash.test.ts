import fs from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { contentHash } from './contentHash.mjs';

let root: string;
beforeEach(() => {
  root = fs.mkdtempSync(path.join(os.tmpdir(), 'furlong-hash-'));
  fs.mkdirSync(path.join(root, 'src/deep'), { recursive: true });
  write('src/deep/a.ts', 'one');
  write('index.html', '<p>');
});
afterEach(() => fs.rmSync(root, { recursive: true }));

const write = (file: string, text: string) => fs.writeFileSync(path.join(root, file), text);
const hash = () => contentHash(root, ['src', 'index.html'], (file) => !file.endsWith('.test.ts'));

test('a new time stamp alone changes nothing', () => {
  const before = hash();
  fs.utimesSync(path.join(root, 'src/deep/a.ts'), new Date(), new Date(2_000_000_000_000));
  expect(hash()).toBe(before);
});

test('older content put back with an older time is still seen as a change', () => {
  const before = hash();
  write('src/deep/a.ts', 'two');
  fs.utimesSync(path.join(root, 'src/deep/a.ts'), new Date(0), new Date(0));
  expect(hash()).not.toBe(before);
});

test('added, renamed and removed files count, tests do not', () => {
  const before = hash();
  write('src/a.test.ts', 'test');
  expect(hash()).toBe(before);
  write('src/b.ts', '');
  const added = hash();
  expect(added).not.toBe(before);
  fs.renameSync(path.join(root, 'src/b.ts'), path.join(root, 'src/c.ts'));
  expect(hash()).not.toBe(added);
  fs.rmSync(path.join(root, 'src/c.ts'));
  expect(hash()).toBe(before);
});

test('an absent place is no error, its arrival a change', () => {
  const before = contentHash(root, ['src', 'later.ts']);
  write('later.ts', '');
  expect(contentHash(root, ['src', 'later.ts'])).not.toBe(before);
});

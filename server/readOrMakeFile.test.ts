import { chmodSync, mkdtempSync, readdirSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { readOrMakeFile } from './readOrMakeFile.ts';

let folder: string;
beforeEach(() => void (folder = mkdtempSync(join(tmpdir(), 'furlong-file-'))));
afterEach(() => rmSync(folder, { recursive: true }));

it('makes the file once, for its owner only, and leaves nothing beside it', () => {
  const path = join(folder, 'data', 'keys');
  expect(readOrMakeFile(path, () => 'first')).toBe('first');
  expect(readOrMakeFile(path, () => 'second')).toBe('first');
  expect(statSync(path).mode & 0o777).toBe(0o600);
  expect(readdirSync(join(folder, 'data'))).toEqual(['keys']);
});

it('takes the text of a process that was quicker, and starts over a draft a killed one left', () => {
  const path = join(folder, 'keys');
  writeFileSync(`${path}.${process.pid}`, 'half a');
  chmodSync(`${path}.${process.pid}`, 0o600);
  const read = readOrMakeFile(path, () => {
    writeFileSync(path, 'of the quicker one');
    return 'whole';
  });
  expect(read).toBe('of the quicker one');
  expect(readdirSync(folder)).toEqual(['keys']);
});

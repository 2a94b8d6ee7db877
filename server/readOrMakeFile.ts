import {
  closeSync,
  existsSync,
  fsyncSync,
  linkSync,
  mkdirSync,
  openSync,
  readFileSync,
  rmSync,
  writeSync,
} from 'node:fs';
import { dirname } from 'node:path';

/**
 * The text of a file only its owner reads (mode 0600); made with `make` when absent. It appears whole
 * or not at all, whenever the process is killed, and of two processes that start at once the first
 * one's text counts for both.
 */
export function readOrMakeFile(path: string, make: () => string): string {
  if (!existsSync(path)) {
    mkdirSync(dirname(path), { recursive: true });
    const draft = `${path}.${process.pid}`;
    const file = openSync(draft, 'w', 0o600);
    try {
      writeSync(file, make());
      fsyncSync(file);
    } finally {
      closeSync(file);
    }
    try {
      linkSync(draft, path);
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error;
    } finally {
      rmSync(draft);
    }
  }
  return readFileSync(path, 'utf8');
}

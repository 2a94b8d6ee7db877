import { appendFileSync, mkdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Letter } from './Letter.ts';

export interface KeptLetter extends Letter {
  id: string;
  /** ISO instant. */
  at: string;
}

export interface LetterBox {
  keep(id: string, letter: Letter): void;
  /** Newest first. */
  list(): KeptLetter[];
}

/** How many letters stay readable: a development page, not an archive. */
const keptLetters = 500;

/** The local fake mailbox: letters in memory and, with a folder, one JSON line each on disk. */
export function openLetterBox(folder: string | null): LetterBox {
  const file = folder === null ? null : join(folder, 'letters.jsonl');
  if (folder !== null) mkdirSync(folder, { recursive: true });
  const letters = file === null ? [] : readLetters(file).slice(-keptLetters);
  return {
    keep(id, { to, subject, text, html }) {
      const kept = { id, to, subject, text, html, at: new Date().toISOString() };
      letters.push(kept);
      if (letters.length > keptLetters) letters.shift();
      // Letters carry one-time links, so nobody else on the machine may read the file. The newline
      // comes first: half a line left by a killed server must not swallow this letter too.
      if (file !== null) appendFileSync(file, `\n${JSON.stringify(kept)}`, { mode: 0o600 });
    },
    list: () => letters.toReversed(),
  };
}

function readLetters(file: string): KeptLetter[] {
  let lines: string[];
  try {
    lines = readFileSync(file, 'utf8').split('\n');
  } catch {
    return [];
  }
  return lines.flatMap((line) => {
    try {
      return [JSON.parse(line) as KeptLetter];
    } catch {
      // A server killed while writing leaves half a line; the other letters are still good.
      return [];
    }
  });
}

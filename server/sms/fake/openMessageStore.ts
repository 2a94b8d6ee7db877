import { appendFileSync, mkdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { FakeMessage } from './FakeMessage.ts';

export interface MessageStore {
  /** Adds a message, or replaces the one with its sid. */
  put(message: FakeMessage): void;
  find(sid: string): FakeMessage | undefined;
  /** Oldest first. */
  all(): FakeMessage[];
}

/**
 * Messages in memory and, with a folder, one JSON line per change on disk: the last line of a sid
 * counts, so threads outlive restarts and a killed server loses at most its last line.
 */
export function openMessageStore(folder: string | null): MessageStore {
  const file = folder === null ? null : join(folder, 'texts.jsonl');
  if (folder !== null) mkdirSync(folder, { recursive: true });
  const messages = new Map<string, FakeMessage>();
  for (const message of file === null ? [] : readMessages(file)) messages.set(message.sid, message);
  return {
    put(message) {
      messages.set(message.sid, message);
      // The newline comes first: half a line left by a killed server must not swallow this one too.
      if (file !== null) appendFileSync(file, `\n${JSON.stringify(message)}`, { mode: 0o600 });
    },
    find: (sid) => messages.get(sid),
    all: () => [...messages.values()],
  };
}

function readMessages(file: string): FakeMessage[] {
  let lines: string[];
  try {
    lines = readFileSync(file, 'utf8').split('\n');
  } catch {
    return [];
  }
  return lines.flatMap((line) => {
    try {
      return [JSON.parse(line) as FakeMessage];
    } catch {
      return [];
    }
  });
}

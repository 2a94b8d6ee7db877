import type { KeptLetter } from './fakeLetterBox.ts';
import { currentMailer } from './openMail.ts';

/** Letters the fake mailbox kept, newest first; null while letters go to a real mail server. */
export function listFakeLetters(): KeptLetter[] | null {
  return currentMailer().fakeBox?.list() ?? null;
}

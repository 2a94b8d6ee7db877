import type { Letter } from './Letter.ts';
import { currentMailer } from './openMail.ts';

/**
 * Sends one letter through nodemailer: to the mail server, or to the fake mailbox without one.
 * Rejects when the mail server refuses or cannot be reached; the caller decides what that means.
 */
export async function sendLetter(letter: Letter): Promise<void> {
  await currentMailer().send(letter);
}

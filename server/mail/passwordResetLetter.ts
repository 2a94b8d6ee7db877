import type { Letter } from './Letter.ts';
import { letterPage } from './letterPage.ts';

/** The letter with the link that sets a new password. */
export function passwordResetLetter(fields: {
  to: string;
  name: string;
  url: string;
  validMinutes: number;
}): Letter {
  return {
    to: fields.to,
    subject: 'Set a new Furlong password',
    ...letterPage([
      `Hello ${fields.name}`,
      'Someone, most likely you, asked to set a new password for this address.',
      { label: 'Set a new password', url: fields.url },
      `The link works once and for ${fields.validMinutes} minutes. If you did not ask, leave this letter unanswered: your password stays as it is.`,
    ]),
  };
}

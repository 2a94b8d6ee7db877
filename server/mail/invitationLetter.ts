import type { Letter } from './Letter.ts';
import { letterPage } from './letterPage.ts';

/** The letter that asks someone to join a business. `roleWords` as read aloud: 'groomer and dispatcher'. */
export function invitationLetter(fields: {
  to: string;
  businessName: string;
  inviterName: string;
  roleWords: string;
  url: string;
  validDays: number;
}): Letter {
  return {
    to: fields.to,
    subject: `${fields.businessName} invites you to Furlong`,
    ...letterPage([
      'Hello',
      `${fields.inviterName} invites you to join ${fields.businessName} on Furlong as ${fields.roleWords}.`,
      { label: 'Accept the invitation', url: fields.url },
      `The link works once and for ${fields.validDays} days. If you do not know ${fields.businessName}, leave this letter unanswered: nothing happens.`,
    ]),
  };
}

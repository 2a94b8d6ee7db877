import { dateWords } from './dateWords.ts';
import { nameList } from './nameList.ts';
import { smsRange, type WallRange } from './wallRange.ts';

/**
 * All a template may know. There is no field for an address, a gate code, a caution or another
 * household, so no template can say one.
 */
export interface TextFields {
  booked: {
    businessName: string;
    petNames: readonly string[];
    /** YYYY-MM-DD. */
    date: string;
    promise: WallRange | null;
  };
  reminder: {
    businessName: string;
    petNames: readonly string[];
    date: string;
    promise: WallRange | null;
  };
  onTheWay: {
    businessName: string;
    groomerName: string;
    petNames: readonly string[];
    arrival: WallRange;
    /** Whole address of the arrival page. */
    link: string;
  };
}

export type TextKind = keyof TextFields;

const templates: { [Kind in TextKind]: (fields: TextFields[Kind]) => string } = {
  booked: ({ businessName, petNames, date, promise }) =>
    `${businessName}: booked for ${nameList(petNames)} on ${dateWords(date)}, ` +
    `${promise ? `arrival ${smsRange(promise)}` : 'time to follow'}. Reply STOP to end texts.`,
  reminder: ({ businessName, petNames, date, promise }) =>
    `${businessName}: see you ${dateWords(date)}${promise ? `, arrival ${smsRange(promise)},` : ''} ` +
    `for ${nameList(petNames)}. Can't make it? Reply here. STOP ends texts.`,
  onTheWay: ({ businessName, groomerName, petNames, arrival, link }) =>
    `${businessName}: ${groomerName} is on the way for ${nameList(petNames)}. ` +
    `Please open the door ${smsRange(arrival)}. Live: ${link}`,
};

/** One text's body. Typographic punctuation becomes plain, so that it stays in GSM-7 where it can. */
export function renderText<Kind extends TextKind>(kind: Kind, fields: TextFields[Kind]): string {
  return plainPunctuation(templates[kind](fields));
}

/** Names are typed by people: line breaks would let one forge a second message, so they become spaces. */
function plainPunctuation(text: string): string {
  return text
    .replace(/[‘’‛′]/g, "'")
    .replace(/[“”„″]/g, '"')
    .replace(/[‐‑‒–—]/g, '-')
    .replace(/…/g, '...')
    .replace(/\s+/gu, ' ')
    .trim();
}

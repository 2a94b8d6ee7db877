/** Carrier codes in words for the desk, with what to do next. Codes as the carrier documents them. */
const words: Record<number, string> = {
  20003: 'The carrier did not accept the sign-in: check TWILIO_ACCOUNT_SID and TWILIO_AUTH_TOKEN.',
  20429: 'The carrier was too busy.',
  21211: 'This is not a phone number: correct it.',
  21408: 'Texts to this country are not allowed: call instead.',
  21602: 'The text was empty.',
  21606: "The business's number cannot send texts: check it in Setup.",
  21608: 'The trial account may not text this number: verify it with the carrier.',
  21610: 'This phone ended texts with STOP: call instead.',
  21614: 'This number cannot receive texts: call instead.',
  21617: 'The text was too long.',
  30002: 'The carrier suspended the account: the operator must act.',
  30003: 'The phone could not be reached: call instead.',
  30005: 'The carrier does not know this phone: check the number.',
  30006: 'This is a landline or out of reach: call instead.',
  30007: 'A carrier filtered this text: call instead.',
  30008: 'The carrier does not say why it failed: call instead.',
  30034: 'The number is not registered for texts: the operator must act.',
};

/** The reason shown beside a text that did not arrive. */
export function carrierCodeWords(code: number | null): string {
  if (code === null) return 'The carrier refused this text.';
  return words[code] ?? `The carrier refused this text (code ${code}).`;
}

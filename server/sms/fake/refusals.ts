/** What the carrier answers instead of accepting a message. */
export interface Refusal {
  httpStatus: number;
  code: number;
  message: string;
}

/**
 * Numbers of the North American range nobody owns that always fail in one way, so that a person can
 * see each failure on the fake phones. The first two fail so at the hosted service's test sign-in
 * too (from memory); the others are ours.
 */
export const magicNumbers = {
  invalid: '+15005550001',
  notMobile: '+15005550009',
  optedOut: '+15005550004',
  throttled: '+15005552429',
  unreachable: '+15005553003',
} as const;

/** Judges a new message. Error codes as documented; wording ours. */
export function refusalFor(
  message: { to: string; from: string; body: string },
  isOptedOut: (phone: string, sender: string) => boolean,
): Refusal | null {
  const { to, from, body } = message;
  if (to === '') return bad(21604, "A 'To' phone number is required.");
  if (from === '') return bad(21603, "A 'From' phone number is required.");
  if (body === '') return bad(21602, 'A message body is required.');
  if (body.length > 1600) return bad(21617, 'The message body is longer than 1600 letters.');
  if (!/^\+[1-9]\d{6,14}$/.test(to) || to === magicNumbers.invalid)
    return bad(21211, `The 'To' number ${to} is not a valid phone number.`);
  if (to === magicNumbers.notMobile) return bad(21614, `'To' number ${to} cannot receive texts.`);
  if (to === magicNumbers.optedOut || isOptedOut(to, from))
    return bad(21610, `The recipient ${to} has ended texts from ${from}.`);
  if (to === magicNumbers.throttled) return throttled;
  return null;
}

export const throttled: Refusal = { httpStatus: 429, code: 20429, message: 'Too many requests' };

/** The error a message meets after it was accepted, or null when it will be delivered. */
export function deliveryError(to: string): number | null {
  return to === magicNumbers.unreachable ? 30003 : null;
}

function bad(code: number, message: string): Refusal {
  return { httpStatus: 400, code, message };
}

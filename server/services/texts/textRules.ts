/** What keeps a real carrier's bill and name from strangers. */
export interface TextRules {
  /** Country codes texts may go to, like +44. */
  prefixes: string[];
  /** Texts a business may send in 24 hours. */
  perDay: number;
  /** Whether a second business may be made by signing up; the first always may. */
  signUpsOpen: boolean;
}

/**
 * Reads FURLONG_TEXT_PREFIXES, FURLONG_TEXTS_PER_DAY (500 when absent) and FURLONG_SIGN_UPS ('closed'
 * when absent). Throws an Error naming the one that is missing or wrong.
 */
export function readTextRules(source: Record<string, string | undefined>): TextRules {
  const prefixes = (source.FURLONG_TEXT_PREFIXES ?? '').split(',').map((part) => part.trim());
  if (!prefixes.every((prefix) => /^\+[1-9]\d{0,6}$/.test(prefix)))
    throw new Error(
      'FURLONG_TEXT_PREFIXES must be set beside TWILIO_ACCOUNT_SID: the country codes texts may go to, like +44,+351.',
    );
  const perDay = Number(source.FURLONG_TEXTS_PER_DAY ?? 500);
  if (!Number.isInteger(perDay) || perDay < 1)
    throw new Error('FURLONG_TEXTS_PER_DAY must be a whole number, 1 or more.');
  const signUps = source.FURLONG_SIGN_UPS ?? 'closed';
  if (signUps !== 'open' && signUps !== 'closed')
    throw new Error("FURLONG_SIGN_UPS must be 'open' or 'closed'.");
  return { prefixes, perDay, signUpsOpen: signUps === 'open' };
}

let current: TextRules | null = null;

/** The rules while a real carrier is connected; null with the fake or none. */
export function currentTextRules(): TextRules | null {
  return current;
}

export function setTextRules(rules: TextRules | null): void {
  current = rules;
}

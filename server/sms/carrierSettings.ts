/** What connects Furlong to the real carrier. */
export interface CarrierSettings {
  accountSid: string;
  authToken: string;
}

/**
 * Reads TWILIO_ACCOUNT_SID and TWILIO_AUTH_TOKEN; null when neither is set. Throws an Error naming
 * the one that is missing or wrong. A real carrier also needs PUBLIC_URL: it calls back from outside.
 */
export function carrierSettings(
  source: Record<string, string | undefined>,
  publicUrl: string | null,
): CarrierSettings | null {
  const accountSid = source.TWILIO_ACCOUNT_SID ?? '';
  const authToken = source.TWILIO_AUTH_TOKEN ?? '';
  if (accountSid === '' && authToken === '') return null;
  if (!/^AC[0-9a-fA-F]{32}$/.test(accountSid))
    throw new Error('TWILIO_ACCOUNT_SID must be AC and 32 hex digits, as the carrier shows it.');
  if (authToken === '') throw new Error('TWILIO_AUTH_TOKEN must be set beside TWILIO_ACCOUNT_SID.');
  if (publicUrl === null)
    throw new Error(
      'PUBLIC_URL must be set beside TWILIO_ACCOUNT_SID: the carrier calls back there, like https://vans.example.org.',
    );
  return { accountSid, authToken };
}

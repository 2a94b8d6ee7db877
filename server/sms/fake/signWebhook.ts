import { createHmac } from 'node:crypto';

/**
 * The signature of a form webhook, as the hosted service documents it: the whole address, then each
 * parameter's name and value sorted by name, HMAC-SHA1 with the account's token, base64. Written
 * apart from the SDK, so that the SDK's check is an outside check of the fake.
 */
export function signWebhook(
  authToken: string,
  url: string,
  params: Record<string, string>,
): string {
  const signed = Object.keys(params)
    .sort()
    .reduce((text, name) => text + name + params[name], url);
  return createHmac('sha1', authToken).update(signed, 'utf8').digest('base64');
}

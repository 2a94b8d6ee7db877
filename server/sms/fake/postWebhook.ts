import { signWebhook } from './signWebhook.ts';

/** Posts a signed form; answers whether it was taken. The carrier does not try again, nor does this. */
export async function postWebhook(
  authToken: string,
  url: string,
  params: Record<string, string>,
): Promise<boolean> {
  try {
    const response = await fetch(url, {
      method: 'POST',
      headers: {
        'Content-Type': 'application/x-www-form-urlencoded',
        'X-Twilio-Signature': signWebhook(authToken, url, params),
      },
      body: new URLSearchParams(params),
      signal: AbortSignal.timeout(10_000),
    });
    await response.arrayBuffer();
    return response.ok;
  } catch {
    return false;
  }
}

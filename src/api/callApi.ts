import type { Endpoint, ResponseOf } from '#shared/api/endpoint.ts';
import { getSession } from '#shared/api/session.ts';
import { ApiError } from './ApiError.ts';
import { renewSession } from './renewSession.ts';
import { sendRequest, type CallParts } from './sendRequest.ts';
import { readSession, setSession } from './sessionStore.ts';

/**
 * Calls one endpoint of the contract and gives its parsed answer. When access has expired it is
 * renewed and the call made once more; when the sign-in has ended, the shell shows the sign-in
 * screen and comes back to the same place. Throws `ApiError`.
 */
export async function callApi<E extends Endpoint>(
  endpoint: E,
  parts: CallParts<E>,
): Promise<ResponseOf<E>> {
  const before = readSession();
  try {
    return await sendRequest(endpoint, parts, before?.csrfToken ?? null);
  } catch (error) {
    if (!before || !(error instanceof ApiError)) throw error;
    if (!(await mayTryAgain(error, before.csrfToken))) throw error;
    return await sendRequest(endpoint, parts, readSession()?.csrfToken ?? null);
  }
}

async function mayTryAgain(error: ApiError, usedToken: string): Promise<boolean> {
  if (error.code === 'signInNeeded') return (await renewSession()) !== null;
  if (error.code !== 'badOrigin') return false;
  // Another tab may have renewed access, and the token with it.
  const fresh = await sendRequest(getSession, {}, null);
  if (fresh.csrfToken === usedToken) return false;
  setSession(fresh);
  return true;
}

import { getSession, type Session } from '#shared/api/session.ts';
import { ApiError } from './ApiError.ts';
import { renewSession } from './renewSession.ts';
import { sendRequest } from './sendRequest.ts';
import { restoreSession, setSession } from './sessionStore.ts';

/** Who is signed in when the page opens; the sign-in kept on the device when there is no network. */
export async function loadSession(): Promise<Session | null> {
  try {
    const session = await sendRequest(getSession, {}, null);
    setSession(session);
    return session;
  } catch (error) {
    if (!(error instanceof ApiError)) throw error;
    if (error.status === 401) return renewOrRestore();
    return restoreSession();
  }
}

async function renewOrRestore(): Promise<Session | null> {
  try {
    return await renewSession();
  } catch {
    return restoreSession();
  }
}

import { getSession, refreshSession, type Session } from '#shared/api/session.ts';
import { ApiError } from './ApiError.ts';
import { sendRequest } from './sendRequest.ts';
import { readSession, setSession } from './sessionStore.ts';

const renewedKey = 'furlong.renewedAt';
let running: Promise<Session | null> | null = null;

/**
 * Renews access once however many calls and tabs ask for it at the same time. Gives the renewed
 * sign-in, or null when it has ended. Throws `ApiError` offline: the local data stays.
 */
export function renewSession(): Promise<Session | null> {
  running ??= inTurn(renew).finally(() => {
    running = null;
  });
  return running;
}

async function renew(askedAtMs: number): Promise<Session | null> {
  try {
    const csrfToken = readSession()?.csrfToken ?? null;
    const session = renewedSince(askedAtMs)
      ? await sendRequest(getSession, {}, null)
      : await sendRequest(refreshSession, {}, csrfToken);
    markRenewed();
    setSession(session);
    return session;
  } catch (error) {
    if (!(error instanceof ApiError) || error.status !== 401) throw error;
    setSession(null);
    return null;
  }
}

function inTurn<T>(work: (askedAtMs: number) => Promise<T>): Promise<T> {
  const askedAtMs = Date.now();
  // Locks exist only where the page is secure; a single tab is then its own queue.
  if (!('locks' in navigator) || !navigator.locks) return work(askedAtMs);
  return navigator.locks.request('furlong-session', () => work(askedAtMs)) as Promise<T>;
}

function renewedSince(ms: number): boolean {
  try {
    return Number(localStorage.getItem(renewedKey) ?? 0) > ms;
  } catch {
    return false;
  }
}

function markRenewed(): void {
  try {
    localStorage.setItem(renewedKey, String(Date.now()));
  } catch {
    // Without storage other tabs renew for themselves.
  }
}

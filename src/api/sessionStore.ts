import { useSyncExternalStore } from 'react';
import type { Session } from '#shared/api/session.ts';

const keptKey = 'furlong.session';
let current: Session | null = null;
/** How far the server's clock is ahead of this device's, milliseconds. */
let aheadMs = 0;
const listeners = new Set<() => void>();

/** The sign-in of this page, or null. */
export function readSession(): Session | null {
  return current;
}

/**
 * Sets or ends the sign-in of this page. It is kept on the device, without its token, so that a
 * phone without network still opens its run.
 */
export function setSession(session: Session | null): void {
  current = session;
  if (session) {
    aheadMs = Date.parse(session.serverNow) - Date.now();
    keep(JSON.stringify({ ...session, csrfToken: '' }));
  } else keep(null);
  for (const listener of listeners) listener();
}

/** The sign-in kept on the device; used when the server cannot be reached. */
export function restoreSession(): Session | null {
  try {
    const kept = localStorage.getItem(keptKey);
    if (!kept) return null;
    current = JSON.parse(kept) as Session;
    for (const listener of listeners) listener();
    return current;
  } catch {
    return null;
  }
}

/** Epoch milliseconds by the server's clock. */
export function serverNowMs(): number {
  return Date.now() + aheadMs;
}

export function useMaybeSession(): Session | null {
  return useSyncExternalStore(subscribe, readSession);
}

/** The sign-in; only for screens behind the shell, which asks for it first. */
export function useSession(): Session {
  const session = useMaybeSession();
  if (!session) throw new Error('This screen needs a sign-in');
  return session;
}

export function useCan(ability: string): boolean {
  return useMaybeSession()?.abilities.includes(ability) ?? false;
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

function keep(value: string | null): void {
  try {
    if (value === null) localStorage.removeItem(keptKey);
    else localStorage.setItem(keptKey, value);
  } catch {
    // Private windows may refuse storage; the sign-in then lasts as long as the page.
  }
}

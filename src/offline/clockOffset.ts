const key = 'furlong.clockOffsetMs';
const listeners = new Set<() => void>();

/** Milliseconds the server's clock is ahead of this phone's, as last measured (0 when never). */
export function clockOffsetMs(): number {
  try {
    const kept = Number(localStorage.getItem(key) ?? 0);
    return Number.isFinite(kept) ? Math.round(kept) : 0;
  } catch {
    return 0;
  }
}

/** Call with each answer that carries the server's clock; kept so that it holds offline. */
export function noteServerNow(serverNow: string, heardAtMs: number): void {
  const offset = Date.parse(serverNow) - heardAtMs;
  if (Number.isNaN(offset)) return;
  try {
    localStorage.setItem(key, String(offset));
  } catch {
    // Private windows may refuse storage; taps then carry the phone's own clock.
  }
  for (const listener of listeners) listener();
}

/** Calls back whenever the server's clock was heard: what shows the time must not wait for its next tick. */
export function onClockHeard(listener: () => void): () => void {
  listeners.add(listener);
  return () => void listeners.delete(listener);
}

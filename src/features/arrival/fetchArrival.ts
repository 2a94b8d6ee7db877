import type { Arrival } from '#shared/api/arrival.ts';
import { asArrival } from './readGivenArrival.ts';

export type ArrivalAnswer =
  | { kind: 'arrival'; arrival: Arrival }
  /** The link has ended or was never one. */
  | { kind: 'gone' }
  /** No answer this time; the next try may bring one. */
  | { kind: 'silent' };

/** Asks the server how the visit stands. Never throws. */
export async function fetchArrival(token: string, signal?: AbortSignal): Promise<ArrivalAnswer> {
  try {
    const answer = await fetch(`/api/arrival/${encodeURIComponent(token)}`, {
      headers: { Accept: 'application/json' },
      credentials: 'omit',
      ...(signal ? { signal } : {}),
    });
    if (answer.status === 410 || answer.status === 404 || answer.status === 400)
      return { kind: 'gone' };
    if (!answer.ok) return { kind: 'silent' };
    const arrival = asArrival(await answer.json());
    return arrival ? { kind: 'arrival', arrival } : { kind: 'silent' };
  } catch {
    return { kind: 'silent' };
  }
}

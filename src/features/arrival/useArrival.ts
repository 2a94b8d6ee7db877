import { useEffect, useState } from 'react';
import type { Arrival } from '#shared/api/arrival.ts';
import { fetchArrival } from './fetchArrival.ts';

export interface ArrivalNow {
  arrival: Arrival | null;
  gone: boolean;
  /** The last try brought no answer: what is shown may be old. */
  silent: boolean;
  /** When this phone heard the shown facts, epoch ms. */
  heardAtMs: number;
}

const everyMs = 20_000;

/** How the visit stands, asked every 20 s while the page is in front. */
export function useArrival(token: string, given: Arrival | null): ArrivalNow {
  const [now, setNow] = useState<ArrivalNow>(() => ({
    arrival: given,
    gone: false,
    silent: false,
    heardAtMs: Date.now(),
  }));
  useEffect(() => {
    const stop = new AbortController();
    let timer: ReturnType<typeof setTimeout> | undefined;
    const ask = async () => {
      clearTimeout(timer);
      if (document.visibilityState === 'hidden') return;
      const answer = await fetchArrival(token, stop.signal);
      if (stop.signal.aborted) return;
      if (answer.kind === 'arrival')
        setNow({ arrival: answer.arrival, gone: false, silent: false, heardAtMs: Date.now() });
      else if (answer.kind === 'gone') setNow((was) => ({ ...was, arrival: null, gone: true }));
      else setNow((was) => ({ ...was, silent: true }));
      if (answer.kind !== 'gone') timer = setTimeout(() => void ask(), everyMs);
    };
    const wake = () => void ask();
    // What the server wrote into the page is as new as the page.
    if (given) timer = setTimeout(wake, everyMs);
    else wake();
    document.addEventListener('visibilitychange', wake);
    window.addEventListener('online', wake);
    return () => {
      stop.abort();
      clearTimeout(timer);
      document.removeEventListener('visibilitychange', wake);
      window.removeEventListener('online', wake);
    };
  }, [token, given]);
  return now;
}

import { useEffect, useState } from 'react';
import { serverNowMs } from '#src/api/sessionStore.ts';
import { instantToSeconds } from '#shared/time/wallSeconds.ts';

/** The present as seconds of a day by the server's clock, every 15 s; null outside that day. */
export function useNowSeconds(dayStartUtc: string, dayLengthSeconds: number): number | null {
  const read = () => instantToSeconds(dayStartUtc, serverNowMs());
  const [seconds, setSeconds] = useState(read);
  useEffect(() => {
    const tick = () => setSeconds(instantToSeconds(dayStartUtc, serverNowMs()));
    tick();
    const timer = setInterval(tick, 15_000);
    return () => clearInterval(timer);
  }, [dayStartUtc]);
  return seconds >= 0 && seconds < dayLengthSeconds ? seconds : null;
}

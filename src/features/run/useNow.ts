import { useEffect, useState } from 'react';
import { clockOffsetMs } from '#src/offline/clockOffset.ts';

/** Epoch ms by the server's clock, renewed every `everyMs` while the page is in front. */
export function useNow(everyMs: number): number {
  const [now, setNow] = useState(() => Date.now() + clockOffsetMs());
  useEffect(() => {
    const tick = () => {
      if (document.visibilityState !== 'hidden') setNow(Date.now() + clockOffsetMs());
    };
    tick();
    const timer = setInterval(tick, everyMs);
    document.addEventListener('visibilitychange', tick);
    return () => {
      clearInterval(timer);
      document.removeEventListener('visibilitychange', tick);
    };
  }, [everyMs]);
  return now;
}

import { useEffect, useState } from 'react';
import { clockOffsetMs, onClockHeard } from '#src/offline/clockOffset.ts';

/**
 * Epoch ms by the server's clock, renewed every `everyMs` while the page is in front, and as soon as
 * that clock is heard: a phone that is hours off shows the right arrivals from its first answer on.
 */
export function useNow(everyMs: number): number {
  const [now, setNow] = useState(() => Date.now() + clockOffsetMs());
  useEffect(() => {
    const tick = () => {
      if (document.visibilityState !== 'hidden') setNow(Date.now() + clockOffsetMs());
    };
    tick();
    const timer = setInterval(tick, everyMs);
    const deaf = onClockHeard(tick);
    document.addEventListener('visibilitychange', tick);
    return () => {
      clearInterval(timer);
      deaf();
      document.removeEventListener('visibilitychange', tick);
    };
  }, [everyMs]);
  return now;
}

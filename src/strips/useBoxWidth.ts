import { useCallback, useSyncExternalStore, type RefObject } from 'react';

/** The inner width of a box in pixels, kept up to date; 0 before it is there. */
export function useBoxWidth(box: RefObject<HTMLElement | null>): number {
  const subscribe = useCallback(
    (listener: () => void) => {
      if (!box.current || typeof ResizeObserver === 'undefined') return () => {};
      const observer = new ResizeObserver(listener);
      observer.observe(box.current);
      return () => observer.disconnect();
    },
    [box],
  );
  return useSyncExternalStore(subscribe, () =>
    box.current ? box.current.clientWidth || FALLBACK_PX : 0,
  );
}

/** Where nothing is laid out (a test), the strips are drawn as on a small desk. */
const FALLBACK_PX = 1000;

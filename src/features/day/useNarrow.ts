import { useSyncExternalStore } from 'react';

/** Whether the window is as narrow as a phone. */
export function useNarrow(): boolean {
  return useSyncExternalStore(
    (listener) => {
      const query = window.matchMedia(PHONE);
      query.addEventListener('change', listener);
      return () => query.removeEventListener('change', listener);
    },
    () => window.matchMedia(PHONE).matches,
  );
}

const PHONE = '(max-width: 767px)';

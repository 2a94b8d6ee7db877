import { useEffect } from 'react';
import { useBlocker } from 'react-router-dom';
import { ConfirmDialog } from './ConfirmDialog.tsx';

/**
 * Asks before leaving a screen whose changes are not saved; also when the tab is closed. A form that
 * has just been saved goes on with `navigate(to, { state: { saved: true } })`.
 */
export function UnsavedGuard({ when }: { when: boolean }) {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) =>
      when &&
      currentLocation.pathname + currentLocation.search !==
        nextLocation.pathname + nextLocation.search &&
      !(nextLocation.state as { saved?: boolean } | null)?.saved,
  );
  useEffect(() => {
    if (!when) return;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, [when]);
  if (blocker.state !== 'blocked') return null;
  return (
    <ConfirmDialog
      title="Leave without saving?"
      confirm="Leave and lose the changes"
      keep="Stay here"
      onConfirm={() => blocker.proceed()}
      onClose={() => blocker.reset()}
    >
      What you typed here is not saved yet.
    </ConfirmDialog>
  );
}

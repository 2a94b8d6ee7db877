import { useOnline } from '#src/lib/useOnline.ts';

/** Says that the network is gone; silent while it is there. */
export function OfflineBanner() {
  const online = useOnline();
  return (
    <div role="status" aria-live="polite">
      {!online && (
        <p className="bg-ink px-4 py-2 text-center text-[15px] text-white">
          No network. What you see may be old, and nothing is saved until it is back; taps on a run
          are kept.
        </p>
      )}
    </div>
  );
}

import { useSyncExternalStore } from 'react';
import { dismissToast, readToasts, subscribeToasts } from './toast.ts';

/** Where `toast(words)` shows; once on a page. `high`: at the top, where a screen's foot acts. */
export function ToastRegion({ high = false }: { high?: boolean }) {
  const notes = useSyncExternalStore(subscribeToasts, readToasts);
  return (
    <div
      aria-live="polite"
      role="status"
      className={`pointer-events-none fixed inset-x-3 z-50 flex flex-col items-center gap-2 ${
        high ? 'top-16' : 'bottom-20 md:bottom-6'
      }`}
    >
      {notes.map((note) => (
        <div
          key={note.id}
          className="pointer-events-auto flex max-w-xl items-center gap-3 rounded-card bg-ink py-2 pr-2 pl-4 text-white shadow-lg"
        >
          <span>
            <span aria-hidden="true">{note.tone === 'ok' ? '✓ ' : '▲ '}</span>
            {note.words}
          </span>
          <button
            type="button"
            aria-label="Hide this message"
            onClick={() => dismissToast(note.id)}
            className="grid size-11 shrink-0 place-items-center rounded-full hover:bg-white/15 md:size-9"
          >
            <span aria-hidden="true">✕</span>
          </button>
        </div>
      ))}
    </div>
  );
}

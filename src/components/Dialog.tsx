import { useEffect, useId, useRef, type ReactNode } from 'react';
import { IconButton } from './IconButton.tsx';

/**
 * A modal dialog: the page behind is out of reach, Escape and the cross call `onClose`, and focus
 * goes back to where it was. Mount it to open it. `actions` stay in sight while the rest scrolls.
 */
export function Dialog({
  title,
  onClose,
  children,
  actions,
  wide = false,
}: {
  title: string;
  onClose: () => void;
  children: ReactNode;
  actions?: ReactNode;
  wide?: boolean;
}) {
  const titleId = useId();
  const ref = useRef<HTMLDialogElement>(null);
  useEffect(() => {
    const dialog = ref.current;
    if (!dialog) return;
    if (!dialog.open) dialog.showModal();
    return () => dialog.close();
  }, []);
  return (
    <dialog
      ref={ref}
      aria-labelledby={titleId}
      onCancel={(event) => {
        // React decides when it closes; a native close would leave an empty dialog mounted.
        event.preventDefault();
        onClose();
      }}
      className="card max-h-[min(92dvh,54rem)] max-w-none overflow-hidden p-0 text-ink"
      style={{ width: `min(calc(100vw - 24px), ${wide ? '46rem' : '32rem'})` }}
    >
      <div className="flex max-h-[min(92dvh,54rem)] flex-col">
        <div className="flex items-start justify-between gap-4 px-5 pt-4 pb-2">
          <h2 id={titleId} className="pt-1.5 text-xl leading-tight tracking-tight">
            {title}
          </h2>
          <IconButton label="Close" onClick={onClose} className="-mr-1">
            <span aria-hidden="true">✕</span>
          </IconButton>
        </div>
        <div className="min-h-0 overflow-y-auto px-5 pt-1 pb-5">{children}</div>
        {actions && (
          <div className="flex flex-wrap gap-2.5 border-t border-linen px-5 py-3.5">{actions}</div>
        )}
      </div>
    </dialog>
  );
}

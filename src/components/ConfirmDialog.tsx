import type { ReactNode } from 'react';
import { Button } from './Button.tsx';
import { Dialog } from './Dialog.tsx';
import { ErrorNote } from './ErrorNote.tsx';

/** Asks before something that cannot be taken back. Both buttons say what happens. */
export function ConfirmDialog({
  title,
  children,
  confirm,
  keep,
  busy = false,
  error,
  onConfirm,
  onClose,
}: {
  title: string;
  children: ReactNode;
  confirm: string;
  keep: string;
  busy?: boolean;
  error?: unknown;
  onConfirm: () => void;
  onClose: () => void;
}) {
  return (
    <Dialog
      title={title}
      onClose={onClose}
      actions={
        <>
          <Button kind="danger" busy={busy} onClick={onConfirm}>
            {confirm}
          </Button>
          <Button onClick={onClose}>{keep}</Button>
        </>
      }
    >
      <div className="text-slate">{children}</div>
      {error ? <ErrorNote error={error} className="mt-3" /> : null}
    </Dialog>
  );
}

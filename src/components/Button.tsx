import type { ComponentProps } from 'react';
import { buttonLook, type ButtonKind, type ButtonSize } from './buttonLook.ts';

/**
 * A button says what happens. While `busy` it keeps its place, cannot be pressed again and says
 * `busyWords` when given.
 */
export function Button({
  kind,
  size,
  busy = false,
  busyWords,
  className = '',
  children,
  onClick,
  type = 'button',
  ...rest
}: ComponentProps<'button'> & {
  kind?: ButtonKind;
  size?: ButtonSize;
  busy?: boolean;
  busyWords?: string;
}) {
  return (
    <button
      {...rest}
      // A truly disabled button would lose the focus of the person who pressed it.
      aria-disabled={busy || undefined}
      type={busy && type === 'submit' ? 'button' : type}
      onClick={busy ? undefined : onClick}
      className={`${buttonLook(kind, size)} ${className}`}
    >
      {busy && (
        <span
          aria-hidden="true"
          className="size-4 animate-spin rounded-full border-2 border-current border-r-transparent"
        />
      )}
      {busy && busyWords ? busyWords : children}
    </button>
  );
}

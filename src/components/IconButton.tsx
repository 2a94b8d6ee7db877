import type { ComponentProps } from 'react';

/** A round button with a picture; `label` is what it does, read aloud and shown on hover. */
export function IconButton({
  label,
  className = '',
  type = 'button',
  ...rest
}: ComponentProps<'button'> & { label: string }) {
  return (
    <button
      {...rest}
      type={type}
      aria-label={label}
      title={label}
      className={`inline-grid size-11 shrink-0 place-items-center rounded-full border border-fawn bg-white text-ink transition-colors hover:bg-linen disabled:opacity-50 md:size-9.5 ${className}`}
    />
  );
}

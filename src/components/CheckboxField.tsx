import { useId, type ComponentProps, type ReactNode } from 'react';
import { FieldError } from './Field.tsx';

/** Yes or no, with the words beside the box as part of the target. */
export function CheckboxField({
  label,
  hint,
  error,
  className = '',
  ...rest
}: Omit<ComponentProps<'input'>, 'className' | 'type'> & {
  label: ReactNode;
  hint?: ReactNode;
  error?: string | undefined;
  className?: string;
}) {
  const id = useId();
  const notes = [hint && `${id}-hint`, error && `${id}-error`].filter(Boolean).join(' ');
  return (
    <div className={className}>
      <label className="flex min-h-11 cursor-pointer items-start gap-3 py-2 md:min-h-9 md:py-1.5">
        <input
          {...rest}
          id={id}
          type="checkbox"
          aria-describedby={notes || undefined}
          aria-invalid={error ? true : undefined}
          className="mt-0.5 size-5 shrink-0 accent-collar"
        />
        <span className="text-[15px] leading-snug">
          {label}
          {hint && (
            <span id={`${id}-hint`} className="block text-sm text-slate">
              {hint}
            </span>
          )}
        </span>
      </label>
      {error && <FieldError id={`${id}-error`} words={error} />}
    </div>
  );
}

import { useId, type ReactNode } from 'react';

export interface FieldAbout {
  label: string;
  hint?: ReactNode;
  /** What is wrong and what would be right; shown below and read with the field. */
  error?: string | undefined;
  required?: boolean;
  className?: string;
}

export interface FieldWiring {
  id: string;
  'aria-describedby': string | undefined;
  'aria-invalid': true | undefined;
  'aria-required': true | undefined;
}

/** Label above, entry, hint and error below, tied together for screen readers. */
export function Field({
  label,
  hint,
  error,
  required,
  className = '',
  children,
}: FieldAbout & { children: (wiring: FieldWiring) => ReactNode }) {
  const id = useId();
  // What is wrong takes the hint's place: it says what would be right anyway.
  const notes = error ? `${id}-error` : hint ? `${id}-hint` : undefined;
  return (
    <div className={className}>
      <label htmlFor={id} className="mb-1 block text-[15px] font-medium">
        {label}
        {required === false && <span className="font-normal text-slate"> (if you like)</span>}
      </label>
      {children({
        id,
        'aria-describedby': notes,
        'aria-invalid': error ? true : undefined,
        'aria-required': required ? true : undefined,
      })}
      {error && <FieldError id={`${id}-error`} words={error} />}
      {hint && !error && (
        <p id={`${id}-hint`} className="mt-1 text-sm text-slate">
          {hint}
        </p>
      )}
    </div>
  );
}

/** The line under an entry that says what would be right. */
export function FieldError({ id, words }: { id?: string; words: string }) {
  return (
    <p id={id} className="mt-1 text-sm font-medium text-rosette">
      <span aria-hidden="true">▲ </span>
      {words}
    </p>
  );
}

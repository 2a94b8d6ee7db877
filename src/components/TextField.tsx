import type { ComponentProps, ReactNode } from 'react';
import { Field, type FieldAbout } from './Field.tsx';

/** One line of text. `unit` stands behind the number; spread `register('path')` into it. */
export function TextField({
  label,
  hint,
  error,
  required,
  className,
  unit,
  ...rest
}: Omit<ComponentProps<'input'>, 'className'> & FieldAbout & { unit?: ReactNode }) {
  return (
    <Field {...{ label, hint, error, required, className }}>
      {(wiring) => (
        <div className="relative">
          <input
            type="text"
            {...rest}
            {...wiring}
            className="entry"
            style={unit ? { paddingRight: `${String(unit).length * 0.6 + 1.5}em` } : undefined}
          />
          {unit && (
            <span className="pointer-events-none absolute inset-y-0 right-3 grid place-items-center text-slate">
              {unit}
            </span>
          )}
        </div>
      )}
    </Field>
  );
}

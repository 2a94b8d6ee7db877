import type { ComponentProps } from 'react';
import { Field, type FieldAbout } from './Field.tsx';

/** Several lines of text. */
export function TextArea({
  label,
  hint,
  error,
  required,
  className,
  rows = 3,
  ...rest
}: Omit<ComponentProps<'textarea'>, 'className'> & FieldAbout) {
  return (
    <Field {...{ label, hint, error, required, className }}>
      {(wiring) => <textarea {...rest} {...wiring} rows={rows} className="entry" />}
    </Field>
  );
}

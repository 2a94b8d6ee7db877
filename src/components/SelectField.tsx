import type { ComponentProps } from 'react';
import { Field, type FieldAbout } from './Field.tsx';

export interface Choice {
  value: string;
  label: string;
}

/** One of a short list. `empty` is the line shown while nothing is chosen. */
export function SelectField({
  label,
  hint,
  error,
  required,
  className,
  choices,
  empty,
  ...rest
}: Omit<ComponentProps<'select'>, 'className'> &
  FieldAbout & { choices: readonly Choice[]; empty?: string }) {
  return (
    <Field {...{ label, hint, error, required, className }}>
      {(wiring) => (
        <select {...rest} {...wiring} className="entry">
          {empty !== undefined && <option value="">{empty}</option>}
          {choices.map((choice) => (
            <option key={choice.value} value={choice.value}>
              {choice.label}
            </option>
          ))}
        </select>
      )}
    </Field>
  );
}

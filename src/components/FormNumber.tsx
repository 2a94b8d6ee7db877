import type { ReactNode } from 'react';
import { useController, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import type { FieldAbout } from './Field.tsx';
import { NumberField } from './NumberField.tsx';

/**
 * A number of a form, by its path. `shownAs` turns the stored number into the one people read (grams
 * into pounds) and back.
 */
export function FormNumber<Values extends FieldValues, Context, Output>({
  control,
  name,
  shownAs,
  ...about
}: FieldAbout & {
  control: Control<Values, Context, Output>;
  name: FieldPath<Values>;
  unit?: ReactNode;
  decimals?: number;
  disabled?: boolean;
  shownAs?: { show: (stored: number) => number; store: (shown: number) => number };
}) {
  const { field, fieldState } = useController({ control, name });
  const stored = field.value as number | null;
  return (
    <NumberField
      {...about}
      name={name}
      error={about.error ?? fieldState.error?.message}
      value={stored !== null && shownAs && !Number.isNaN(stored) ? shownAs.show(stored) : stored}
      onChange={(shown) =>
        field.onChange(
          shown !== null && shownAs && !Number.isNaN(shown) ? shownAs.store(shown) : shown,
        )
      }
      onBlur={field.onBlur}
    />
  );
}

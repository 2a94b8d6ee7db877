import { useController, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import type { FieldAbout } from './Field.tsx';
import { TimeField } from './TimeField.tsx';

/** A time of day of a form, by its path; minutes after midnight. */
export function FormTime<Values extends FieldValues, Context, Output>({
  control,
  name,
  ...about
}: FieldAbout & {
  control: Control<Values, Context, Output>;
  name: FieldPath<Values>;
  disabled?: boolean;
}) {
  const { field, fieldState } = useController({ control, name });
  return (
    <TimeField
      {...about}
      error={about.error ?? fieldState.error?.message}
      value={field.value as number | null}
      onChange={field.onChange}
      onBlur={field.onBlur}
    />
  );
}

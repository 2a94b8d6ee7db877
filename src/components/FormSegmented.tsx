import { useController, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { Segmented } from './Segmented.tsx';
import type { Choice } from './SelectField.tsx';

/** One of a few, of a form, by its path. */
export function FormSegmented<Values extends FieldValues, Context, Output>({
  control,
  name,
  onPick,
  ...about
}: {
  control: Control<Values, Context, Output>;
  name: FieldPath<Values>;
  label: string;
  choices: readonly Choice[];
  hint?: string;
  disabled?: boolean;
  className?: string;
  /** After the value is set. */
  onPick?: (value: string) => void;
}) {
  const { field } = useController({ control, name });
  return (
    <Segmented
      {...about}
      value={String(field.value)}
      onChange={(value) => {
        field.onChange(value);
        onPick?.(value);
      }}
    />
  );
}

import { useController, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { Segmented } from '#src/components/Segmented.tsx';

/** A level 0, 1, 2 … of a form, chosen by its word. */
export function FormLevel<Values extends FieldValues, Context, Output>({
  control,
  name,
  label,
  choices,
}: {
  control: Control<Values, Context, Output>;
  name: FieldPath<Values>;
  label: string;
  choices: readonly { value: string; label: string }[];
}) {
  const { field } = useController({ control, name });
  return (
    <Segmented
      label={label}
      choices={choices}
      value={String(field.value)}
      onChange={(value) => field.onChange(Number(value))}
    />
  );
}

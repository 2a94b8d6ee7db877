import { useController, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { CheckboxField } from './CheckboxField.tsx';
import { FieldError } from './Field.tsx';

/** Any of a list, of a form, by its path; the value is the array of what is ticked. */
export function FormChecks<Values extends FieldValues, Context, Output>({
  control,
  name,
  legend,
  choices,
  hint,
  disabled,
  className = '',
  listClassName = '',
}: {
  control: Control<Values, Context, Output>;
  name: FieldPath<Values>;
  legend: string;
  choices: readonly { value: string; label: string; hint?: string }[];
  hint?: string;
  disabled?: boolean;
  className?: string;
  listClassName?: string;
}) {
  const { field, fieldState } = useController({ control, name });
  const ticked = field.value as string[];
  const message = fieldState.error?.message ?? fieldState.error?.root?.message;
  return (
    <fieldset className={className} disabled={disabled}>
      <legend className="mb-0.5 text-[15px] font-medium">{legend}</legend>
      {hint && <p className="text-sm text-slate">{hint}</p>}
      <div className={listClassName}>
        {choices.map((choice) => (
          <CheckboxField
            key={choice.value}
            label={choice.label}
            hint={choice.hint}
            checked={ticked.includes(choice.value)}
            onChange={(event) =>
              field.onChange(
                event.target.checked
                  ? [...ticked, choice.value]
                  : ticked.filter((one) => one !== choice.value),
              )
            }
            onBlur={field.onBlur}
          />
        ))}
      </div>
      {message && <FieldError words={message} />}
    </fieldset>
  );
}

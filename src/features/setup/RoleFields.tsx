import type { Control, FieldPath, FieldValues, UseFormRegisterReturn } from 'react-hook-form';
import type { Groomer } from '#shared/api/groomers.ts';
import { FormChecks } from '#src/components/FormChecks.tsx';
import { SelectField } from '#src/components/SelectField.tsx';
import { roleChoices } from './roleChoices.ts';

/** Roles, and which groomer's runs are theirs when they work in a van. */
export function RoleFields<Values extends FieldValues, Context, Output>({
  control,
  isGroomer,
  groomers,
  groomerField,
}: {
  control: Control<Values, Context, Output>;
  isGroomer: boolean;
  groomers: readonly Groomer[];
  groomerField: UseFormRegisterReturn;
}) {
  return (
    <>
      <FormChecks
        control={control}
        name={'roles' as FieldPath<Values>}
        legend="Roles"
        hint="One person may hold several."
        choices={roleChoices}
      />
      {isGroomer && (
        <SelectField
          label="Whose runs are theirs"
          empty="No groomer yet"
          hint="Add them under Groomers first when the name is missing."
          choices={groomers.map((groomer) => ({ value: groomer.id, label: groomer.name }))}
          {...groomerField}
        />
      )}
    </>
  );
}

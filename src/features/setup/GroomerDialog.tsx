import { createGroomer, skill, type Groomer } from '#shared/api/groomers.ts';
import { useCreateGroomer, useUpdateGroomer } from '#src/api/groomers.ts';
import { Button } from '#src/components/Button.tsx';
import { CheckboxField } from '#src/components/CheckboxField.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { FormChecks } from '#src/components/FormChecks.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { toast } from '#src/components/toast.ts';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';
import { z } from 'zod';

const schema = createGroomer.body.extend({ active: z.boolean() });
type Skill = z.infer<typeof skill>;

const skillHints: Record<Skill, string> = {
  cats: 'May be given cats.',
  'hand-stripping': 'Strips wire coats by hand.',
  large: 'Handles large dogs alone.',
  'two-person lift': 'Has a second pair of hands for the lift.',
};

export function GroomerDialog({
  groomer,
  onClose,
}: {
  groomer: Groomer | null;
  onClose: () => void;
}) {
  const create = useCreateGroomer();
  const update = useUpdateGroomer();
  const form = useZodForm(schema, {
    name: groomer?.name ?? '',
    skills: (groomer?.skills ?? []) as Skill[],
    active: groomer?.active ?? true,
  });
  const submit = useSubmit(form, async ({ active, ...fields }) => {
    if (groomer)
      await update.mutateAsync({ params: { groomerId: groomer.id }, body: { ...fields, active } });
    else await create.mutateAsync({ body: fields });
    toast(`${fields.name} is saved.`);
    onClose();
  });
  return (
    <Dialog title={groomer ? groomer.name : 'Add a groomer'} onClose={onClose}>
      <form onSubmit={submit.onSubmit} noValidate className="grid gap-4">
        <TextField
          label="Name"
          {...form.register('name')}
          error={form.formState.errors.name?.message}
        />
        <FormChecks
          control={form.control}
          name="skills"
          legend="Skills"
          hint="A visit that needs a skill is only planned with a groomer who has it."
          choices={skill.options.map((value) => ({
            value,
            label: value,
            hint: skillHints[value],
          }))}
        />
        {groomer && (
          <CheckboxField
            label="Works at present"
            hint="Without this tick no new shift can be given."
            {...form.register('active')}
          />
        )}
        <FormErrors error={submit.failure} fields={submit.strayFields} />
        <div className="flex flex-wrap gap-2.5">
          <Button type="submit" kind="go" busy={submit.busy} busyWords="Saving">
            {groomer ? 'Save the groomer' : 'Add the groomer'}
          </Button>
          <Button onClick={onClose}>Leave it</Button>
        </div>
      </form>
    </Dialog>
  );
}

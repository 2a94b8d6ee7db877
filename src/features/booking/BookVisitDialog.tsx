import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import type { Household } from '#shared/api/households.ts';
import type { Pet } from '#shared/api/pets.ts';
import { createVisit } from '#shared/api/visits.ts';
import { addDays } from '#shared/time/localDate.ts';
import { groomerQueries } from '#src/api/groomers.ts';
import { useCreateVisit } from '#src/api/visits.ts';
import { Button } from '#src/components/Button.tsx';
import { CheckboxField } from '#src/components/CheckboxField.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { FormChecks } from '#src/components/FormChecks.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { FormTime } from '#src/components/FormTime.tsx';
import { Segmented } from '#src/components/Segmented.tsx';
import { SelectField } from '#src/components/SelectField.tsx';
import { TextArea } from '#src/components/TextArea.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { toast } from '#src/components/toast.ts';
import { emptyToNull } from '#src/lib/emptyToNull.ts';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';
import { writeDate } from '#src/lib/words.ts';
import { breedWords } from '#src/strips/petWords.ts';

type Binds = 'arrival' | 'stay';

/** Books a visit; it lands in the day's "not placed" and the day opens when asked. */
export function BookVisitDialog({
  household,
  pets,
  today,
  date: askedDate,
  onClose,
}: {
  household: Household;
  pets: readonly Pet[];
  today: string;
  /** The day asked for; null: when the pets are due. */
  date: string | null;
  onClose: () => void;
}) {
  const navigate = useNavigate();
  const create = useCreateVisit();
  const groomers = useQuery(groomerQueries.list());
  const [openDay, setOpenDay] = useState(true);
  const form = useZodForm(createVisit.body, {
    householdId: household.id,
    date: askedDate ?? dueDate(pets, today),
    petIds: pets.map((pet) => pet.id),
    promise: { startMinutes: 9 * 60, endMinutes: 11 * 60 },
    allowed: [],
    preferredGroomerId: null,
    note: '',
  });
  const submit = useSubmit(form, async (body) => {
    await create.mutateAsync({ body });
    toast(`Booked for ${writeDate(body.date)}; it waits under not placed.`);
    onClose();
    if (openDay) void navigate(`/day/${body.date}`);
  });
  const { errors } = form.formState;
  const [promise, allowed = [], date] = form.watch(['promise', 'allowed', 'date']);
  const setAllowed = (next: { startMinutes: number; endMinutes: number; binds: Binds }[]) =>
    form.setValue('allowed', next, { shouldDirty: true });
  return (
    <Dialog title={`Book a visit at ${household.name}`} onClose={onClose} wide>
      <form onSubmit={submit.onSubmit} noValidate className="grid gap-4">
        <div className="grid gap-4 md:grid-cols-2">
          <TextField
            label="Day"
            type="date"
            min={today}
            {...form.register('date')}
            hint={/^\d{4}-\d\d-\d\d$/.test(date) ? writeDate(date) : undefined}
            error={errors.date?.message}
          />
          <SelectField
            label="Groomer they like"
            required={false}
            empty="Any"
            choices={(groomers.data ?? [])
              .filter((groomer) => groomer.active)
              .map((groomer) => ({ value: groomer.id, label: groomer.name }))}
            {...form.register('preferredGroomerId', { setValueAs: emptyToNull })}
            error={errors.preferredGroomerId?.message}
          />
        </div>
        <FormChecks
          control={form.control}
          name="petIds"
          legend="Pets"
          choices={pets.map((pet) => ({
            value: pet.id,
            label: pet.name,
            hint: `${breedWords(pet.breedName)} · ${pet.styleName}`,
          }))}
          listClassName="flex flex-wrap gap-x-8"
        />
        <div>
          <CheckboxField
            label="Promise an arrival window"
            hint="What the household is told. Planning keeps it before anything else."
            checked={promise !== null}
            onChange={(event) =>
              form.setValue(
                'promise',
                event.target.checked ? { startMinutes: 9 * 60, endMinutes: 11 * 60 } : null,
                { shouldDirty: true },
              )
            }
          />
          {promise && (
            <div className="mt-1 grid max-w-xs grid-cols-2 gap-4">
              <FormTime control={form.control} name="promise.startMinutes" label="From" />
              <FormTime control={form.control} name="promise.endMinutes" label="Until" />
            </div>
          )}
        </div>
        <div>
          <CheckboxField
            label="Only within certain hours"
            hint="Hard: owner leaves at 12, parking hours. No plan may break it."
            checked={allowed.length > 0}
            onChange={(event) =>
              setAllowed(
                event.target.checked
                  ? [{ startMinutes: 8 * 60, endMinutes: 12 * 60, binds: 'stay' }]
                  : [],
              )
            }
          />
          {allowed[0] && (
            <div className="mt-1 flex flex-wrap items-start gap-4">
              <FormTime
                control={form.control}
                name="allowed.0.startMinutes"
                label="From"
                className="w-36"
              />
              <FormTime
                control={form.control}
                name="allowed.0.endMinutes"
                label="Until"
                className="w-36"
              />
              <Segmented<Binds>
                label="This binds"
                choices={[
                  { value: 'arrival', label: 'the arrival' },
                  { value: 'stay', label: 'the whole stay' },
                ]}
                value={allowed[0].binds}
                onChange={(binds) => setAllowed([{ ...allowed[0]!, binds }])}
              />
            </div>
          )}
        </div>
        <TextArea
          label="Note for this visit"
          required={false}
          rows={2}
          {...form.register('note')}
          error={errors.note?.message}
        />
        <CheckboxField
          label="Then open the day to place it"
          checked={openDay}
          onChange={(event) => setOpenDay(event.target.checked)}
        />
        <FormErrors error={submit.failure} fields={submit.strayFields} />
        <div className="flex flex-wrap gap-2.5">
          <Button type="submit" kind="go" busy={submit.busy} busyWords="Booking">
            Book the visit
          </Button>
          <Button onClick={onClose}>Leave it</Button>
        </div>
      </form>
    </Dialog>
  );
}

/** The day the most overdue pet comes due, tomorrow at the earliest. */
function dueDate(pets: readonly Pet[], today: string): string {
  const tomorrow = addDays(today, 1);
  const due = pets
    .filter((pet) => pet.lastVisitDate !== null)
    .map((pet) => addDays(pet.lastVisitDate!, pet.intervalWeeks * 7))
    .sort()[0];
  return due && due > tomorrow ? due : tomorrow;
}

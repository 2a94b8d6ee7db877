import { useState } from 'react';
import { z } from 'zod';
import { setShift, type Groomer, type Shift } from '#shared/api/groomers.ts';
import { useRemoveShift, useSetShift } from '#src/api/groomers.ts';
import { Button } from '#src/components/Button.tsx';
import { CheckboxField } from '#src/components/CheckboxField.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { FormNumber } from '#src/components/FormNumber.tsx';
import { FormTime } from '#src/components/FormTime.tsx';
import { SelectField } from '#src/components/SelectField.tsx';
import { toast } from '#src/components/toast.ts';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';
import { writeCount, writeDate } from '#src/lib/words.ts';
import { mealStart, shiftStart } from './shiftStart.ts';

const schema = setShift.body.safeExtend({ hasMeal: z.boolean() });

/** One van's shift on a date, and on other days of the same week when they are ticked. */
export function ShiftDialog({
  date,
  vanId,
  vanName,
  shift,
  dates,
  groomers,
  weekShifts,
  onClose,
}: {
  date: string;
  vanId: string;
  vanName: string;
  shift: Shift | null;
  dates: readonly string[];
  groomers: readonly Groomer[];
  weekShifts: readonly Shift[];
  onClose: () => void;
}) {
  const save = useSetShift();
  const remove = useRemoveShift();
  const [also, setAlso] = useState<readonly string[]>([]);
  const form = useZodForm(schema, {
    date,
    vanId,
    ...shiftStart(
      shift,
      weekShifts,
      vanId,
      groomers.filter(({ active }) => active).map(({ id }) => id),
    ),
    meal: shift?.meal ?? mealStart,
    hasMeal: shift ? shift.meal !== null : true,
  });
  const hasMeal = form.watch('hasMeal');
  const submit = useSubmit(form, async ({ hasMeal: withMeal, meal, ...fields }) => {
    const days = [date, ...also].sort();
    for (const day of days)
      await save.mutateAsync({ body: { ...fields, date: day, meal: withMeal ? meal : null } });
    toast(`${vanName}: ${writeCount(days.length, 'shift')} saved.`);
    onClose();
  });
  const { errors } = form.formState;
  const choices = groomers
    .filter((groomer) => groomer.active || groomer.id === shift?.groomerId)
    .map((groomer) => ({ value: groomer.id, label: groomer.name }));
  const taken = (day: string) => weekShifts.some((one) => one.date === day && one.vanId === vanId);
  return (
    <Dialog title={`${vanName}, ${writeDate(date)}`} onClose={onClose}>
      <form onSubmit={submit.onSubmit} noValidate className="grid gap-4">
        <SelectField
          label="Groomer"
          empty="Choose a groomer"
          choices={choices}
          {...form.register('groomerId')}
          error={
            errors.groomerId &&
            (errors.groomerId.type === 'server' ? errors.groomerId.message : 'Choose who drives.')
          }
        />
        <div className="grid grid-cols-2 gap-4 md:grid-cols-3">
          <FormTime control={form.control} name="startMinutes" label="Starts" />
          <FormTime control={form.control} name="endMinutes" label="Ends" />
          <FormNumber
            control={form.control}
            name="mostOvertimeMinutes"
            label="Most overtime"
            unit="min"
          />
        </div>
        <div>
          <CheckboxField label="A meal break" {...form.register('hasMeal')} />
          {hasMeal && (
            <div className="mt-1 grid grid-cols-2 gap-4">
              <FormNumber
                control={form.control}
                name="meal.lengthMinutes"
                label="It lasts"
                unit="min"
              />
              <FormNumber
                control={form.control}
                name="meal.dueAfterMinutes"
                label="Due after"
                unit="hours"
                decimals={2}
                hint="Shorter days go without."
                shownAs={{ show: (minutes) => minutes / 60, store: (h) => Math.round(h * 60) }}
              />
              <FormTime control={form.control} name="meal.earliestMinutes" label="Begins from" />
              <FormTime control={form.control} name="meal.latestMinutes" label="Begins until" />
            </div>
          )}
        </div>
        <fieldset>
          <legend className="mb-1 text-[15px] font-medium">The same on</legend>
          <div className="flex flex-wrap gap-x-5">
            {dates
              .filter((day) => day !== date)
              .map((day) => (
                <CheckboxField
                  key={day}
                  label={writeDate(day, 'short')}
                  hint={taken(day) ? 'replaces a shift' : undefined}
                  checked={also.includes(day)}
                  onChange={(event) =>
                    setAlso(
                      event.target.checked ? [...also, day] : also.filter((one) => one !== day),
                    )
                  }
                />
              ))}
          </div>
        </fieldset>
        <FormErrors error={submit.failure ?? remove.error} fields={submit.strayFields} />
        <div className="flex flex-wrap gap-2.5">
          <Button type="submit" kind="go" busy={submit.busy} busyWords="Saving">
            {also.length > 0 ? `Save ${also.length + 1} shifts` : 'Save the shift'}
          </Button>
          {shift && (
            <Button
              kind="danger"
              busy={remove.isPending}
              onClick={() =>
                remove.mutate(
                  { params: { shiftId: shift.id } },
                  {
                    onSuccess: () => {
                      toast('The shift is removed; its visits wait under not placed.');
                      onClose();
                    },
                  },
                )
              }
            >
              Remove the shift
            </Button>
          )}
          <Button onClick={onClose}>Leave it</Button>
        </div>
      </form>
    </Dialog>
  );
}

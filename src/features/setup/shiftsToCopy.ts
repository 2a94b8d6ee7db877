import type { Shift } from '#shared/api/groomers.ts';
import { addDays } from '#shared/time/localDate.ts';

/**
 * Last week's shifts moved on by seven days, without those whose van or groomer already has a shift
 * that day.
 */
export function shiftsToCopy(
  weekBefore: readonly Shift[],
  present: readonly Shift[],
): Omit<Shift, 'id'>[] {
  return weekBefore
    .map((shift) => {
      const { id: _, ...fields } = shift;
      return { ...fields, date: addDays(shift.date, 7) };
    })
    .filter(
      (shift) =>
        !present.some(
          (one) =>
            one.date === shift.date &&
            (one.vanId === shift.vanId || one.groomerId === shift.groomerId),
        ),
    );
}

import { addDays } from '#shared/time/localDate.ts';
import { localDateAt } from '#shared/time/dayStart.ts';

/** The date after today where the test businesses are. */
export function tomorrow(): string {
  return addDays(localDateAt(Date.now(), 'Atlantic/Azores'), 1);
}

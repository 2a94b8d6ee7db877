import type { Role } from '#shared/api/values.ts';

/** What each role is for, in the words of the form. */
export const roleChoices: { value: Role; label: string; hint: string }[] = [
  { value: 'operator', label: 'Operator', hint: 'Everything: set-up, people, days, review.' },
  { value: 'dispatcher', label: 'Dispatcher', hint: 'Plans and sends days, keeps households.' },
  { value: 'groomer', label: 'Groomer', hint: 'Works their own runs on the phone.' },
];

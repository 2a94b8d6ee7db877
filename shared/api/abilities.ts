import type { Role } from './values.ts';

/**
 * What a person may do, by role. `handle` takes one of these words on the server and screens hide
 * by the same words. 'public' and 'signedIn' are said aloud, never a default.
 */
export const abilityRoles = {
  'business.edit': ['operator'],
  'members.edit': ['operator'],
  'setup.edit': ['operator'],
  'setup.read': ['operator', 'dispatcher'],
  'shifts.edit': ['operator', 'dispatcher'],
  'households.read': ['operator', 'dispatcher'],
  'households.edit': ['operator', 'dispatcher'],
  'households.openGate': ['operator', 'dispatcher', 'groomer'],
  'visits.edit': ['operator', 'dispatcher'],
  'visits.move': ['operator', 'dispatcher'],
  'days.read': ['operator', 'dispatcher'],
  'days.send': ['operator', 'dispatcher'],
  'runs.work': ['operator', 'dispatcher', 'groomer'],
  'texts.read': ['operator', 'dispatcher'],
  'review.read': ['operator'],
} as const satisfies Record<string, readonly Role[]>;

export type NamedAbility = keyof typeof abilityRoles;
export type Ability = NamedAbility | 'public' | 'signedIn';

/** The abilities a set of roles adds up to, in table order. */
export function abilitiesOf(roles: readonly Role[]): NamedAbility[] {
  return (Object.keys(abilityRoles) as NamedAbility[]).filter((ability) =>
    (abilityRoles[ability] as readonly Role[]).some((role) => roles.includes(role)),
  );
}

import { expect, test } from 'vitest';
import { abilitiesOf } from '#shared/api/abilities.ts';
import type { Role } from '#shared/api/values.ts';
import { mayOpen, navItems } from './navItems.ts';

const words = (roles: Role[], worksInVan: boolean) =>
  navItems(abilitiesOf(roles), worksInVan).map((item) => item.words);

test('each person sees the screens they use', () => {
  expect(words(['groomer'], true)).toEqual(['Run']);
  expect(words(['dispatcher'], false)).toEqual(['Day', 'Households', 'Forecast', 'Texts', 'Setup']);
  expect(words(['operator'], false)).toEqual([
    'Day',
    'Households',
    'Forecast',
    'Texts',
    'Review',
    'Setup',
  ]);
});

test('a one-van owner has it all, the run included', () => {
  expect(words(['operator', 'dispatcher', 'groomer'], true)).toEqual([
    'Day',
    'Run',
    'Households',
    'Forecast',
    'Texts',
    'Review',
    'Setup',
  ]);
});

test('an address opens only for those whose navigation could lead there', () => {
  expect(mayOpen('/households/new', abilitiesOf(['groomer']))).toBe(false);
  expect(mayOpen('/run/0190a000', abilitiesOf(['groomer']))).toBe(true);
  expect(mayOpen('/review', abilitiesOf(['dispatcher']))).toBe(false);
  expect(mayOpen('/', abilitiesOf(['groomer']))).toBe(true);
  expect(mayOpen('/runner', abilitiesOf(['groomer']))).toBe(true);
});

import { expect, test } from 'vitest';
import { abilitiesOf } from '#shared/api/abilities.ts';
import type { Role } from '#shared/api/values.ts';
import { navItems } from './navItems.ts';

const words = (roles: Role[], worksInVan: boolean) =>
  navItems(abilitiesOf(roles), worksInVan).map((item) => item.words);

test('each person sees the screens they use', () => {
  expect(words(['groomer'], true)).toEqual(['Run']);
  expect(words(['dispatcher'], false)).toEqual(['Day', 'Households', 'Texts', 'Setup']);
  expect(words(['operator'], false)).toEqual(['Day', 'Households', 'Texts', 'Review', 'Setup']);
});

test('a one-van owner has it all, the run included', () => {
  expect(words(['operator', 'dispatcher', 'groomer'], true)).toEqual([
    'Day',
    'Run',
    'Households',
    'Texts',
    'Review',
    'Setup',
  ]);
});

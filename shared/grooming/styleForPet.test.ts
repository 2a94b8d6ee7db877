import { expect, it } from 'vitest';
import { styleForPet } from './styleForPet.ts';
import { findStyle } from './styles.ts';

const teddy = findStyle('teddy');

it('leaves a style as it is when the pet changes nothing', () => {
  expect(styleForPet(teddy, null)).toEqual(teddy);
  expect(
    styleForPet(teddy, { ownCuts: null, ownFinish: null, ownServices: null, ownPlanB: null }),
  ).toEqual(teddy);
});

it('lays the pet’s regions over the style and keeps plan B complete', () => {
  const own = styleForPet(teddy, {
    ownCuts: { back: { tool: 'blade', lengthTenthsMm: 63, direction: 'with' } },
    ownFinish: 'full',
    ownServices: ['bath', 'teeth'],
    ownPlanB: { services: { teeth: 'must' }, regions: { tail: 'must' } },
  });
  expect(own.cuts).toEqual({
    ...teddy.cuts,
    back: { tool: 'blade', lengthTenthsMm: 63, direction: 'with' },
  });
  expect([teddy.finish, own.finish]).toEqual(['pet', 'full']);
  expect(own.services).toEqual(['bath', 'teeth']);
  // Words for services the pet no longer has are gone; the tail must now be done.
  expect(own.planB!.services).toEqual({ bath: 'ifAllowed', teeth: 'must' });
  expect(own.planB!.regions.tail).toBe('must');
  expect(own.planB!.regions.head).toBe(teddy.planB!.regions.head);
});

it('takes a region out of the plan by leaving it', () => {
  const own = styleForPet(teddy, {
    ownCuts: { tail: { tool: 'leave' } },
    ownFinish: null,
    ownServices: null,
    ownPlanB: null,
  });
  expect(own.planB!.regions).not.toHaveProperty('tail');
});

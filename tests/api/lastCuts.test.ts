import { app, useApp } from '../support/useApp.ts';
import { expect, it } from 'vitest';
import { getHousehold } from '#shared/api/households.ts';
import { addPetStyle } from '#shared/api/petStyles.ts';
import { createPet, getPet } from '#shared/api/pets.ts';
import { createVisit } from '#shared/api/visits.ts';
import { findStyle } from '#shared/grooming/styles.ts';
import { addDays } from '#shared/time/localDate.ts';
import { inBusiness } from '#server/db/database.ts';
import { PetStyle } from '#server/models/PetStyle.ts';
import { Visit } from '#server/models/Visit.ts';
import { VisitPet } from '#server/models/VisitPet.ts';
import { addHousehold, buildBusiness } from '../support/buildBusiness.ts';
import { instantAt } from '../support/setClock.ts';
import { tomorrow } from '../support/tomorrow.ts';

useApp();

const date = tomorrow();
const worked = addDays(date, -42);
/** #7 blade with growth all over but the head: the coat begins again from a few millimetres. */
const shortAll = Object.fromEntries(
  ['back', 'belly', 'neck', 'foreLegs', 'hindLegs', 'tail'].map((region) => [
    region,
    { tool: 'blade' as const, lengthTenthsMm: 32, direction: 'with' as const },
  ]),
);

it('a coat grows from the style of the last visit, not from the one asked for now', async () => {
  const { client } = await buildBusiness(app, date);
  const businessId = client.session!.business.id;
  const { household, pet: left } = await addHousehold(client);
  const params = { householdId: household.id };
  const { pets } = await client.must(getHousehold, { params });
  const { name, species, breedId, weightGrams, styleId } = pets[0]!;
  const short = await client.must(createPet, {
    params,
    body: { name: `${name} II`, species, breedId, weightGrams, styleId },
  });
  const never = await client.must(createPet, {
    params,
    body: { name: `${name} III`, species, breedId, weightGrams, styleId },
  });
  // One was clipped short six weeks ago; both are to have the same teddy now.
  for (const [petId, ownCuts] of [
    [short.id, shortAll],
    [left.id, null],
  ] as const) {
    for (const cuts of [ownCuts, null])
      await client.must(addPetStyle, {
        params: { petId },
        body: { styleId, ownCuts: cuts },
      });
    await inBusiness(businessId, async () => {
      await PetStyle.update(
        { madeAt: instantAt(addDays(worked, -7), '9:00') },
        { where: { petId, version: [1, 2] } },
      );
    });
  }
  const book = async (petId: string, on: string) =>
    client.must(createVisit, {
      body: { householdId: household.id, date: on, petIds: [petId] },
    });
  for (const petId of [short.id, left.id]) {
    const { id } = await book(petId, addDays(date, 1));
    await inBusiness(businessId, () =>
      Visit.update({ date: worked, status: 'done' }, { where: { id } }),
    );
  }
  const shown = await client.must(getPet, { params: { petId: short.id } });
  expect(shown.pet.lastVisitDate).toBe(worked);
  expect(shown.pet.lastCuts).toEqual({ ...findStyle(styleId).cuts, ...shortAll });
  const again = await client.must(getHousehold, { params });
  expect(again.pets.map((pet) => [pet.id, pet.lastCuts === null])).toEqual(
    expect.arrayContaining([
      [short.id, false],
      [left.id, false],
      [never.id, true],
    ]),
  );
  expect(again.pets.find(({ id }) => id === left.id)!.lastCuts).toEqual(findStyle(styleId).cuts);

  const [fromShort, fromTeddy] = [await book(short.id, date), await book(left.id, date)];
  const handSeconds = (visit: typeof fromShort) =>
    visit.steps
      .filter(({ key }) => key === 'comb' || key === 'scissor' || key === 'head')
      .reduce((sum, { medianSeconds }) => sum + medianSeconds, 0);
  expect(handSeconds(fromShort)).toBeLessThan(0.95 * handSeconds(fromTeddy));
  expect(await inBusiness(businessId, () => VisitPet.count())).toBe(4);
});

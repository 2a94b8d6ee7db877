import { app, useApp } from '../support/useApp.ts';
import { expect, it, vi } from 'vitest';
import { getHousehold } from '#shared/api/households.ts';
import { createStyle } from '#shared/api/styles.ts';
import { addPetStyle, listPetStyles } from '#shared/api/petStyles.ts';
import { createPet, getPet, updatePet } from '#shared/api/pets.ts';
import { createVisit } from '#shared/api/visits.ts';
import { findStyle } from '#shared/grooming/styles.ts';
import { database, inBusiness } from '#server/db/database.ts';
import { Pet } from '#server/models/Pet.ts';
import { PetStyle } from '#server/models/PetStyle.ts';
import { stylesOf } from '#server/services/styles/stylesOf.ts';
import { addHousehold, buildBusiness } from '../support/buildBusiness.ts';
import { tomorrow } from '../support/tomorrow.ts';

useApp();

const shortBack = {
  back: { tool: 'blade' as const, lengthTenthsMm: 32, direction: 'with' as const },
};

async function clover() {
  const built = await buildBusiness(app, tomorrow());
  const { household, pet } = await addHousehold(built.client);
  const params = { petId: pet.id };
  const versions = () => built.client.must(listPetStyles, { params });
  return { ...built, household, pet, params, versions };
}

it('a new pet has version 1 of its style, made by whoever added it', async () => {
  const { versions, pet } = await clover();
  expect(await versions()).toEqual([
    {
      petId: pet.id,
      version: 1,
      styleId: 'teddy',
      styleName: findStyle('teddy').name,
      ownCuts: null,
      ownFinish: null,
      ownServices: null,
      ownPlanB: null,
      style: JSON.parse(JSON.stringify(findStyle('teddy'))),
      notes: '',
      madeAt: expect.stringMatching(/Z$/),
      madeBy: 'Odile',
      photos: [],
    },
  ]);
});

it('a new version counts everywhere at once and the old one stays readable', async () => {
  const { client, household, params, versions, pet } = await clover();
  const date = tomorrow();
  const made = await client.must(addPetStyle, {
    params,
    body: {
      styleId: 'teddy',
      ownCuts: shortBack,
      ownFinish: 'full',
      ownServices: ['bath', 'teeth'],
      notes: 'Short.',
    },
  });
  expect(made).toMatchObject({
    version: 2,
    ownCuts: shortBack,
    ownFinish: 'full',
    ownServices: ['bath', 'teeth'],
  });
  expect(made.style.finish).toBe('full');
  expect(made.style.cuts).toEqual({ ...findStyle('teddy').cuts, ...shortBack });
  expect(made.style.planB.services).toEqual({ bath: 'ifAllowed', teeth: 'leave' });
  expect((await versions()).map(({ version, notes }) => [version, notes])).toEqual([
    [2, 'Short.'],
    [1, ''],
  ]);
  const shown = (await client.must(getPet, { params })).pet;
  expect([shown.style, shown.styleNotes]).toEqual([made.style, 'Short.']);
  const { pets } = await client.must(getHousehold, { params: { householdId: household.id } });
  expect(pets[0]!.style).toEqual(made.style);
  const visit = await client.must(createVisit, {
    body: { householdId: household.id, date, petIds: [pet.id] },
  });
  const keys = visit.steps.map((step) => step.key);
  expect(keys).toContain('teeth');
  expect(keys).not.toContain('nails');
});

it('a change of the pet’s style or notes is a version too; of anything else it is not', async () => {
  const { client, params, versions } = await clover();
  await client.must(addPetStyle, { params, body: { styleId: 'teddy', ownCuts: shortBack } });
  await client.must(updatePet, { params, body: { weightGrams: 6500, styleId: 'teddy' } });
  expect(await versions()).toHaveLength(2);
  await client.must(updatePet, { params, body: { styleNotes: 'Round face.' } });
  const [noted] = await versions();
  expect(noted).toMatchObject({ version: 3, ownCuts: shortBack, notes: 'Round face.' });
  // What was told about one style says nothing about another.
  await client.must(updatePet, { params, body: { styleId: 'short-all-over' } });
  const [other] = await versions();
  expect(other).toMatchObject({ version: 4, styleId: 'short-all-over', ownCuts: null });
});

it('a pet from before versions were kept behaves as version 1 and keeps it as such', async () => {
  const { client, params, versions } = await clover();
  await inBusiness(client.session!.business.id, () => PetStyle.destroy({ where: {} }));
  expect(await versions()).toMatchObject([{ version: 1, styleId: 'teddy', madeAt: null }]);
  await client.must(addPetStyle, { params, body: { styleId: 'short-all-over' } });
  expect((await versions()).map(({ version, styleId, madeAt }) => [version, styleId, !madeAt])) // prettier-ignore
    .toEqual([
      [2, 'short-all-over', false],
      [1, 'teddy', true],
    ]);
});

it('two at once are two versions', async () => {
  const { client, params, versions } = await clover();
  const notes = ['one', 'two', 'three'];
  const answers = await Promise.all(
    notes.map((note) =>
      client.call(addPetStyle, { params, body: { styleId: 'teddy', notes: note } }),
    ),
  );
  expect(answers.map((answer) => answer.status)).toEqual([200, 200, 200]);
  expect((await versions()).map(({ version }) => version)).toEqual([4, 3, 2, 1]);
});

it('refuses a style of the other species and nonsense in the changes, and keeps the pet', async () => {
  const { client, params, versions } = await clover();
  const before = await client.must(getPet, { params });
  for (const [body, field] of [
    [{ styleId: 'cat-comb-out' }, 'styleId'],
    [{ styleId: 'mohawk' }, 'styleId'],
    [{ styleId: 'teddy', ownCuts: { wing: { tool: 'leave' } } }, 'ownCuts'],
    [{ styleId: 'teddy', ownServices: ['massage'] }, 'ownServices.0'],
    [{ styleId: 'teddy', ownFinish: 'best' }, 'ownFinish'],
    [
      { styleId: 'teddy', ownPlanB: { services: { nails: 'never' }, regions: {} } },
      'ownPlanB.services.nails',
    ],
  ] as const) {
    // prettier-ignore
    const answer = await client.call(addPetStyle, { params, body });
    expect([answer.status, Object.keys(answer.error.fields ?? {})]).toEqual([400, [field]]);
  }
  expect(await versions()).toHaveLength(1);
  expect(await client.must(getPet, { params })).toEqual(before);
});

it('the styles of a list take two queries, however long the list', async () => {
  const { client, household, pet } = await clover();
  const own = await client.must(createStyle, {
    body: {
      name: 'Short back',
      species: 'dog',
      coats: ['curly'],
      cuts: shortBack,
      finish: 'tidy',
      services: [],
    },
  });
  for (const name of ['Rook', 'Wren', 'Teasel'])
    await client.must(createPet, {
      params: { householdId: household.id },
      body: {
        name,
        species: 'dog',
        breedId: 'bichon-frise',
        weightGrams: 6000,
        styleId: name === 'Wren' ? 'short-all-over' : own.id,
      },
    });
  const asked = vi.spyOn(database, 'query');
  await inBusiness(client.session!.business.id, async () => {
    const pets = await Pet.findAll({ order: [['name', 'ASC']] });
    asked.mockClear();
    const styleOf = await stylesOf(pets);
    expect(asked).toHaveBeenCalledTimes(2);
    expect(pets.map((one) => styleOf(one).name)).toEqual([
      findStyle('teddy').name,
      'Short back',
      'Short back',
      findStyle('short-all-over').name,
    ]);
  });
  asked.mockRestore();
  expect(pet.style.name).toBe(findStyle('teddy').name);
});

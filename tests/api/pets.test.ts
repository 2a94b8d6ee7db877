import { app, useApp } from '../support/useApp.ts';
import { describe, expect, it } from 'vitest';
import { quickForecast } from '#shared/api/forecasts.ts';
import { getHousehold } from '#shared/api/households.ts';
import { createPet, getPet, updatePet } from '#shared/api/pets.ts';
import { inBusiness } from '#server/db/database.ts';
import { Pet } from '#server/models/Pet.ts';
import { createVisit } from '#shared/api/visits.ts';
import { ApiClient } from '../support/apiClient.ts';
import { addHousehold } from '../support/buildBusiness.ts';
import { tomorrow } from '../support/tomorrow.ts';

useApp();

const collie = {
  name: 'Juniper',
  species: 'dog' as const,
  breedId: 'bichon-frise',
  weightGrams: 7000,
  styleId: 'teddy',
};

async function petOwner() {
  const client = await new ApiClient(app).signUp();
  const { household, pet } = await addHousehold(client);
  const params = { householdId: household.id };
  const create = (body: Record<string, unknown>) =>
    client.call(createPet, { params, body: { ...collie, ...body } });
  const update = (body: Record<string, unknown>) =>
    client.call(updatePet, { params: { petId: pet.id }, body });
  return { client, household, pet, create, update };
}

describe('a pet', () => {
  it('is kept as given, with names from the tables, and a change leaves the rest', async () => {
    const { client, household, create } = await petOwner();
    const { body: pet } = await create({
      matting: 2,
      temperament: 'anxious',
      birthYear: 2019,
      cautions: ['heart'],
      cautionNote: 'Vet cleared in spring',
      vetName: 'Dr Lark',
      vetPhone: '+44 7700 900777',
      intervalWeeks: 8,
    });
    expect(pet).toMatchObject({
      householdId: household.id,
      breedName: 'Bichon frise',
      vetPhone: '+447700900777',
      active: true,
      lastVisitDate: null,
    });
    const params = { petId: pet.id };
    const changed = await client.must(updatePet, { params, body: { weightGrams: 7500 } });
    expect(changed).toEqual({ ...pet, weightGrams: 7500 });
    expect((await client.must(getPet, { params })).pet).toEqual(changed);
    const gone = await client.must(updatePet, { params, body: { active: false } });
    expect(gone).toEqual({ ...changed, active: false });
    const { pets } = await client.must(getHousehold, { params: { householdId: household.id } });
    expect(pets.map((one) => [one.name, one.active])).toEqual([
      ['Clover', true],
      ['Juniper', false],
    ]);
  });

  it('is refused with the field named when a table does not know a key', async () => {
    const { create, update, client, pet } = await petOwner();
    const before = await client.must(getPet, { params: { petId: pet.id } });
    for (const [wrong, field, words] of [
      [{ breedId: 'wolf' }, 'breedId', 'must be a dog breed from the list, or none'],
      [{ breedId: 'persian' }, 'breedId', 'must be a dog breed from the list, or none'],
      [{ styleId: 'mohawk' }, 'styleId', 'must be a dog style from the list'],
      [{ styleId: 'cat-comb-out' }, 'styleId', 'must be a dog style from the list'],
      [{ cautions: ['heart', 'vampire'] }, 'cautions', 'has an unknown entry, vampire'],
      [{ temperament: 'feral' }, 'temperament', 'must be one of calm, restless, anxious, nippy'],
      [{ coatType: 'scales' }, 'coatType', /^must be one of smooth, double/],
    ] as const)
      for (const answer of [await create(wrong), await update(wrong)]) {
        expect(answer.status).toBe(400);
        expect(answer.error.fields).toEqual({
          [field]: typeof words === 'string' ? words : (expect.stringMatching(words) as string),
        });
      }
    expect((await client.must(getPet, { params: { petId: pet.id } })).pet).toEqual(before.pet);
    const rows = await inBusiness(client.session!.business.id, () => Pet.count());
    expect(rows).toBe(1);
  });

  it('needs a weight when it has no breed; a breed alone is enough', async () => {
    const { create, update } = await petOwner();
    const bare = await create({ breedId: null, weightGrams: null });
    expect(bare.error.fields).toEqual({ weightGrams: 'is needed when no breed is chosen' });
    const cross = await create({ breedId: 'cockapoo', weightGrams: null });
    expect(cross.error.fields).toEqual({ weightGrams: 'is needed for a cross such as cockapoo' });
    expect((await create({ breedId: 'cockapoo', weightGrams: 9000 })).status).toBe(200);
    expect((await create({ breedId: null, weightGrams: 9000 })).error.fields).toEqual({
      coatType: 'is missing: without a breed, name the coat (for example "curly")',
    });
    const mixed = await create({ breedId: null, weightGrams: 9000, coatType: 'curly' });
    expect(mixed.body.breedName).toBe('Dog, mixed');
    expect((await create({ weightGrams: null })).status).toBe(200);
    // Clover has both: either may go, not both.
    expect((await update({ breedId: null, weightGrams: null })).status).toBe(400);
    expect((await update({ breedId: null, coatType: 'curly' })).status).toBe(200);
    expect((await update({ weightGrams: null })).error.fields).toHaveProperty('weightGrams');
  });

  it('keeps numbers in bounds and cats cats', async () => {
    const { create, update } = await petOwner();
    for (const [wrong, field] of [
      [{ weightGrams: 299 }, 'weightGrams'],
      [{ weightGrams: 120_001 }, 'weightGrams'],
      [{ matting: 5 }, 'matting'],
      [{ birthYear: 1066 }, 'birthYear'],
      [{ intervalWeeks: 0 }, 'intervalWeeks'],
      [{ species: 'ferret' }, 'species'],
      [{ vetPhone: 'call me' }, 'vetPhone'],
    ] as const)
      expect(Object.keys((await create(wrong)).error.fields!)).toEqual([field]);
    const turned = await update({ species: 'cat' });
    expect(turned.error.fields).toHaveProperty('breedId');
    const heavy = { species: 'cat', breedId: null, coatType: 'catShort', styleId: 'cat-comb-out' };
    expect((await create({ ...heavy, weightGrams: 90_000 })).error.fields).toEqual({
      weightGrams: 'must be whole grams from 400 to 20000 for a cat, got 90000',
    });
    const cat = await create({
      species: 'cat',
      breedId: null,
      weightGrams: 4200,
      coatType: 'catShort',
      styleId: 'cat-comb-out',
    });
    expect(cat.body.breedName).toBe('Cat, mixed');
  });

  it('keeps mats in places, loose undercoat and its table limit, and books with them', async () => {
    const { client, household, pet, create, update } = await petOwner();
    expect(pet).toMatchObject({ mattingByRegion: null, undercoatLoad: 0, tableLimitMinutes: null });
    const book = async (petId: string) =>
      client.must(createVisit, {
        body: { householdId: household.id, date: tomorrow(), petIds: [petId] },
      });
    const mats = ({ steps }: { steps: { key: string; medianSeconds: number }[] }) =>
      steps
        .filter(({ key }) => key === 'mats' || key === 'clipOff')
        .reduce((sum, { medianSeconds }) => sum + medianSeconds, 0);
    const coat = { mattingByRegion: { ears: 2, tail: 1 }, undercoatLoad: 2, tableLimitMinutes: 40 };
    const { body: matted } = await create({ ...coat, matting: 2 });
    const { body: whole } = await create({ name: 'Moss', matting: 2 });
    expect(matted).toMatchObject(coat);
    expect((await client.must(getPet, { params: { petId: matted.id } })).pet).toEqual(matted);
    const [inPlaces, everywhere, clear] = [
      await book(matted.id),
      await book(whole.id),
      await book(pet.id),
    ];
    // Named places beat the whole pet's level, the others are then clear.
    expect(mats(clear)).toBe(0);
    expect(mats(inPlaces)).toBeGreaterThan(0);
    expect(mats(inPlaces)).toBeLessThan(mats(everywhere));
    const told = await client.must(quickForecast, {
      body: {
        species: 'dog',
        breedId: 'bichon-frise',
        weightGrams: 7000,
        styleId: 'teddy',
        mattingByRegion: coat.mattingByRegion,
        undercoatLoad: 2,
      },
    });
    expect(mats(told)).toBe(mats(inPlaces));
    const back = await client.must(updatePet, {
      params: { petId: matted.id },
      body: { mattingByRegion: null },
    });
    expect(back).toEqual({ ...matted, mattingByRegion: null });
    for (const [wrong, field] of [
      [{ mattingByRegion: { ears: 5 } }, 'mattingByRegion.ears'],
      [{ mattingByRegion: { wings: 1 } }, 'mattingByRegion'],
      [{ undercoatLoad: 3 }, 'undercoatLoad'],
      [{ tableLimitMinutes: 9 }, 'tableLimitMinutes'],
      [{ tableLimitMinutes: 241 }, 'tableLimitMinutes'],
    ] as const)
      for (const answer of [await create(wrong), await update(wrong)])
        expect([answer.status, Object.keys(answer.error.fields!)]).toEqual([400, [field]]);
  });
});

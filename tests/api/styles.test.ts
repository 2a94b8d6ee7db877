import { app, useApp } from '../support/useApp.ts';
import { describe, expect, it } from 'vitest';
import { createPet, updatePet } from '#shared/api/pets.ts';
import { createStyle, listStyles, retireStyle, updateStyle } from '#shared/api/styles.ts';
import { createVisit, getVisit } from '#shared/api/visits.ts';
import { forecastPet } from '#shared/grooming/forecastPet.ts';
import { planBOf } from '#shared/grooming/planB.ts';
import { styles } from '#shared/grooming/styles.ts';
import { ApiClient } from '../support/apiClient.ts';
import { addHousehold, buildBusiness } from '../support/buildBusiness.ts';
import { tomorrow } from '../support/tomorrow.ts';

useApp();

const lamb = {
  name: 'Sunday lamb',
  species: 'dog' as const,
  coats: ['curly' as const],
  cuts: {
    back: { tool: 'comb' as const, lengthTenthsMm: 130, direction: 'with' as const },
    foreLegs: { tool: 'scissor' as const, lengthTenthsMm: 250 },
    hindLegs: { tool: 'scissor' as const, lengthTenthsMm: null },
    tail: { tool: 'leave' as const },
  },
  finish: 'pet' as const,
  services: ['bath' as const, 'nails' as const],
};

const signedUp = () => new ApiClient(app).signUp();

describe('styles', () => {
  it('begin with the whole starting library', async () => {
    const client = await signedUp();
    const list = await client.must(listStyles);
    expect(list.map(({ id }) => id)).toEqual(styles.map(({ id }) => id));
    expect(list[0]).toMatchObject({ source: 'starting', basedOn: null, retired: false });
    expect(list.find(({ id }) => id === 'teddy')!.cuts).toEqual(
      styles.find(({ id }) => id === 'teddy')!.cuts,
    );
  });

  it('of one’s own come after it, with plan B made complete', async () => {
    const client = await signedUp();
    const made = await client.must(createStyle, { body: { ...lamb, basedOn: 'lamb-legs' } });
    expect(made).toMatchObject({
      ...lamb,
      source: 'own',
      basedOn: 'lamb-legs',
      retired: false,
      planB: planBOf({ ...lamb, id: 'x' }),
    });
    expect(made.planB.services).toEqual({ bath: 'ifAllowed', nails: 'must' });
    expect(made.planB.regions).not.toHaveProperty('tail');
    expect((await client.must(listStyles)).at(-1)).toEqual(made);
    expect((await (await signedUp()).must(listStyles)).length).toBe(styles.length);
  });

  it('change field by field and retire', async () => {
    const client = await signedUp();
    const made = await client.must(createStyle, { body: lamb });
    const params = { styleId: made.id };
    const changed = await client.must(updateStyle, { params, body: { finish: 'full' } });
    expect(changed).toEqual({ ...made, finish: 'full' });
    const retired = await client.must(retireStyle, { params, body: {} });
    expect(retired).toEqual({ ...changed, retired: true });
    // Its name is free again, and while it is taken the old one cannot come back.
    await client.must(createStyle, { body: lamb });
    const back = await client.call(retireStyle, { params, body: { retired: false } });
    expect(back.error.fields).toEqual({ name: 'is already a style here' });
  });

  it('are refused with the field named', async () => {
    const client = await signedUp();
    const first = await client.must(createStyle, { body: lamb });
    for (const [wrong, field] of [
      [{}, 'name'],
      [{ name: 'TEDDY, 22 mm' }, null],
      [{ name: 'A', coats: [] }, 'coats'],
      [{ name: 'A', coats: ['catLong'] }, 'coats'],
      [{ name: 'A', cuts: { nose: { tool: 'leave' } } }, 'cuts'],
      [{ name: 'A', cuts: { back: { tool: 'laser' } } }, 'cuts.back.tool'],
      [
        { name: 'A', cuts: { back: { tool: 'blade', lengthTenthsMm: 1, direction: 'with' } } },
        'cuts.back.lengthTenthsMm',
      ],
      [{ name: 'A', services: ['bath', 'bath'] }, 'services'],
      [{ name: 'A', services: [], cuts: {} }, 'services'],
      [{ name: 'A', basedOn: 'cat-comb-out' }, 'basedOn'],
      [{ name: 'A', basedOn: 'mohawk' }, 'basedOn'],
    ] as const) {
      const answer = await client.call(createStyle, { body: { ...lamb, ...wrong } });
      if (field === null) expect(answer.status).toBe(200);
      else expect([answer.status, Object.keys(answer.error.fields ?? {})]).toEqual([400, [field]]);
    }
    const twice = await client.call(updateStyle, {
      params: { styleId: first.id },
      body: { name: 'Teddy, 22 mm' },
    });
    expect(twice.error.fields).toEqual({ name: 'is already a style here' });
    const library = await client.call(updateStyle, { params: { styleId: 'teddy' }, body: {} });
    expect(library.error.fields).toEqual({
      styleId: 'is a starting style: make a copy and change that',
    });
    const unknown = await client.call(updateStyle, { params: { styleId: 'mohawk' }, body: {} });
    expect(unknown.status).toBe(404);
  });
});

describe('a pet in a style of the business’s own', () => {
  it('is booked, shown and cautioned by it', async () => {
    const date = tomorrow();
    const { client } = await buildBusiness(app, date);
    const { household, pet } = await addHousehold(client);
    const made = await client.must(createStyle, { body: lamb });
    const params = { petId: pet.id };
    const dressed = await client.must(updatePet, { params, body: { styleId: made.id } });
    expect([dressed.styleName, dressed.style.cuts]).toEqual(['Sunday lamb', lamb.cuts]);
    const visit = await client.must(createVisit, {
      body: { householdId: household.id, date, petIds: [pet.id] },
    });
    expect(visit.pets[0]!.styleName).toBe('Sunday lamb');
    const { source: _s, basedOn: _b, retired: _r, ...style } = made;
    const told = forecastPet(
      {
        species: 'dog',
        breedId: 'bichon-frise',
        weightGrams: 6000,
        ageYears: null,
        coatType: null,
        coatState: { matting: 0, undercoatLoad: 0, soil: 0, lengthTenthsMm: null },
        temperament: 'calm',
        cautions: [],
        firstVisit: true,
        weeksSinceLast: null,
      },
      style,
    );
    expect(visit.steps.map((step) => [step.key, step.medianSeconds])).toEqual(
      told.steps.map((step) => [step.key, step.medianSeconds]),
    );
    // Another cut, other minutes: the visit booked keeps its own.
    await client.must(updateStyle, { params: { styleId: made.id }, body: { finish: 'tidy' } });
    const same = await client.must(getVisit, { params: { visitId: visit.id } });
    expect(same.steps).toEqual(visit.steps);
  });

  it('keeps a retired one, which nobody new gets', async () => {
    const client = await signedUp();
    const { household, pet } = await addHousehold(client);
    const made = await client.must(createStyle, { body: lamb });
    const params = { petId: pet.id };
    await client.must(updatePet, { params, body: { styleId: made.id } });
    await client.must(retireStyle, { params: { styleId: made.id }, body: {} });
    const kept = await client.must(updatePet, { params, body: { weightGrams: 6200 } });
    expect(kept.styleName).toBe('Sunday lamb');
    const fresh = await client.call(createPet, {
      params: { householdId: household.id },
      body: {
        name: 'Pip',
        species: 'dog',
        breedId: 'bichon-frise',
        weightGrams: 5000,
        styleId: made.id,
      },
    });
    expect(fresh.error.fields).toEqual({ styleId: 'must be a dog style from the list' });
  });

  it('cannot have another business’s style', async () => {
    const made = await (await signedUp()).must(createStyle, { body: lamb });
    const client = await signedUp();
    const { pet } = await addHousehold(client);
    const answer = await client.call(updatePet, {
      params: { petId: pet.id },
      body: { styleId: made.id },
    });
    expect(answer.error.fields).toEqual({ styleId: 'must be a dog style from the list' });
  });
});

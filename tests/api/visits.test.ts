import { app, useApp } from '../support/useApp.ts';
import { describe, expect, it } from 'vitest';
import { getDay } from '#shared/api/days.ts';
import { createPet, updatePet } from '#shared/api/pets.ts';
import { cancelVisit, createVisit, getVisit, updateVisit } from '#shared/api/visits.ts';
import { updateBusiness } from '#shared/api/business.ts';
import { addDays, daysBetween } from '#shared/time/localDate.ts';
import { inBusiness } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';
import { Promise as PromiseRow } from '#server/models/Promise.ts';
import { Visit } from '#server/models/Visit.ts';
import { VisitPet } from '#server/models/VisitPet.ts';
import { addHousehold, buildBusiness } from '../support/buildBusiness.ts';
import { tomorrow } from '../support/tomorrow.ts';

useApp();

async function bookable() {
  const date = tomorrow();
  const built = await buildBusiness(app, date);
  const { client } = built;
  const businessId = client.session!.business.id;
  const home = await addHousehold(client);
  const book = (fields: Record<string, unknown> = {}) =>
    client.call(createVisit, {
      body: { householdId: home.household.id, date, petIds: [home.pet.id], ...fields },
    });
  const promises = (visitId: string) =>
    inBusiness(businessId, async () =>
      (await PromiseRow.findAll({ where: { visitId }, order: ['version'] })).map((row) => [
        row.version,
        row.startMinutes,
        row.endMinutes,
        row.madeBy,
      ]),
    );
  const count = () => inBusiness(businessId, () => Visit.count());
  return { ...built, ...home, date, businessId, book, promises, count };
}

const second = {
  name: 'Bramble',
  species: 'dog' as const,
  breedId: 'bichon-frise',
  weightGrams: 5000,
  styleId: 'teddy',
};

describe('createVisit', () => {
  it('stores the forecast and the model’s version, and later models and pets do not change it', async () => {
    const { client, businessId, book, pet } = await bookable();
    const { body: card } = await book({ note: ' lift with two ' });
    const row = () => inBusiness(businessId, () => Visit.findByPk(card.id));
    const stored = (await row())!;
    expect(stored.modelVersion).not.toBe('');
    expect(stored.forecast.steps.length).toBeGreaterThan(5);
    expect(stored.forecast.steps.every((step) => step.petId === pet.id)).toBe(true);
    const sum = stored.forecast.steps.reduce((total, step) => total + step.meanSeconds, 0);
    expect(Math.abs(stored.forecast.work.meanSeconds - sum)).toBeLessThan(
      stored.forecast.steps.length,
    );
    expect(card).toMatchObject({
      status: 'booked',
      note: 'lift with two',
      promise: null,
      steps: stored.forecast.steps,
      p10Seconds: stored.forecast.p10Seconds,
    });
    await client.must(updatePet, {
      params: { petId: pet.id },
      body: { matting: 4, weightGrams: 9000, birthYear: 1990 },
    });
    expect((await row())!.forecast).toEqual(stored.forecast);
    const later = await client.must(getVisit, { params: { visitId: card.id } });
    expect(later.steps).toEqual(card.steps);
    expect(later.pets[0]!.weightGrams).toBe(9000);
  });

  it('keeps the pets in the order named, each once', async () => {
    const { client, businessId, book, household, pet } = await bookable();
    const other = await client.must(createPet, {
      params: { householdId: household.id },
      body: second,
    });
    const { body: card } = await book({ petIds: [other.id, pet.id, other.id] });
    expect(card.pets.map((one) => one.name)).toEqual(['Bramble', 'Clover']);
    const rows = await inBusiness(businessId, () =>
      VisitPet.findAll({ where: { visitId: card.id }, order: ['position'] }),
    );
    expect(rows.map((row) => [row.petId, row.position])).toEqual([
      [other.id, 0],
      [pet.id, 1],
    ]);
  });

  it('waits in the day’s not placed, with windows and pin facts of its own', async () => {
    const { client, date, book, groomers } = await bookable();
    const { body: card } = await book({
      promise: { startMinutes: 570, endMinutes: 690 },
      allowed: [{ startMinutes: 480, endMinutes: 720, binds: 'stay' }],
      preferredGroomerId: groomers[0]!.id,
    });
    const day = await client.must(getDay, { params: { date } });
    expect(day.plan.notPlaced).toEqual([card.id]);
    expect(day.problem.visits[0]).toMatchObject({
      id: card.id,
      label: 'Clover',
      promise: { startSeconds: 570 * 60, endSeconds: 690 * 60, version: 1 },
      allowed: [{ startSeconds: 480 * 60, endSeconds: 720 * 60, binds: 'stay' }],
      preferredGroomerIds: [groomers[0]!.id],
      pin: null,
    });
  });

  it('refuses past dates, foreign and inactive pets, foreign groomers and upside-down windows', async () => {
    const { client, date, book, pet, count } = await bookable();
    const neighbour = await addHousehold(client, { name: 'Next door' });
    const stranger = await bookable();
    const late = { startMinutes: 700, endMinutes: 700 };
    for (const [fields, field] of [
      [{ date: addDays(date, -2) }, 'date'],
      [{ date: '2026-02-30' }, 'date'],
      [{ petIds: [neighbour.pet.id] }, 'petIds'],
      [{ petIds: [pet.id, neighbour.pet.id] }, 'petIds'],
      [{ petIds: [stranger.pet.id] }, 'petIds'],
      [{ petIds: [] }, 'petIds'],
      [{ preferredGroomerId: stranger.groomers[0]!.id }, 'preferredGroomerId'],
      [{ promise: late }, 'promise.endMinutes'],
      [{ allowed: [{ ...late, binds: 'stay' }] }, 'allowed.0.endMinutes'],
    ] as const) {
      const answer = await book(fields);
      expect(answer.status, `${JSON.stringify(fields)}`).toBe(400);
      expect(Object.keys(answer.error.fields!)).toEqual([field]);
    }
    expect((await book({ householdId: newId() })).status).toBe(404);
    await client.must(updatePet, { params: { petId: pet.id }, body: { active: false } });
    expect((await book()).error.fields).toEqual({ petIds: 'must be pets of this household' });
    expect(await count()).toBe(0);
  });

  it('takes a far date even when a slip in the year makes the pet a hundred', async () => {
    const { client, book, pet } = await bookable();
    await client.must(updatePet, { params: { petId: pet.id }, body: { birthYear: 1991 } });
    const far = await book({ date: '2090-05-05' });
    expect(far.status).toBe(200);
    expect((await client.call(getDay, { params: { date: '2090-05-05' } })).status).toBe(200);
  });

  it('goes by the business’s own date: where it is still yesterday, yesterday is bookable', async () => {
    const { client, date, book } = await bookable();
    // Fourteen hours ahead of UTC and eleven behind never share a date for a whole day.
    await client.must(updateBusiness, { body: { timeZone: 'Pacific/Kiritimati' } });
    const ahead = await Promise.all(
      [-3, -2, -1, 0, 1].map((by) => book({ date: addDays(date, by) })),
    );
    await client.must(updateBusiness, { body: { timeZone: 'Pacific/Pago_Pago' } });
    const behind = await Promise.all(
      [-3, -2, -1, 0, 1].map((by) => book({ date: addDays(date, by) })),
    );
    const first = (answers: typeof ahead) => answers.findIndex((answer) => answer.status === 200);
    expect(first(ahead) - first(behind)).toBeGreaterThanOrEqual(1);
    expect(
      daysBetween(addDays(date, first(behind) - 3), addDays(date, first(ahead) - 3)),
    ).toBeLessThan(3);
  });
});

describe('updateVisit', () => {
  it('appends promise versions and never changes an old one', async () => {
    const { client, book, promises } = await bookable();
    const { body: card } = await book({ promise: { startMinutes: 540, endMinutes: 660 } });
    const params = { visitId: card.id };
    const change = (body: Record<string, unknown>) => client.must(updateVisit, { params, body });
    expect((await change({ promise: { startMinutes: 600, endMinutes: 720 } })).promise).toEqual({
      startMinutes: 600,
      endMinutes: 720,
      version: 2,
    });
    // The same again is no new promise; a note touches none.
    await change({ promise: { startMinutes: 600, endMinutes: 720 } });
    expect((await change({ note: 'ring twice' })).promise!.version).toBe(2);
    expect((await change({ promise: null })).promise).toBeNull();
    expect(
      (await change({ promise: { startMinutes: 600, endMinutes: 720 } })).promise!.version,
    ).toBe(4);
    expect(await promises(card.id)).toEqual([
      [1, 540, 660, 'Odile'],
      [2, 600, 720, 'Odile'],
      [3, null, null, 'Odile'],
      [4, 600, 720, 'Odile'],
    ]);
  });

  it('made twice at once gives two versions, not a clash', async () => {
    const { client, book, promises } = await bookable();
    const { body: card } = await book();
    const answers = await Promise.all(
      [600, 610, 620].map((startMinutes) =>
        client.call(updateVisit, {
          params: { visitId: card.id },
          body: { promise: { startMinutes, endMinutes: 720 } },
        }),
      ),
    );
    expect(answers.map((answer) => answer.status)).toEqual([200, 200, 200]);
    expect((await promises(card.id)).map(([version]) => version)).toEqual([1, 2, 3]);
  });

  it('changes nothing of a cancelled visit', async () => {
    const { client, book, promises } = await bookable();
    const { body: card } = await book();
    const params = { visitId: card.id };
    const noReason = await client.call(cancelVisit, { params, body: { reason: ' ' } });
    expect(noReason.error.fields).toEqual({ reason: 'must say why' });
    await client.must(cancelVisit, { params, body: { reason: 'moved away' } });
    const answer = await client.call(updateVisit, {
      params,
      body: { promise: { startMinutes: 600, endMinutes: 720 } },
    });
    expect(answer.error).toMatchObject({
      code: 'refusedMove',
      message: 'This visit is cancelled and cannot change any more.',
    });
    expect(await promises(card.id)).toEqual([]);
  });
});

import { app, useApp } from '../support/useApp.ts';
import { beforeAll, describe, expect, it, vi } from 'vitest';
import { getDay } from '#shared/api/days.ts';
import { getPetLearned, learnMinutes, listFits } from '#shared/api/learning.ts';
import { createVisit } from '#shared/api/visits.ts';
import { addDays } from '#shared/time/localDate.ts';
import { inBusiness } from '#server/db/database.ts';
import { GroomFit } from '#server/models/GroomFit.ts';
import { Visit } from '#server/models/Visit.ts';
import { learnMinutes as learnOf } from '#server/services/learning/learnMinutes.ts';
import { learnEverywhere } from '#server/services/learning/learnEverywhere.ts';
import { leaseMs, openFit } from '#server/services/learning/openFit.ts';
import { addHousehold, buildBusiness } from '../support/buildBusiness.ts';
import { finishedVisits } from '../support/finishedVisits.ts';
import { tomorrow } from '../support/tomorrow.ts';

useApp();

const date = tomorrow();
const days = 120;
let built: Awaited<ReturnType<typeof buildBusiness>>;
let businessId: string;
let slow: Awaited<ReturnType<typeof addHousehold>>;
let mika: string;
let ines: string;

/** A pet is booked once a day. */
const book = (on: string) =>
  built.client.must(createVisit, {
    body: { householdId: slow.household.id, date: on, petIds: [slow.pet.id], promise: null },
  });
/** Starts learning and waits for its end, as the screen does. */
async function learn() {
  const { id } = await built.client.must(learnMinutes);
  for (;;) {
    const fit = (await built.client.must(listFits)).fits.find((one) => one.id === id)!;
    if (fit.state !== 'working') return fit;
    await new Promise((resolve) => setTimeout(resolve, 100));
  }
}
const learned = (petId: string) => built.client.must(getPetLearned, { params: { petId } });
const stored = (visitId: string) =>
  inBusiness(businessId, async () => (await Visit.findByPk(visitId))!.forecast);

beforeAll(async () => {
  built = await buildBusiness(app, date);
  businessId = built.client.session!.business.id;
  [mika, ines] = built.groomers.map(({ id }) => id) as [string, string];
  const homes = [];
  for (const name of ['Adeyemi', 'Brandt', 'Costa', 'Dunne', 'Eriksen', 'Fonseca', 'Gallo'])
    homes.push(await addHousehold(built.client, { name }));
  slow = homes[0]!;
  await finishedVisits({
    businessId,
    before: date,
    vans: built.vans.map((van, index) => ({ vanId: van.id, groomerId: [mika, ines][index]! })),
    petIds: homes.map(({ pet }) => pet.id),
    days,
    // The first pet takes 40 % longer with anybody; Ines a fifth longer with any pet.
    factor: (petId, groomerId) =>
      (petId === slow.pet.id ? 1.4 : 1) * (groomerId === ines ? 1.2 : 1),
  });
});

describe('learnMinutes', () => {
  it('books by the plain model while nothing is learned', async () => {
    const visit = await book(date);
    expect(visit.learned).toBeUndefined();
    const forecast = await stored(visit.id);
    expect(forecast.workByGroomer).toEqual({});
    expect(forecast.learning).toMatchObject({ fitId: null, words: [], petVisits: 0 });
    expect(forecast.learning!.plain[0]!.petId).toBe(slow.pet.id);
    expect(await learned(slow.pet.id)).toBeNull();
    expect(await built.client.must(listFits)).toEqual({ fits: [], inForce: null });
  });

  it('keeps a fit that forecasts better, and books by it, each groomer at their own pace', async () => {
    const plain = await stored((await book(addDays(date, 1))).id);
    const fit = await learn();
    expect(fit.state).toBe('kept');
    expect(fit.records + fit.leftOut).toBe(days * 4);
    expect(fit.leftOut).toBeGreaterThan(2);
    expect(fit.leftOut).toBeLessThan(30);
    expect(fit.heldOut).toBeGreaterThanOrEqual(20);
    expect(fit.afterSeconds).toBeLessThan(0.7 * fit.beforeSeconds);

    const on = addDays(date, 2);
    const visit = await book(on);
    expect(visit.learned!.petVisits).toBeGreaterThan(40);
    expect(visit.learned!.words.join(' ')).toMatch(
      /Learned from \d+ visits of Clover: \d+ % slower/,
    );
    const forecast = await stored(visit.id);
    expect(forecast.learning!.fitId).toBe(fit.id);
    // The plain word is stored beside it, unchanged by learning.
    expect(forecast.learning!.plain).toEqual(plain.learning!.plain);
    const ratio = (groomerId: string) =>
      forecast.workByGroomer![groomerId]!.meanSeconds / plain.work.meanSeconds;
    // The plain mean is above its median, the learned one hardly; the truth is 1.4 and 1.68 medians.
    expect(ratio(mika)).toBeGreaterThan(1.28);
    expect(ratio(mika)).toBeLessThan(1.45);
    expect(ratio(ines) / ratio(mika)).toBeGreaterThan(1.15);
    expect(ratio(ines) / ratio(mika)).toBeLessThan(1.25);
    const spread = forecast.workByGroomer![mika]!.varianceSeconds2;
    expect(spread).toBeLessThan(forecast.work.varianceSeconds2);

    const day = await built.client.must(getDay, { params: { date: on } });
    const fact = day.problem.visits.find(({ id }) => id === visit.id)!;
    expect(fact.workByGroomer).toEqual(forecast.workByGroomer);
  });

  it('does not keep the same again, and what was booked stays as booked', async () => {
    const visit = await book(addDays(date, 3));
    const before = await stored(visit.id);
    const again = await learn();
    expect(again.state).toBe('notKept');
    expect(again.afterSeconds).toBe(again.beforeSeconds);
    expect(await stored(visit.id)).toEqual(before);
    const { fits, inForce } = await built.client.must(listFits);
    expect(fits.map(({ state }) => state)).toEqual(['notKept', 'kept']);
    expect(inForce).toEqual(fits[1]);
    const rows = await inBusiness(businessId, () => GroomFit.findAll({ where: { kept: false } }));
    expect(rows.map(({ pair }) => pair)).toEqual([null]);
  });

  it('tells of a pet what a booking would store, and each groomer’s pace', async () => {
    const told = (await learned(slow.pet.id))!;
    const forecast = await stored((await book(addDays(date, 4))).id);
    expect(told.words).toEqual(forecast.learning!.words);
    expect(told.petVisits).toBe(forecast.learning!.petVisits);
    expect(told.p10Seconds).toBeLessThan(told.medianSeconds);
    expect(told.medianSeconds).toBeLessThan(told.p90Seconds);
    // By name, whoever is quicker: people are not ranked.
    expect(told.byGroomer.map(({ groomerName }) => groomerName)).toEqual(['Ines', 'Mika']);
    const [late, quick] = told.byGroomer;
    expect(quick!.medianSeconds).toBeLessThan(told.medianSeconds);
    expect(late!.medianSeconds / quick!.medianSeconds).toBeGreaterThan(1.15);
    const { name } = built.groomers.find(({ id }) => id === ines)!;
    expect(late!.groomerName).toBe(name);
    expect(late!.words).toMatch(
      new RegExp(`^Learned from \\d+ visits with ${name}: \\d+ % slower`),
    );
  });

  it('answers before it has learned, and two calls at once run one fit', async () => {
    const before = (await built.client.must(listFits)).fits.length;
    const [one, two] = await Promise.all([
      built.client.must(learnMinutes),
      built.client.must(learnMinutes),
    ]);
    expect(one).toMatchObject({ state: 'working', records: 0 });
    expect(two.id).toBe(one.id);
    // The night finds it under way and leaves it alone.
    await learnOf(businessId, new Date());
    expect((await built.client.must(listFits)).fits).toHaveLength(before + 1);
    await vi.waitFor(
      async () => expect((await built.client.must(listFits)).fits[0]!.state).toBe('notKept'),
      { timeout: 10_000, interval: 100 },
    );
  });

  it('takes over from a process that went away', async () => {
    const lost = await inBusiness(businessId, async () => {
      const { row } = await openFit(businessId, new Date(Date.now() - leaseMs - 1000));
      return row.id;
    });
    const fit = await learn();
    expect(fit.state).toBe('notKept');
    const { fits } = await built.client.must(listFits);
    expect(fits.find(({ id }) => id === lost)!.state).toBe('failed');
  });

  it('learns at night for every business, and never from another one’s visits', async () => {
    const other = await buildBusiness(app, date);
    const before = (await built.client.must(listFits)).fits.length;
    await learnEverywhere(new Date());
    const mine = await built.client.must(listFits);
    expect(mine.fits).toHaveLength(before + 1);
    const theirs = (await other.client.must(listFits)).fits;
    expect(theirs).toHaveLength(1);
    expect(theirs[0]).toMatchObject({ records: 0, heldOut: 0, state: 'notKept' });
    const home = await addHousehold(other.client);
    const visit = await other.client.must(createVisit, {
      body: { householdId: home.household.id, date, petIds: [home.pet.id], promise: null },
    });
    expect(visit.learned).toBeUndefined();
  });
});

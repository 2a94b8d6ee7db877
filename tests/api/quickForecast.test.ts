import { app, useApp } from '../support/useApp.ts';
import { describe, expect, it } from 'vitest';
import { updateBusiness } from '#shared/api/business.ts';
import { getDay, moveVisit } from '#shared/api/days.ts';
import { quickForecast } from '#shared/api/forecasts.ts';
import { setShift } from '#shared/api/groomers.ts';
import { createStyle } from '#shared/api/styles.ts';
import { createVisit } from '#shared/api/visits.ts';
import { applyMove } from '#shared/schedule/applyMove.ts';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import { addDays } from '#shared/time/localDate.ts';
import { ApiClient } from '../support/apiClient.ts';
import { boardDay, versionsOf } from '../support/boardDay.ts';
import { addHousehold, buildBusiness } from '../support/buildBusiness.ts';
import { tomorrow } from '../support/tomorrow.ts';

useApp();

const date = tomorrow();
const bichon = {
  species: 'dog' as const,
  breedId: 'bichon-frise',
  weightGrams: 6000,
  styleId: 'teddy',
};
/** Beside the households of the test businesses, some kilometres from the depot. */
const here = { lat: 41.012, lon: -36.012 };

describe('minutes over the phone', () => {
  it('are those a booking of the same pet gets', async () => {
    const { client } = await buildBusiness(app, date);
    const { household, pet } = await addHousehold(client);
    const visit = await client.must(createVisit, {
      body: { householdId: household.id, date, petIds: [pet.id] },
    });
    const told = await client.must(quickForecast, { body: bichon });
    expect(told.steps.map((step) => [step.key, step.medianSeconds, step.reasons])).toEqual(
      visit.steps.map((step) => [step.key, step.medianSeconds, step.reasons]),
    );
    expect([told.p10Seconds, told.p90Seconds]).toEqual([visit.p10Seconds, visit.p90Seconds]);
    expect(told.p50Seconds).toBeGreaterThan(told.p10Seconds);
    expect(told.p50Seconds).toBeLessThan(told.p90Seconds);
    expect([told.setUpSeconds, told.cleanDownSeconds]).toEqual([360, 360]);
    expect(told.offers).toEqual([]);
    expect(told.noOfferWords).toBe('Add an address to see when a van could come.');
  });

  it('say when the coat does not allow the style, and follow a style of one’s own', async () => {
    const client = await new ApiClient(app).signUp();
    const pelted = await client.must(quickForecast, {
      body: { ...bichon, matting: 4, cautions: ['heart'] },
    });
    expect(pelted.cautions.map(({ key }) => key)).toEqual(
      expect.arrayContaining(['heart', 'skinAfterMats']),
    );
    expect(pelted.planChangeWords).not.toBeNull();
    const own = await client.must(createStyle, {
      body: {
        name: 'Nails at the door',
        species: 'dog',
        coats: ['curly'],
        cuts: {},
        finish: 'tidy',
        services: ['nails'],
      },
    });
    const nails = await client.must(quickForecast, { body: { ...bichon, styleId: own.id } });
    expect(nails.steps.map(({ key }) => key)).not.toContain('bath');
    expect(nails.p50Seconds).toBeLessThan(pelted.p50Seconds);
  });

  it('cost the call-out and the hour, to the whole unit; nothing until a price is set', async () => {
    const client = await new ApiClient(app).signUp();
    expect((await client.must(quickForecast, { body: bichon })).priceCents).toBeNull();
    const prices = { priceCentsPerHour: 6000, calloutCents: 1500 };
    expect(await client.must(updateBusiness, { body: prices })).toMatchObject(prices);
    const told = await client.must(quickForecast, { body: bichon });
    // 60 an hour is one a minute.
    const units = (seconds: number) => Math.round(15 + seconds / 60) * 100;
    expect(told.priceCents).toEqual({
      low: units(told.p10Seconds),
      usual: units(told.p50Seconds),
      high: units(told.p90Seconds),
    });
    expect(told.currency).toBe('EUR');
    const negative = await client.call(updateBusiness, { body: { calloutCents: -1 } });
    expect(negative.error.fields).toEqual({ calloutCents: 'must not be negative' });
  });

  it('are refused with the field named', async () => {
    const client = await new ApiClient(app).signUp();
    for (const [wrong, field] of [
      [{ breedId: 'wolf' }, 'breedId'],
      [{ styleId: 'cat-comb-out' }, 'styleId'],
      [{ temperament: 'feral' }, 'temperament'],
      [{ breedId: null, weightGrams: null }, 'weightGrams'],
      [{ breedId: null, weightGrams: 6000 }, 'coatType'],
      [{ lat: 41 }, 'lon'],
    ] as const) {
      const answer = await client.call(quickForecast, { body: { ...bichon, ...wrong } });
      expect([answer.status, Object.keys(answer.error.fields ?? {})]).toEqual([400, [field]]);
    }
  });
});

describe('offers over the phone', () => {
  it('of empty vans: the way there and back, at the start of the shift', async () => {
    const { client } = await buildBusiness(app, date);
    const { offers, noOfferWords } = await client.must(quickForecast, {
      body: { ...bichon, ...here },
    });
    expect(noOfferWords).toBeNull();
    expect(offers.map((offer) => [offer.date, offer.vanName, offer.groomerName])).toEqual([
      [date, 'Otter', 'Mika'],
      [date, 'Plover', 'Ines'],
    ]);
    for (const offer of offers) {
      // Shift from 8:00, ten minutes of loading, then the drive.
      expect(offer.startMinutes).toBeGreaterThanOrEqual(480);
      expect(offer.endMinutes - offer.startMinutes).toBe(120);
      expect(offer.rough).toBe(true);
      expect(offer.onTimePermille).toBeGreaterThanOrEqual(850);
      expect(offer.othersOnTimePermille).toBeNull();
    }
  });

  it('are what the board says once the visit is booked and placed like that', async () => {
    const board = await boardDay(app, ['Rook', 'Wren'], date);
    const { client, otter, place, read } = board;
    await place('Rook', otter);
    await place('Wren', otter);
    const before = await read();
    const { offers } = await client.must(quickForecast, { body: { ...bichon, ...here } });
    const offer = offers.find(({ vanId }) => vanId === otter)!;
    const { household, pet } = await addHousehold(client, here);
    const { startMinutes, endMinutes } = offer;
    const visit = await client.must(createVisit, {
      body: { householdId: household.id, date, petIds: [pet.id], promise: { startMinutes, endMinutes } },
    }); // prettier-ignore
    const seen = await Promise.all(
      [0, 1, 2].map(async (index) => {
        const day = await read();
        const move = { kind: 'placeVisit' as const, visitId: visit.id, vanId: otter, index };
        const times = evaluateDay(day.problem, applyMove(day.problem, day.plan, move).plan);
        const stop = times.runs.flatMap(({ stops }) => stops).find(({ stopId }) => stopId === visit.id)!; // prettier-ignore
        const then = evaluateDay(before.problem, before.plan);
        return [times.driveSeconds - then.driveSeconds, stop.onTimePermille];
      }),
    );
    expect(seen).toContainEqual([offer.driveSecondsMore, offer.onTimePermille]);
    // No place in this van costs less driving.
    expect(Math.min(...seen.map(([drive]) => drive!))).toBe(offer.driveSecondsMore);
    const placed = await client.must(moveVisit, {
      params: { date },
      body: {
        move: { kind: 'placeVisit', visitId: visit.id, vanId: otter, index: 0 },
        runVersions: versionsOf(await client.must(getDay, { params: { date } })),
      },
    });
    expect(placed.plan.notPlaced).toEqual([]);
  });

  it('come earliest first, at most two a day and six in all', async () => {
    const { client, vans, groomers } = await buildBusiness(app, date);
    for (const ahead of [1, 2, 3, 6])
      for (const i of [0, 1])
        await client.must(setShift, {
          body: {
            date: addDays(date, ahead),
            vanId: vans[i]!.id,
            groomerId: groomers[i]!.id,
            startMinutes: 480,
            endMinutes: 1020,
            mostOvertimeMinutes: 30,
            meal: null,
          },
        });
    const { offers } = await client.must(quickForecast, { body: { ...bichon, ...here } });
    expect(offers.map((offer) => offer.date)).toEqual(
      [0, 0, 1, 1, 2, 2].map((ahead) => addDays(date, ahead)),
    );
  });

  it('say why there is none: no shift, or nothing that fits', async () => {
    const alone = await new ApiClient(app).signUp();
    const none = await alone.must(quickForecast, { body: { ...bichon, ...here } });
    expect(none.noOfferWords).toMatch(/^No van has a shift/);
    const { client } = await buildBusiness(app, date);
    // Half the way round the world is no day's drive; nobody here may groom cats.
    const far = await client.must(quickForecast, { body: { ...bichon, lat: -41, lon: 140 } });
    expect([far.offers, far.noOfferWords]).toEqual([[], expect.stringMatching(/^Nothing fits/)]);
    const cat = { species: 'cat', breedId: 'persian', styleId: 'cat-comb-out', ...here };
    expect((await client.must(quickForecast, { body: cat })).offers).toEqual([]);
  });

  it('store nothing: no pet, no visit, no version', async () => {
    const { client, read } = await boardDay(app, ['Rook'], date);
    const before = await read();
    await client.must(quickForecast, { body: { ...bichon, ...here } });
    expect(await read()).toEqual(before);
  });
});

import { app, useApp } from '../support/useApp.ts';
import { describe, expect, it } from 'vitest';
import { getBusiness, updateBusiness } from '#shared/api/business.ts';
import { getDay } from '#shared/api/days.ts';
import {
  createPlace,
  listPlaces,
  removePlace,
  type Place,
  updatePlace,
} from '#shared/api/places.ts';
import { createVan, listVans, retireVan, updateVan } from '#shared/api/vans.ts';
import { addDays } from '#shared/time/localDate.ts';
import { inBusiness } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';
import { Shift } from '#server/models/Shift.ts';
import { ApiClient } from '../support/apiClient.ts';
import { boardDay } from '../support/boardDay.ts';
import { buildBusiness } from '../support/buildBusiness.ts';
import { tomorrow } from '../support/tomorrow.ts';

useApp({ area: true });

const date = tomorrow();
const vanFields = (place: Place) => ({
  name: 'Heron',
  shape: 'cross' as const,
  startPlaceId: place.id,
  endPlaceId: place.id,
  tanks: [],
  tableLimitGrams: 50_000,
});

describe('the business', () => {
  it('changes what is named and leaves the rest', async () => {
    const client = await new ApiClient(app).signUp();
    const before = await client.must(getBusiness);
    const body = {
      timeZone: 'Europe/Lisbon',
      currency: ' usd ',
      distanceUnit: 'mi' as const,
      areaName: 'pellan-bay',
      deskPhone: '+44 7700 900000',
      setUpMinutes: 9,
    };
    const after = await client.must(updateBusiness, { body });
    expect(after).toEqual({ ...before, ...body, currency: 'USD', deskPhone: '+447700900000' });
    expect(await client.must(getBusiness)).toEqual(after);
    expect((await client.renew()).business).toMatchObject({
      timeZone: 'Europe/Lisbon',
      areaName: 'pellan-bay',
      areaVersion: expect.stringMatching(/^\w+$/) as string,
    });
  });

  it('names what is wrong: zone, currency, area, minutes', async () => {
    const client = await new ApiClient(app).signUp();
    const answer = await client.call(updateBusiness, {
      body: {
        timeZone: 'Europe/Atlantis',
        currency: 'euro',
        setUpMinutes: 61,
        name: '',
        senderPhone: '555',
      },
    });
    expect(Object.keys(answer.error.fields!).sort()).toEqual([
      'currency',
      'name',
      'senderPhone',
      'setUpMinutes',
      'timeZone',
    ]);
    for (const areaName of ['atlantis', '../../etc', 'Pellan Bay'])
      expect((await client.call(updateBusiness, { body: { areaName } })).error.fields).toEqual({
        areaName: 'must be an imported area (pellan-bay)',
      });
  });

  it('never shares the number texts come from', async () => {
    const one = await new ApiClient(app).signUp();
    const two = await new ApiClient(app).signUp();
    const body = { senderPhone: '+15005550006' };
    await one.must(updateBusiness, { body });
    expect((await two.call(updateBusiness, { body })).error.fields).toEqual({
      senderPhone: 'is another business’s number',
    });
    await one.must(updateBusiness, { body });
    await one.must(updateBusiness, { body: { senderPhone: null } });
    expect((await two.must(updateBusiness, { body })).senderPhone).toBe('+15005550006');
  });
});

describe('places', () => {
  it('open before they close, also when only one of the two is changed', async () => {
    const client = await new ApiClient(app).signUp();
    const fields = { kind: 'waterFill' as const, name: 'Tap', lat: 41, lon: -36 };
    const bad = await client.call(createPlace, {
      body: { ...fields, opensMinutes: 600, closesMinutes: 600 },
    });
    expect(bad.error.fields).toEqual({ closesMinutes: 'must open before it closes' });
    const place = await client.must(createPlace, {
      body: { ...fields, opensMinutes: 480, closesMinutes: 1020 },
    });
    const params = { placeId: place.id };
    const late = await client.call(updatePlace, { params, body: { opensMinutes: 1020 } });
    expect(late.error.fields).toEqual({ closesMinutes: 'must open before it closes' });
    expect(await client.must(updatePlace, { params, body: { name: 'Old tap' } })).toEqual({
      ...place,
      name: 'Old tap',
    });
    await client.must(removePlace, { params });
    expect(await client.must(listPlaces)).toEqual([]);
    expect((await client.call(removePlace, { params })).status).toBe(404);
  });

  it('stay while a van starts or ends there', async () => {
    const { client, depot } = await buildBusiness(app, date);
    const answer = await client.call(removePlace, { params: { placeId: depot.id } });
    expect(answer.error).toMatchObject({ code: 'alreadyThere' });
    expect(answer.error.message).toMatch(/starts or ends at Yard/);
  });

  it('a removed water place leaves the draft that had a refill there workable', async () => {
    const { client, vans, otter, place, read } = await boardDay(app, ['Rook', 'Wren', 'Sorrel']);
    const tap = await client.must(createPlace, {
      body: { kind: 'waterFill', name: 'Tap', lat: 41.005, lon: -36 },
    });
    await client.must(updateVan, {
      params: { vanId: vans[0]!.id },
      body: { tanks: [{ kind: 'fresh', capacityMl: 25_000 }] },
    });
    await place('Rook', otter);
    await place('Wren', otter);
    const kinds = async () => (await read()).plan.runs[0]!.stops.map((stop) => stop.kind);
    expect(await kinds()).toEqual(['visit', 'refill', 'visit']);
    await client.must(removePlace, { params: { placeId: tap.id } });
    expect(await kinds()).toEqual(['visit', 'visit']);
    await place('Sorrel', otter);
    expect(await kinds()).toEqual(['visit', 'visit', 'visit']);
  });
});

describe('vans', () => {
  it('are created and changed with places of the business only', async () => {
    const { client, depot, vans } = await buildBusiness(app, date);
    const stranger = await buildBusiness(app, date);
    const body = vanFields(depot);
    for (const id of [newId(), stranger.depot.id]) {
      const made = await client.call(createVan, { body: { ...body, startPlaceId: id } });
      expect(made.error.fields).toEqual({ startPlaceId: 'must be a place of this business' });
      const changed = await client.call(updateVan, {
        params: { vanId: vans[0]!.id },
        body: { endPlaceId: id },
      });
      expect(changed.error.fields).toEqual({ endPlaceId: 'must be a place of this business' });
    }
    const van = await client.must(createVan, { body });
    const params = { vanId: van.id };
    const lighter = await client.must(updateVan, { params, body: { tableLimitGrams: 20_000 } });
    expect(lighter).toEqual({ ...van, tableLimitGrams: 20_000 });
    expect((await client.must(listVans)).map((one) => one.name)).toEqual([
      'Heron',
      'Otter',
      'Plover',
    ]);
  });

  it('bear different names, and name each tank once', async () => {
    const { client, depot, vans } = await buildBusiness(app, date);
    const twin = await client.call(createVan, { body: { ...vanFields(depot), name: ' otter ' } });
    expect(twin.error).toMatchObject({
      code: 'alreadyThere',
      fields: { name: 'is already taken' },
    });
    const params = { vanId: vans[1]!.id };
    const renamed = await client.call(updateVan, { params, body: { name: 'Otter' } });
    expect(renamed.error.fields).toEqual({ name: 'is already taken' });
    await client.must(updateVan, { params, body: { name: 'Plover' } });
    const fresh = { kind: 'fresh' as const, capacityMl: 100_000 };
    const tanks = await client.call(updateVan, { params, body: { tanks: [fresh, fresh] } });
    expect(tanks.error.fields).toEqual({ tanks: 'must name each tank once' });
    const tiny = await client.call(updateVan, {
      params,
      body: { tanks: [{ ...fresh, capacityMl: 1 }] },
    });
    expect(tiny.error.fields).toEqual({ 'tanks.0.capacityMl': 'must be 1 litre or more' });
  });

  it('retire only without visits ahead, with their empty shifts, and free their name', async () => {
    const { client, date, depot, otter, plover, place, move, visits, read } = await boardDay(app, [
      'Rook',
    ]);
    await place('Rook', otter);
    const refused = await client.call(retireVan, { params: { vanId: otter } });
    expect(refused.error.message).toBe(`Otter still has visits on ${date}. Move them first.`);
    await client.must(retireVan, { params: { vanId: plover } });
    expect((await read()).runs.map((run) => run.vanName)).toEqual(['Otter']);
    await move({ kind: 'unplaceVisit', visitId: visits.Rook! });
    await client.must(retireVan, { params: { vanId: otter } });
    expect(await client.must(listVans)).toEqual([]);
    const day = await client.must(getDay, { params: { date } });
    expect([day.runs, day.plan]).toEqual([[], { runs: [], notPlaced: [visits.Rook] }]);
    const shifts = await inBusiness(client.session!.business.id, () => Shift.findAll());
    expect(shifts.filter((shift) => shift.date >= addDays(date, -1))).toEqual([]);
    await client.must(createVan, { body: { ...vanFields(depot), name: 'Otter' } });
  });
});

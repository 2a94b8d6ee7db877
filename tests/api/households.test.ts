import { app, useApp } from '../support/useApp.ts';
import { describe, expect, it } from 'vitest';
import {
  createHousehold,
  createSite,
  getHousehold,
  type Household,
  listHouseholds,
  listSites,
  removeSite,
  updateHousehold,
  updateSite,
} from '#shared/api/households.ts';
import { inBusiness } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';
import { Household as HouseholdRow } from '#server/models/Household.ts';
import { ApiClient } from '../support/apiClient.ts';
import { addHousehold } from '../support/buildBusiness.ts';

useApp();

const signedUp = () => new ApiClient(app).signUp();

const fields = {
  name: 'Adeyemi',
  addressLabel: '14 Heron Lane',
  lat: 41.01,
  lon: -36.01,
  contactName: 'Ade',
};

describe('a household', () => {
  it('is created with defaults, and a change of one field leaves all others', async () => {
    const client = await signedUp();
    const made = await client.must(createHousehold, {
      body: {
        ...fields,
        accessNotes: 'Blue door',
        handoverNotes: 'To Ade only',
        phone: '+44 7700 900-123',
        textsConsent: true,
        secondContactName: 'Bo',
        secondContactPhone: '+447700900124',
        gateCode: '4711#',
      },
    });
    expect(made).toMatchObject({ phone: '+447700900123', hasGateCode: true, siteId: null });
    const params = { householdId: made.id };
    const changed = await client.must(updateHousehold, {
      params,
      body: { name: 'Adeyemi-Bright' },
    });
    expect(changed).toEqual({ ...made, name: 'Adeyemi-Bright' });
    expect(await client.must(updateHousehold, { params, body: {} })).toEqual(changed);
    const cleared = await client.must(updateHousehold, {
      params,
      body: { gateCode: null, phone: null },
    });
    expect(cleared).toEqual({ ...changed, hasGateCode: false, phone: null });
    expect((await client.must(getHousehold, { params })).household).toEqual(cleared);
  });

  it('names every field that is wrong', async () => {
    const client = await signedUp();
    const answer = await client.call(createHousehold, {
      body: {
        ...fields,
        name: '  ',
        phone: '07700 900123',
        lat: 91,
        secondContactPhone: '+1',
        siteId: 'x',
        accessNotes: 'x'.repeat(2001),
      },
    });
    expect(answer.error.fields).toEqual({
      name: 'must not be empty',
      phone: 'must start with + and the country code, like +14155552671',
      lat: 'must be a latitude',
      secondContactPhone: 'must start with + and the country code, like +14155552671',
      siteId: 'must be an id',
      accessNotes: 'must be 2,000 letters or fewer',
    });
    const foreign = await client.call(createHousehold, { body: { ...fields, siteId: newId() } });
    expect(foreign.error.fields).toEqual({ siteId: 'must be a site of this business' });
    expect((await client.must(listHouseholds)).total).toBe(0);
  });

  it('dates consent when it is given and when it is withdrawn, not when it stays', async () => {
    const client = await signedUp();
    const none = await client.must(createHousehold, { body: fields });
    expect(none.consentChangedAt).toBeNull();
    const params = { householdId: none.id };
    const set = (textsConsent: boolean) =>
      client.must(updateHousehold, { params, body: { textsConsent } });
    const given = (await set(true)).consentChangedAt!;
    expect(Math.abs(Date.parse(given) - Date.now())).toBeLessThan(5000);
    expect((await set(true)).consentChangedAt).toBe(given);
    expect(
      (await client.must(updateHousehold, { params, body: { name: 'B' } })).consentChangedAt,
    ).toBe(given);
    const withdrawn = (await set(false)).consentChangedAt!;
    expect(Date.parse(withdrawn)).toBeGreaterThan(Date.parse(given));
  });
});

describe('listHouseholds', () => {
  it('finds by name, street, contact, pet and phone, with wildcards as plain letters', async () => {
    const client = await signedUp();
    const named: [string, Partial<Household>][] = [
      ['Müller', { contactName: 'Jörg', addressLabel: '1 Quay' }],
      ['50% off', { phone: '+447700900555' }],
      ['under_score', {}],
      ['underXscore', {}],
      ['back\\slash', {}],
      ["O'Neill", {}],
    ];
    for (const [name, more] of named)
      await client.must(createHousehold, { body: { ...fields, name, ...more } });
    await addHousehold(client, { name: 'Petful' });
    const find = async (text: string) =>
      (await client.must(listHouseholds, { query: { text } })).households.map((one) => one.name);
    expect(await find('muller')).toEqual(['Müller']);
    expect(await find('JÖRG')).toEqual(['Müller']);
    expect(await find('1 quay')).toEqual(['Müller']);
    expect(await find('%')).toEqual(['50% off']);
    expect(await find('_')).toEqual(['under_score']);
    expect(await find('r_s')).toEqual(['under_score']);
    expect(await find('\\')).toEqual(['back\\slash']);
    expect(await find("o'ne")).toEqual(["O'Neill"]);
    expect(await find("' OR 1=1 -- ")).toEqual([]);
    expect(await find('clover')).toEqual(['Petful']);
    for (const phone of ['900555', '+44 7700 900 555', '07700 900555', '(0) 7700-900555'])
      expect(await find(phone)).toEqual(['50% off']);
    expect(await find('55')).toEqual([]);
    expect((await client.call(listHouseholds, { query: { text: 'x'.repeat(81) } })).status).toBe(
      400,
    );
  });

  it('gives 25 a page in name order, each household once, and empty pages past the end', async () => {
    const client = await signedUp();
    const businessId = client.session!.business.id;
    // Same names, so that only the id decides between them.
    await inBusiness(businessId, () =>
      HouseholdRow.bulkCreate(
        Array.from({ length: 53 }, (_one, index) => ({
          ...fields,
          name: `Family ${index % 3}`,
          accessNotes: '',
          handoverNotes: '',
          createdAt: new Date(),
        })),
      ),
    );
    const pages = await Promise.all(
      [1, 2, 3, 4].map((page) => client.must(listHouseholds, { query: { page } })),
    );
    expect(pages.map((page) => page.households.length)).toEqual([25, 25, 3, 0]);
    expect(pages.map((page) => page.total)).toEqual([53, 53, 53, 53]);
    const all = pages.flatMap((page) => page.households);
    expect(new Set(all.map((one) => one.id)).size).toBe(53);
    expect(all.map((one) => one.name)).toEqual(all.map((one) => one.name).sort());
  });
});

describe('a site', () => {
  it('keeps its code under a change of notes, counts its households, and goes only when empty', async () => {
    const client = await signedUp();
    const site = await client.must(createSite, {
      body: { name: 'Court', lat: 41, lon: -36, gateCode: '1' },
    });
    const params = { siteId: site.id };
    const named = await client.must(updateSite, { params, body: { name: 'Old Court' } });
    expect(named).toEqual({ ...site, name: 'Old Court' });
    const home = await client.must(createHousehold, { body: { ...fields, siteId: site.id } });
    expect(await client.must(listSites)).toEqual([{ ...named, householdCount: 1 }]);
    const refused = await client.call(removeSite, { params });
    expect(refused.error).toMatchObject({ code: 'alreadyThere' });
    expect(refused.error.message).toMatch(/^1 household is at Old Court\./);
    await client.must(updateHousehold, {
      params: { householdId: home.id },
      body: { siteId: null },
    });
    await client.must(removeSite, { params });
    expect(await client.must(listSites)).toEqual([]);
    expect((await client.call(removeSite, { params })).status).toBe(404);
  });
});

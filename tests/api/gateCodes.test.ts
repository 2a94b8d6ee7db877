import { app, useApp } from '../support/useApp.ts';
import { describe, expect, it } from 'vitest';
import {
  createHousehold,
  createSite,
  openGate,
  updateHousehold,
  updateSite,
} from '#shared/api/households.ts';
import { clock } from '#server/clock.ts';
import { inBusiness } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';
import { boundEndpoints } from '#server/http/endpointList.ts';
import { GateOpening } from '#server/models/GateOpening.ts';
import { Household as HouseholdRow } from '#server/models/Household.ts';
import { Site } from '#server/models/Site.ts';
import { ApiClient } from '../support/apiClient.ts';
import { workDay } from '../support/workDay.ts';

useApp();

const fields = {
  name: 'Adeyemi',
  addressLabel: '14 Heron Lane',
  lat: 41.01,
  lon: -36.01,
  contactName: 'Ade',
};

describe('gate codes', () => {
  it('are sealed in the table, opened only by openGate, and every opening is logged', async () => {
    const client = await new ApiClient(app).signUp();
    const businessId = client.session!.business.id;
    const site = await client.must(createSite, {
      body: { name: 'Court', lat: 41, lon: -36, gateCode: 'SITE-8812' },
    });
    const one = await client.must(createHousehold, {
      body: { ...fields, gateCode: 'HOME-4711', siteId: site.id },
    });
    const two = await client.must(createHousehold, { body: { ...fields, gateCode: 'HOME-4711' } });
    const rows = await inBusiness(businessId, async () => [
      ...(await HouseholdRow.findAll()),
      ...(await Site.findAll()),
    ]);
    const sealed = rows.map((row) => row.gateCodeSealed!);
    expect(sealed.every((text) => text.length > 30)).toBe(true);
    expect(JSON.stringify(rows)).not.toMatch(/4711|8812/);
    // The same code in two rows is sealed differently.
    expect(new Set(sealed).size).toBe(3);
    const open = (householdId: string) => client.must(openGate, { params: { householdId } });
    expect(await open(one.id)).toEqual({ gateCode: 'HOME-4711', siteGateCode: 'SITE-8812' });
    expect(await open(two.id)).toEqual({ gateCode: 'HOME-4711', siteGateCode: null });
    const openings = await inBusiness(businessId, () => GateOpening.findAll({ order: ['at'] }));
    expect(openings.map((row) => [row.householdId, row.userId])).toEqual([
      [one.id, client.session!.user.id],
      [two.id, client.session!.user.id],
    ]);
    // A seal moved to another row does not open there.
    await inBusiness(businessId, () =>
      HouseholdRow.update({ gateCodeSealed: sealed[0]! }, { where: { id: two.id } }),
    );
    const moved = await client.call(openGate, { params: { householdId: two.id } });
    expect([moved.status, moved.text.includes('4711')]).toEqual([500, false]);
  });

  it('are in no answer of any other endpoint, nor what a groomer may not see', async () => {
    try {
      const work = await workDay(app, [{ petName: 'Rook' }]);
      const { client, date, runId, otter, groomerId, depot } = work;
      const { household, pet, visit } = work.visits.Rook!;
      const site = await client.must(createSite, {
        body: { name: 'Court', lat: 41, lon: -36, gateCode: 'SITE-8812' },
      });
      await client.must(updateHousehold, {
        params: { householdId: household.id },
        body: { gateCode: 'HOME-4711', siteId: site.id },
      });
      const ids: Record<string, string> = {
        date,
        runId,
        vanId: otter,
        groomerId,
        placeId: depot.id,
        householdId: household.id,
        petId: pet.id,
        visitId: visit.id,
        siteId: site.id,
        proposalId: newId(),
      };
      let asked = 0;
      for (const { endpoint } of boundEndpoints()) {
        if (endpoint.method !== 'GET' || endpoint.path.includes(':token')) continue;
        const answer = await client.call(endpoint, {
          params: ids,
          query: { from: date, to: date },
        });
        expect(answer.text, `${endpoint.path}`).not.toMatch(/4711|8812|gateCodeSealed/);
        asked += Number(answer.status === 200);
      }
      expect(asked).toBeGreaterThan(15);
      const changed = await client.call(updateSite, {
        params: { siteId: site.id },
        body: { gateCode: 'SITE-8812', parkingNotes: 'Bay 2' },
      });
      expect(changed.body).toMatchObject({ hasGateCode: true, parkingNotes: 'Bay 2' });
      expect(changed.text).not.toContain('8812');
    } finally {
      clock.offsetMs = 0;
    }
  });
});

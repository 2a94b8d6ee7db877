import { dropDatabase, makeDatabase } from '../support/freshDatabase.ts';
import type { Express } from 'express';
import sharp from 'sharp';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { getDay, moveVisit, sendRuns, startProposal } from '#shared/api/days.ts';
import { createSite, getHousehold, listHouseholds } from '#shared/api/households.ts';
import { listShifts } from '#shared/api/groomers.ts';
import { createPet } from '#shared/api/pets.ts';
import { createStyle } from '#shared/api/styles.ts';
import { createVan } from '#shared/api/vans.ts';
import { createVisit } from '#shared/api/visits.ts';
import { buildApp } from '#server/app.ts';
import { inBusiness } from '#server/db/database.ts';
import { boundEndpoints } from '#server/http/endpointList.ts';
import { Household } from '#server/models/Household.ts';
import { Van } from '#server/models/Van.ts';
import { ApiClient } from '../support/apiClient.ts';
import { addVisit, buildBusiness } from '../support/buildBusiness.ts';
import { tomorrow } from '../support/tomorrow.ts';

let app: Express;
const date = tomorrow();

beforeAll(async () => {
  await makeDatabase();
  app = buildApp();
});
afterAll(dropDatabase);

const ownStyle = {
  name: 'Nails at the door',
  species: 'dog' as const,
  coats: ['curly' as const],
  cuts: {},
  finish: 'tidy' as const,
  services: ['nails' as const],
};

const aPicture = () =>
  sharp({ create: { width: 8, height: 8, channels: 3, background: '#a0522d' } })
    .png()
    .toBuffer();

/** Every kind of thing one business can have, by the name its id has in a path. */
async function everything() {
  const { client, vans, groomers, depot } = await buildBusiness(app, date);
  const { household, pet, visit } = await addVisit(client, date);
  const day = await client.must(moveVisit, {
    params: { date },
    body: {
      move: { kind: 'placeVisit', visitId: visit.id, vanId: vans[0]!.id, index: 0 },
      runVersions: versionsOf(await client.must(getDay, { params: { date } })),
    },
  });
  await client.must(sendRuns, { params: { date }, body: { runVersions: versionsOf(day) } });
  const site = await client.must(createSite, { body: { name: 'Court', lat: 41, lon: -36 } });
  const [shift] = await client.must(listShifts, { query: { from: date, to: date } });
  const style = await client.must(createStyle, { body: ownStyle });
  const photo = await client.agent
    .post(`/api/pets/${pet.id}/styles/1/photos`)
    .set('X-Furlong-Csrf', client.session!.csrfToken)
    .attach('photo', await aPicture(), 'clover.png');
  const proposal = await client.must(startProposal, { params: { date }, body: { seconds: 1 } });
  return {
    client,
    ids: {
      householdId: household.id,
      petId: pet.id,
      visitId: visit.id,
      vanId: vans[0]!.id,
      groomerId: groomers[0]!.id,
      placeId: depot.id,
      siteId: site.id,
      shiftId: shift!.id,
      runId: day.runs[0]!.runId,
      proposalId: proposal.id,
      styleId: style.id,
      photoId: (photo.body as { id: string }).id,
      version: '1',
      userId: client.session!.user.id,
      invitationId: household.id,
      date,
    } as Record<string, string>,
  };
}

function versionsOf(day: { runs: { vanId: string; version: number }[] }): Record<string, number> {
  return Object.fromEntries(day.runs.map((run) => [run.vanId, run.version]));
}

/** A body that would be fine, so that only the foreign id can be the reason for a refusal. */
const bodies: Record<string, unknown> = {
  '/api/households/:householdId/pets': {
    name: 'Pip',
    species: 'dog',
    breedId: 'bichon-frise',
    weightGrams: 5000,
    styleId: 'teddy',
  },
  '/api/pets/:petId/styles': { styleId: 'teddy' },
  '/api/visits/:visitId/cancel': { reason: 'test' },
  '/api/members/:userId': { roles: ['groomer'] },
  '/api/days/:date/pins/:visitId': { vanId: null },
  '/api/runs/:runId/events': {
    events: [
      {
        id: '01890000-0000-7000-8000-000000000001',
        v: 1,
        deviceId: '01890000-0000-7000-8000-000000000002',
        deviceSeq: 0,
        deviceAt: new Date().toISOString(),
        offsetMs: 0,
        runVersion: 1,
        stopId: 'x',
        kind: 'arrived',
      },
    ],
  },
  '/api/runs/:runId/fixes': { lat: 41, lon: -36, at: new Date().toISOString(), accuracyMetres: 5 },
};

describe('another business', () => {
  it('sees a 404 for every id of every endpoint that names one', async () => {
    const mine = await everything();
    const stranger = (await buildBusiness(app, date)).client;
    const tried: string[] = [];
    for (const { endpoint, ability } of boundEndpoints()) {
      const names = [...endpoint.path.matchAll(/:(\w+)/g)].map((match) => match[1]!);
      const ids = names.filter((name) => name !== 'date');
      if (ability === 'public' || ids.length === 0) continue;
      const params = Object.fromEntries(names.map((name) => [name, mine.ids[name]!]));
      expect(Object.values(params).every(Boolean), `no sample for ${endpoint.path}`).toBe(true);
      const answer = await stranger.call(endpoint, {
        params,
        body: (bodies[endpoint.path] ?? {}) as never,
      });
      expect(answer.status, `${endpoint.method} ${endpoint.path}: ${answer.text}`).toBe(404);
      tried.push(endpoint.path);
    }
    expect(tried.length).toBeGreaterThan(20);
  }, 60_000);

  it('cannot name foreign ids in a body', async () => {
    const mine = await everything();
    const { client: stranger, vans } = await buildBusiness(app, date);
    const own = await addVisit(stranger, date);
    const day = await stranger.must(getDay, { params: { date } });
    const answers = await Promise.all([
      stranger.call(createVisit, {
        body: { householdId: mine.ids.householdId!, date, petIds: [mine.ids.petId!] },
      }),
      stranger.call(createVisit, {
        body: { householdId: own.household.id, date, petIds: [mine.ids.petId!] },
      }),
      stranger.call(createVan, {
        body: {
          name: 'Heron',
          shape: 'cross',
          startPlaceId: mine.ids.placeId!,
          endPlaceId: mine.ids.placeId!,
          tanks: [],
          tableLimitGrams: 50_000,
        },
      }),
      stranger.call(createPet, {
        params: { householdId: mine.ids.householdId! },
        body: bodies['/api/households/:householdId/pets'] as never,
      }),
      stranger.call(moveVisit, {
        params: { date },
        body: {
          move: { kind: 'placeVisit', visitId: mine.ids.visitId!, vanId: vans[0]!.id, index: 0 },
          runVersions: versionsOf(day),
        },
      }),
      stranger.call(moveVisit, {
        params: { date },
        body: {
          move: { kind: 'placeVisit', visitId: own.visit.id, vanId: mine.ids.vanId!, index: 0 },
          runVersions: versionsOf(day),
        },
      }),
      stranger.call(sendRuns, {
        params: { date },
        body: { vanIds: [mine.ids.vanId!], runVersions: {} },
      }),
    ]);
    expect(answers.map((answer) => answer.status)).toEqual([404, 400, 400, 404, 404, 404, 400]);
  });

  it('sees only its own lists', async () => {
    await everything();
    const stranger = (await buildBusiness(app, date)).client;
    expect((await stranger.must(listHouseholds)).total).toBe(0);
    expect((await stranger.must(getDay, { params: { date } })).visits).toEqual([]);
  });
});

describe('the scope', () => {
  it('refuses to touch a business table outside inBusiness', async () => {
    await expect(Van.findAll()).rejects.toThrow('Van was touched outside inBusiness');
    await expect(Van.count()).rejects.toThrow('outside inBusiness');
    await expect(Van.update({ name: 'x' }, { where: {} })).rejects.toThrow('outside inBusiness');
    await expect(Van.destroy({ where: {} })).rejects.toThrow('outside inBusiness');
  });

  it('rolls everything back when a use-case throws', async () => {
    const { client } = await buildBusiness(app, date);
    const businessId = client.session!.business.id;
    await expect(
      inBusiness(businessId, async () => {
        await Household.update({ name: 'x' }, { where: {} });
        await Van.update({ name: 'Changed' }, { where: {} });
        throw new Error('half-way');
      }),
    ).rejects.toThrow('half-way');
    const names = await inBusiness(businessId, async () =>
      (await Van.findAll()).map((van) => van.name),
    );
    expect(names.sort()).toEqual(['Otter', 'Plover']);
  });

  it('cannot open one business inside another', async () => {
    const one = (await new ApiClient(app).signUp()).session!.business.id;
    const two = (await new ApiClient(app).signUp()).session!.business.id;
    await expect(inBusiness(one, () => inBusiness(two, async () => 1))).rejects.toThrow(
      'inside another',
    );
  });
});

describe('without a sign-in', () => {
  it('answers 401 on every endpoint that is not public', async () => {
    for (const { endpoint, ability } of boundEndpoints()) {
      if (ability === 'public') continue;
      const path = endpoint.path.replace(/:\w+/g, '01890000-0000-7000-8000-000000000001');
      const method = endpoint.method.toLowerCase() as 'get';
      const answer = await request(app)[method](path);
      expect(answer.status, `${endpoint.method} ${endpoint.path}`).toBe(401);
    }
  });

  it('serves every bound endpoint in the OpenAPI page', async () => {
    const answer = await request(app).get('/api/docs');
    const paths = answer.body as { openapi: string; paths: Record<string, unknown> };
    expect(paths.openapi).toBe('3.1.0');
    expect(Object.keys(paths.paths).length).toBeGreaterThan(40);
    expect(paths.paths['/api/households/{householdId}']).toHaveProperty('get');
    expect(getHousehold.path).toBe('/api/households/:householdId');
  });
});

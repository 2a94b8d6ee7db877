import { app, useApp } from '../support/useApp.ts';
import request from 'supertest';
import { afterEach, describe, expect, it } from 'vitest';
import { getArrival } from '#shared/api/arrival.ts';
import { updateHousehold } from '#shared/api/households.ts';
import { updatePet } from '#shared/api/pets.ts';
import { addRunFix } from '#shared/api/runs.ts';
import { distanceMetres } from '#shared/travel/distanceMetres.ts';
import { clock } from '#server/clock.ts';
import { inBusiness } from '#server/db/database.ts';
import { ArrivalLink } from '#server/models/ArrivalLink.ts';
import { ApiClient } from '../support/apiClient.ts';
import { instantAt, setClock } from '../support/setClock.ts';
import { workDay } from '../support/workDay.ts';

useApp({ carriers: true, area: true });
afterEach(() => {
  clock.offsetMs = 0;
});

const promise = { startMinutes: 480, endMinutes: 600 };
const depot = { lat: 41, lon: -36 };

/** A day in the made-up town, the van on its way to Rook since 8:10, and the link Rook's people got. */
async function onTheWay(petName = 'Rook', businessName = 'Saltmarsh') {
  const work = await workDay(
    app,
    [
      { petName, promise },
      { petName: 'Wren', promise: { startMinutes: 660, endMinutes: 720 } },
    ],
    { areaName: 'pellan-bay', name: businessName, deskPhone: '+447700900999' },
  );
  await work.at('8:10');
  await work.post([work.phone('startDriving', work.stopOf(petName), '8:10')]);
  const tokenOf = async (index: number) => (await work.texts())[index]!.body.split('/a/')[1]!;
  const token = await tokenOf(0);
  // Nobody signs in for this page.
  const look = (of = token) => new ApiClient(app).call(getArrival, { params: { token: of } });
  const page = (of = token) => request(app).get(`/a/${of}`);
  const fix = (wall: string, place: { lat: number; lon: number }) =>
    work.client.must(addRunFix, {
      params: { runId: work.runId },
      body: {
        lat: place.lat,
        lon: place.lon,
        at: instantAt(work.date, wall).toISOString(),
        accuracyMetres: 8,
      },
    });
  return { ...work, token, tokenOf, look, page, fix };
}

describe('the arrival page', () => {
  it('opens from the link in the text, its sentence in the HTML, never cached or referred', async () => {
    const { look, page } = await onTheWay();
    const { body } = await look();
    expect(body.headline).toMatch(/^Open the door 8:\d\d–8:\d\d$/);
    expect(body.sentence).toContain('Mika is on the way to Rook in van Otter.');
    expect(body.promiseWords).toBe('You were told 8:00–10:00');
    const html = await page();
    expect(html.status).toBe(200);
    expect(html.headers['content-type']).toContain('text/html');
    expect(html.headers['cache-control']).toBe('no-store');
    expect(html.headers['referrer-policy']).toBe('no-referrer');
    expect(html.text).toContain(`<title>${body.headline} · Saltmarsh</title>`);
    for (const line of [body.headline, body.sentence, body.promiseWords!])
      expect(html.text).toContain(line);
    expect((await look()).headers['cache-control']).toBe('no-store');
  });

  it('knows nothing of other households, and no address, phone, code, note or caution', async () => {
    const work = await onTheWay();
    const { household, pet } = work.visits.Rook!;
    await work.client.must(updateHousehold, {
      params: { householdId: household.id },
      body: { gateCode: '4711#', accessNotes: 'Ring at the blue door', handoverNotes: 'To Ade' },
    });
    await work.client.must(updatePet, {
      params: { petId: pet.id },
      body: { cautions: ['seizures'], cautionNote: 'Bites when lifted', vetName: 'Dr Lark' },
    });
    const seen = JSON.stringify((await work.look()).body) + (await work.page()).text;
    for (const secret of [
      'Wren',
      'Rook Lane',
      'Keeper of Rook',
      '900123',
      '4711',
      'blue door',
      'To Ade',
      'seizures',
      'Bites',
      'Lark',
      work.visits.Wren!.household.id,
      household.id,
      work.businessId,
    ])
      expect(seen).not.toContain(secret);
    expect(seen).toContain('+447700900999');
  });

  it('escapes names that try to be HTML', async () => {
    const evil = '</script><b onclick="x">&amp;';
    const { page, look } = await onTheWay(evil, `<i>Salt</i> "& Sons"`);
    const html = (await page()).text;
    expect(html).not.toContain('</script><b');
    expect(html).not.toContain('<b onclick');
    expect(html).not.toContain('<i>Salt');
    expect(html).toContain('&lt;i&gt;Salt&lt;/i&gt; &quot;&amp; Sons&quot;');
    expect((await look()).body.petNames).toBe(evil);
    const data = /id="arrival-data">([\s\S]*?)<\/script>/.exec(html);
    // Only the built page carries data; without a build there is none to check.
    if (data) expect(JSON.parse(data[1]!)).toMatchObject({ petNames: evil });
  });

  it('tells an unknown link from an expired one, in words, by page and by call', async () => {
    const { look, page, token, date } = await onTheWay();
    for (const unknown of ['A'.repeat(22), `${token.slice(1)}A`]) {
      expect((await look(unknown)).status).toBe(404);
      const html = await page(unknown);
      expect(html.status).toBe(404);
      expect(html.text).toContain('This link is not one of ours. Look at the text again.');
    }
    expect((await look('short')).status).toBe(404);
    expect((await page('%3Cb%3E')).status).toBe(404);
    setClock(date, '20:09');
    expect((await look()).status).toBe(200);
    clock.offsetMs += 24 * 3_600_000 + 2 * 60_000;
    const late = await look();
    expect(late.status).toBe(410);
    expect(late.error.code).toBe('linkUsedUp');
    const html = await page();
    expect(html.status).toBe(410);
    expect(html.headers['cache-control']).toBe('no-store');
    expect(html.text).toContain('This link has expired. The visit is over.');
    expect(html.text).not.toContain('Rook');
  });
});

describe('its states', () => {
  it('follow the taps: on the way, arrived, done', async () => {
    const { look, at, post, phone, stopOf } = await onTheWay();
    expect((await look()).body.state).toBe('onTheWay');
    await at('8:16');
    await post([phone('arrived', stopOf('Rook'), '8:16')]);
    const arrived = (await look()).body;
    expect(arrived).toMatchObject({ state: 'arrived', headline: 'Mika is with you', van: null });
    expect(arrived.sentence).toContain('Arrived 8:16.');
    await at('9:31');
    await post([phone('stopDone', stopOf('Rook'), '9:30', { note: 'secret note' })]);
    const done = (await look()).body;
    expect(done).toMatchObject({ state: 'done', headline: 'Rook is done', van: null });
    expect(done.sentence).toContain('Mika finished at 9:30.');
    expect(JSON.stringify(done)).not.toContain('secret note');
  });

  it('are planned again when the van turns to another stop, and not today when it cannot be', async () => {
    const { look, at, post, phone, stopOf } = await onTheWay();
    await at('8:13');
    await post([phone('startDriving', stopOf('Wren'), '8:13')]);
    const planned = (await look()).body;
    expect(planned).toMatchObject({ state: 'planned', van: null });
    expect(planned.headline).toMatch(/^Arrival \d+:\d\d–\d+:\d\d$/);
    await post([phone('cannotDo', stopOf('Rook'), '8:14', { reason: 'groomerUnwell', note: '' })]);
    expect((await look()).body).toMatchObject({ state: 'notToday', headline: 'Not today' });
  });

  it('a link whose run is gone answers 410, not a broken page', async () => {
    const { look, businessId } = await onTheWay();
    await inBusiness(businessId, () => ArrivalLink.update({ runId: null }, { where: {} }));
    expect((await look()).status).toBe(410);
  });
});

describe('the van on the map', () => {
  it('is hidden for 3 minutes and 400 metres, then expected along the road, live while a fix is fresh', async () => {
    const { look, at, fix, visits } = await onTheWay();
    const van = async () => (await look()).body.van;
    expect(await van()).toBeNull();
    await at('8:12:50');
    expect(await van()).toBeNull();
    await at('8:13:30');
    const expected = (await van())!;
    expect(expected).toMatchObject({
      freshness: 'expected',
      words: 'Expected here along the route, set out 8:10',
    });
    expect(distanceMetres(expected, depot)).toBeGreaterThan(400);
    // A fix that is still near where it came from hides it, however long it has been.
    await fix('8:13:20', { lat: 41.002, lon: -36 });
    expect(await van()).toBeNull();
    await at('8:14');
    const home = visits.Rook!.household;
    await fix('8:13:55', { lat: home.lat - 0.002, lon: home.lon });
    expect(await van()).toEqual({
      lat: home.lat - 0.002,
      lon: home.lon,
      freshness: 'live',
      words: 'Seen here 8:13',
    });
    await at('8:16:30');
    expect(await van()).toMatchObject({ freshness: 'expected' });
  });

  it('never shows where the household before lives', async () => {
    const { at, post, phone, stopOf, tokenOf, look, fix, visits } = await onTheWay();
    await at('9:30');
    await post([
      phone('arrived', stopOf('Rook'), '8:16'),
      phone('stopDone', stopOf('Rook'), '9:29', { note: '' }),
    ]);
    await post([phone('startDriving', stopOf('Wren'), '9:30')]);
    const token = await tokenOf(1);
    const rook = visits.Rook!.household;
    await at('9:34');
    await fix('9:33:50', { lat: rook.lat, lon: rook.lon });
    expect((await look(token)).body).toMatchObject({ state: 'onTheWay', van: null });
    await fix('9:33:58', { lat: rook.lat + 0.005, lon: rook.lon });
    expect((await look(token)).body.van).toMatchObject({ freshness: 'live' });
  });
});

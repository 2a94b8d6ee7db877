import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Day } from '#shared/api/days.ts';
import type { Groomer } from '#shared/api/groomers.ts';
import type { Household } from '#shared/api/households.ts';
import type { Pet } from '#shared/api/pets.ts';
import type { Place } from '#shared/api/places.ts';
import type { RunDetail } from '#shared/api/runs.ts';
import type { Van } from '#shared/api/vans.ts';
import type { VisitCard } from '#shared/api/visits.ts';
import {
  gone,
  openPerson,
  type Person,
  readApi,
  seen,
  signUpThroughForm,
  writeApi,
} from '../support/browser.ts';
import { launchChromium } from '../support/chromium.ts';
import { demoDate, startTestServer, type TestServer } from '../support/startTestServer.ts';

/**
 * A one-van owner is operator, dispatcher and groomer with one sign-in, on a server without demo and
 * without a map. Her phone then loses the network, and later the server.
 */
describe('a business of one van', () => {
  let server: TestServer;
  let browser: Browser;
  let odile: Person;
  let page: Page;
  let visits: VisitCard[];
  let runId: string;

  beforeAll(async () => {
    [server, browser] = await Promise.all([startTestServer({ demo: false }), launchChromium()]);
  });
  afterAll(async () => {
    await browser?.close();
    await server?.stop();
  });

  const events = async () => (await readApi<RunDetail>(odile, `/api/runs/${runId}`)).events;
  const tap = (name: string | RegExp) => page.getByRole('button', { name, exact: true }).click();
  const petOf = (index: number) => visits[index]!.pets[0]!.name;

  it('starts with a sign-up and one set of roles for one person', async () => {
    odile = await openPerson(browser, server, 'phone');
    page = odile.page;
    await signUpThroughForm(odile, { name: 'Odile', businessName: 'Odile’s van' });
    const groomer = await writeApi<Groomer>(odile, 'POST', '/api/groomers', {
      name: 'Odile',
      skills: [],
    });
    const nav = page.getByRole('navigation', { name: 'Main' });
    expect(await nav.getByRole('link', { name: 'Run' }).count()).toBe(0);

    await page.goto('/setup/people');
    await page.getByRole('button', { name: 'Change roles of Odile' }).click();
    const dialog = page.getByRole('dialog', { name: 'Roles of Odile' });
    await dialog.getByLabel('Dispatcher').check();
    await dialog.getByLabel('Groomer', { exact: false }).first().check();
    await dialog.getByLabel('Whose runs are theirs').selectOption(groomer.id);
    await dialog.getByRole('button', { name: 'Save the roles' }).click();
    await gone(dialog);
    await seen(page.getByText('groomer: Odile'));
    await expect
      .poll(() => nav.getByRole('link').allInnerTexts())
      .toEqual(['Day', 'Run', 'Households', 'Forecast', 'Texts', 'Review', 'Setup']);
    visits = await bookDay(odile, groomer.id);
  });

  it('plans, sends and opens her own run with that one sign-in', async () => {
    await page.goto('/');
    await seen(page.getByRole('heading', { level: 1, name: '1 van, 3 visits' }));
    await page.getByRole('button', { name: 'Send to vans' }).click();
    await page.getByRole('dialog').getByRole('button', { name: 'Send to 1 van' }).click();
    await seen(page.getByText('Sent to 1 van.'));
    await page.getByRole('navigation', { name: 'Main' }).getByRole('link', { name: 'Run' }).click();
    await page.waitForURL(/\/run\/[\w-]{36}$/);
    runId = page.url().split('/').at(-1)!;
    await seen(page.getByRole('heading', { level: 1, name: new RegExp(`^${petOf(0)} `) }));
    await seen(page.getByText(/No text goes out/));
    expect(await events()).toEqual([]);
  });

  it('keeps taps made without network and sends them once', async () => {
    await odile.context.setOffline(true);
    await tap('Start driving');
    await tap('Arrived');
    await seen(page.getByText('offline · 2 to send'));
    await tap(`${petOf(0)} on the table`);
    await tap('Done here');
    await seen(page.getByText('offline · 4 to send'));
    // The run goes on although nobody hears it.
    await seen(page.getByRole('heading', { level: 1, name: new RegExp(`^${petOf(1)} `) }));

    await odile.context.setOffline(false);
    await gone(page.getByText(/to send$/));
    await expect.poll(async () => (await events()).length, { timeout: 30_000 }).toBe(4);
    const arrived = await events();
    expect(arrived.map((event) => event.kind)).toEqual([
      'startDriving',
      'arrived',
      'petOnTable',
      'stopDone',
    ]);
    // The order of the taps, by the phone's own count.
    const order = arrived.map((event) => event.deviceSeq);
    expect(order).toEqual(order.toSorted((a, b) => a - b));
    const card = await readApi<VisitCard>(odile, `/api/visits/${visits[0]!.id}`);
    expect(card.status).toBe('done');
  });

  it('keeps taps over a killed server, and over a page loaded again', async () => {
    await server.kill();
    await tap(/^(Start driving|Arrived)$/);
    await seen(page.getByText(/1 to send$/));
    await tap(/^(Arrived|.* on the table)$/);
    await seen(page.getByText(/2 to send$/));
    expect(server.output()).not.toContain('"level":60');

    await server.restart();
    await page.reload();
    await seen(page.getByRole('heading', { level: 1, name: new RegExp(`^${petOf(1)} `) }));
    await expect.poll(async () => (await events()).length, { timeout: 60_000 }).toBe(6);
    const all = await events();
    expect(new Set(all.map((event) => event.id)).size).toBe(6);
    expect(all.slice(4).map((event) => event.stopId)).toEqual([visits[1]!.id, visits[1]!.id]);
    await gone(page.getByText(/to send$/));
  });

  it('shows the desk, the same person, where the van is', async () => {
    await page.getByRole('navigation', { name: 'Main' }).getByRole('link', { name: 'Day' }).click();
    const strip = (index: number) => page.locator(`[data-visit="${visits[index]!.id}"]`);
    await expect.poll(() => strip(0).getAttribute('aria-label')).toMatch(/, done$/);
    await expect.poll(() => strip(1).getAttribute('aria-label')).toMatch(/, at the door$/);
  });
});

/** A depot, a van with Odile in it on the demo's date, and three placed visits; in that order. */
async function bookDay(odile: Person, groomerId: string): Promise<VisitCard[]> {
  const depot = await writeApi<Place>(odile, 'POST', '/api/places', {
    kind: 'depot',
    name: 'Yard',
    lat: 41,
    lon: -36,
  });
  const van = await writeApi<Van>(odile, 'POST', '/api/vans', {
    name: 'Heron',
    shape: 'square',
    startPlaceId: depot.id,
    endPlaceId: depot.id,
    tanks: [{ kind: 'fresh', capacityMl: 250_000 }],
    tableLimitGrams: 60_000,
  });
  await writeApi(odile, 'PUT', '/api/shifts', {
    date: demoDate,
    vanId: van.id,
    groomerId,
    startMinutes: 450,
    endMinutes: 1020,
    mostOvertimeMinutes: 30,
    meal: null,
  });
  const visits: VisitCard[] = [];
  for (const [index, name] of ['Abara', 'Bento', 'Costa'].entries()) {
    const household = await writeApi<Household>(odile, 'POST', '/api/households', {
      name,
      addressLabel: `${index + 1} Heron Lane`,
      lat: 41.01 + index / 100,
      lon: -36.01,
      contactName: name,
      phone: null,
      textsConsent: false,
    });
    const pet = await writeApi<Pet>(odile, 'POST', `/api/households/${household.id}/pets`, {
      name: ['Clover', 'Juniper', 'Sorrel'][index],
      species: 'dog',
      breedId: 'bichon-frise',
      weightGrams: 6000,
      styleId: 'teddy',
    });
    const visit = await writeApi<VisitCard>(odile, 'POST', '/api/visits', {
      householdId: household.id,
      date: demoDate,
      petIds: [pet.id],
      promise: null,
    });
    const day = await readApi<Day>(odile, `/api/days/${demoDate}`);
    await writeApi(odile, 'POST', `/api/days/${demoDate}/moves`, {
      move: { kind: 'placeVisit', visitId: visit.id, vanId: van.id, index },
      runVersions: { [van.id]: day.runs[0]!.version },
    });
    visits.push(visit);
  }
  return visits;
}

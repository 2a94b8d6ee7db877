import { readFile } from 'node:fs/promises';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Day } from '#shared/api/days.ts';
import type { listHouseholds } from '#shared/api/households.ts';
import type { Review } from '#shared/api/review.ts';
import type { RunDetail } from '#shared/api/runs.ts';
import type { VisitCard } from '#shared/api/visits.ts';
import type { z } from 'zod';
import {
  gone,
  openPerson,
  type Person,
  readApi,
  seen,
  signInAs,
  signUpThroughForm,
  tryApi,
} from '../support/browser.ts';
import { launchChromium } from '../support/chromium.ts';
import { demoDate, startTestServer, type TestServer } from '../support/startTestServer.ts';

/**
 * One working day with all four people at screens of their own, in the order it happens. Each step
 * goes on from the one before.
 */
describe('the whole story', () => {
  let server: TestServer;
  let browser: Browser;
  let runa: Person;
  let groomer: Person;
  let run: RunDetail;
  /** The first household of the groomer's run, and the second. */
  let first: VisitCard;
  let second: VisitCard;

  beforeAll(async () => {
    [server, browser] = await Promise.all([startTestServer({ demo: true }), launchChromium()]);
  });
  afterAll(async () => {
    await browser?.close();
    await server?.stop();
  });

  const day = () => readApi<Day>(runa, `/api/days/${demoDate}`);
  const vanOf = (now: Day, visitId: string) => {
    const vanId = now.plan.runs.find((one) => one.stops.some((stop) => stop.id === visitId))?.vanId;
    return now.runs.find((one) => one.vanId === vanId)?.vanName ?? null;
  };

  it('shows the dispatcher the day of three vans', async () => {
    runa = await openPerson(browser, server, 'desk');
    await signInAs(runa, server.signInOf('Runa'));
    const { page } = runa;
    await seen(page.getByRole('heading', { level: 1, name: /^3 vans, \d+ visits$/ }));
    const vans = page.getByRole('region', { name: 'Vans' });
    for (const name of ['Otter', 'Plover', 'Curlew']) await seen(vans.getByText(name));
    // The owner-operator's screen is not a dispatcher's.
    const nav = page.getByRole('navigation', { name: 'Main' });
    expect(await nav.getByRole('link').allInnerTexts()).toEqual([
      'Day',
      'Households',
      'Forecast',
      'Texts',
      'Setup',
    ]);
  });

  it('places the visit that was left, by keyboard, after its knock-on was read', async () => {
    const { page } = runa;
    const before = await day();
    const [open] = before.plan.notPlaced;
    expect(before.plan.notPlaced).toHaveLength(1);
    await page.getByRole('button', { name: /^Try / }).press('Enter');
    const knockOn = page.getByRole('region', { name: 'What the move changes' });
    await seen(knockOn.getByText('Driving'));
    await seen(knockOn.getByText('nothing promised yet'));
    await seen(knockOn.getByText(/finishes$/));
    await seen(page.getByText(/^Drawn, not kept: /));
    expect((await day()).plan.notPlaced).toEqual([open]);

    await knockOn.getByRole('button', { name: 'Keep the move' }).press('Enter');
    await seen(page.getByText(/Kept: /));
    await seen(page.getByText('Every visit of the day is on a van.'));
    const after = await day();
    expect(after.plan.notPlaced).toEqual([]);
    expect(vanOf(after, open!)).not.toBeNull();
  });

  it('moves a visit by mouse, keeps it and takes it back', async () => {
    const { page } = runa;
    const before = await day();
    const [from, to] = twoVans(before);
    const visitId = visitsOf(before, from.vanId).at(-1)!;
    await dragToVan(page, visitId, to.vanId);
    const knockOn = page.getByRole('region', { name: 'What the move changes' });
    await seen(knockOn.getByRole('heading', { name: new RegExp(`to ${to.vanName}, `) }));
    expect(vanOf(await day(), visitId)).toBe(from.vanName);

    await knockOn.getByRole('button', { name: 'Keep the move' }).click();
    await gone(knockOn);
    expect(vanOf(await day(), visitId)).toBe(to.vanName);

    await page.getByRole('button', { name: 'Undo' }).click();
    await seen(page.getByText(/Taken back: /));
    expect((await day()).plan.runs).toEqual(before.plan.runs);
  });

  it('moves a visit by keys alone, and puts another back', async () => {
    const { page } = runa;
    const before = await day();
    const [from] = before.problem.vans;
    const next = before.problem.vans[1]!;
    const visitId = visitsOf(before, from!.vanId).at(-1)!;
    const stop = page.locator(`[data-visit="${visitId}"]`);
    await stop.focus();
    await page.keyboard.press('Enter');
    await seen(page.getByText('In hand. Arrow keys move it, Enter drops it, Escape puts it back.'));
    await page.keyboard.press('ArrowDown');
    await seen(page.getByText(new RegExp(`^Drawn, not kept: .* to ${next.vanName}, `)));
    await page.keyboard.press('Escape');
    await gone(page.getByText(/^Drawn, not kept: /));
    expect((await day()).plan.runs).toEqual(before.plan.runs);

    await stop.focus();
    await page.keyboard.press('Enter');
    await page.keyboard.press('ArrowDown');
    await page.keyboard.press('Enter');
    // The keyboard goes on where the choice is.
    const keep = page.getByRole('region', { name: 'Vans' }).getByRole('button', {
      name: 'Keep the move',
    });
    await expect.poll(() => keep.evaluate((it) => it === document.activeElement)).toBe(true);
    await page.keyboard.press('Enter');
    await expect.poll(async () => vanOf(await day(), visitId)).toBe(next.vanName);
    await page.keyboard.press('Control+z');
    await expect.poll(async () => vanOf(await day(), visitId)).toBe(from!.vanName);
  });

  it('asks for a better day, and nothing changes until it is kept', async () => {
    const { page } = runa;
    const before = await day();
    await page.getByRole('button', { name: 'Find a better day' }).click();
    const card = page.getByRole('region', { name: 'Proposed day' });
    await seen(card.getByRole('progressbar', { name: 'Search' }));
    await seen(
      card.getByRole('heading', { name: /^(A proposed day|No better day found)$/ }),
      60_000,
    );
    expect((await day()).plan).toEqual(before.plan);
    const keep = card.getByRole('button', { name: 'Keep this day' });
    if (await keep.isVisible()) {
      await seen(card.getByText('Driving'));
      await keep.click();
      await seen(page.getByText('Kept the proposed day.'));
      expect((await day()).plan).not.toEqual(before.plan);
    } else await card.getByRole('button', { name: 'Close' }).click();
    await gone(card);
  });

  it('sends the runs to the vans', async () => {
    const { page } = runa;
    await page.getByRole('button', { name: 'Send to vans' }).click();
    const dialog = page.getByRole('dialog', { name: 'Send to vans' });
    await dialog.getByRole('button', { name: 'Send to 3 vans' }).click();
    await seen(page.getByText('Sent to 3 vans.'));
    const now = await day();
    expect(now.runs.map((one) => one.sentVersion !== null && !one.changedSinceSent)).toEqual([
      true,
      true,
      true,
    ]);
    await expect.poll(() => page.getByText(/^✓ sent 7:\d\d$/).count()).toBe(3);
  });

  it('opens the run on the groomer’s phone, who sets out', async () => {
    const now = await day();
    const cards = new Map(now.visits.map((card) => [card.id, card]));
    const textable = now.runs.find((one) => {
      const card = cards.get(visitsOf(now, one.vanId)[0] ?? '');
      return card?.textsConsent && card.phone && visitsOf(now, one.vanId).length > 1;
    })!;
    groomer = await openPerson(browser, server, 'phone');
    await signInAs(groomer, server.signInOf(textable.groomerName));
    const { page } = groomer;
    await page.waitForURL((url) => url.pathname === `/run/${textable.runId}`);
    run = await readApi<RunDetail>(groomer, `/api/runs/${textable.runId}`);
    const [one, two] = visitsOf(now, textable.vanId);
    first = cards.get(one!)!;
    second = cards.get(two!)!;

    await seen(page.getByRole('heading', { level: 1, name: new RegExp(`^${namesOf(first)} `) }));
    await seen(page.getByRole('region', { name: 'At the kerb' }).getByText(first.addressLabel));
    await seen(page.getByText('Steps and why'));
    await page.getByRole('button', { name: /^Start driving · text / }).click();
    await seen(page.getByText(/^On the way, there about \d+:\d\d$/));
    // A tap can still be taken back for some seconds: nobody has heard of it yet.
    await seen(page.getByRole('button', { name: 'Undo' }));
    expect((await readApi<RunDetail>(groomer, `/api/runs/${run.runId}`)).events).toEqual([]);
  });

  let owner: Person;
  let link: string;
  it('texts the household within seconds, and the link opens for anybody who has it', async () => {
    const phones = await openPerson(browser, server, 'desk');
    await phones.page.goto('/fakes/phones');
    const phone = phones.page.getByRole('region', { name: `Phone ${first.phone}` });
    // Four seconds in which the groomer may take the tap back, and the ticker's two.
    await seen(phone, 12_000);
    await seen(phone.getByText(new RegExp(run.groomerName)));
    link = (await phone.getByRole('link').first().getAttribute('href'))!;
    expect(link).toMatch(new RegExp(`^${server.origin}/a/[\\w-]{16,22}$`));
    // Nobody else heard anything.
    expect(await phones.page.getByRole('region', { name: /^Phone / }).count()).toBe(1);
    await phones.context.close();

    owner = await openPerson(browser, server, 'phone');
    const raw = await owner.page.request.get(link);
    const html = await raw.text();
    expect(raw.headers()['referrer-policy']).toBe('no-referrer');
    expect(html).toMatch(/<h1>Open the door \d+:\d\d–\d+:\d\d<\/h1>/);
    expect(html).not.toContain(second.householdName);
    await owner.page.goto(link);
    await seen(owner.page.getByRole('heading', { level: 1, name: /^Open the door \d+:\d\d–/ }));
    await seen(owner.page.getByText(`in van ${run.vanName}`));
    expect(await owner.context.cookies()).toEqual([]);
  });

  it('works the visit on the phone, section by section', async () => {
    const { page } = groomer;
    const tap = (name: string | RegExp) => page.getByRole('button', { name, exact: true }).click();
    await tap('Arrived');
    const [pet] = first.pets;
    await tap(`${pet!.name} on the table`);
    const sections = page.getByRole('region', { name: 'Sections' });
    const steps = first.steps.filter((step) => step.petId === pet!.id);
    await expect.poll(() => sections.getByRole('listitem').count()).toBe(steps.length);
    await tap('Section done');
    await expect.poll(() => sections.getByText(/^✓ /).count()).toBe(1);
    await tap('Section done');
    await expect.poll(() => sections.getByText(/^✓ /).count()).toBe(2);
    await tap('Done here');
    await gone(sections);
    await expect
      .poll(async () => (await readApi<RunDetail>(groomer, `/api/runs/${run.runId}`)).events, {
        timeout: 20_000,
      })
      .toHaveLength(6);
    const { events } = await readApi<RunDetail>(groomer, `/api/runs/${run.runId}`);
    expect(events.map((event) => event.kind)).toEqual([
      'startDriving',
      'arrived',
      'petOnTable',
      'stepDone',
      'stepDone',
      'stopDone',
    ]);
    expect(new Set(events.map((event) => event.stopId))).toEqual(new Set([first.id]));
  });

  it('leaves another visit undone, with its reason', async () => {
    const { page } = groomer;
    for (;;) {
      // A refill or the meal may stand between the two visits.
      const heading = page.getByRole('heading', { level: 1 });
      const title = await heading.innerText();
      if (title.startsWith(namesOf(second))) break;
      await page.getByRole('button', { name: "Can't do it" }).click();
      await leaveUndone(page, 'Gear broke');
      await expect.poll(() => heading.innerText()).not.toBe(title);
    }
    await page.getByRole('button', { name: "Can't do it" }).click();
    await leaveUndone(page, 'Nobody answers');
    await page.getByRole('link', { name: 'Whole run' }).click();
    await seen(page.getByText('not done: Nobody answers'));
    await expect
      .poll(async () => (await visit(second.id)).status, { timeout: 20_000 })
      .toBe('failed');
  });

  const visit = (id: string) => readApi<VisitCard>(runa, `/api/visits/${id}`);

  it('tells the pet owner by itself that the pet is done', async () => {
    const done = `${namesOf(first)} ${first.pets.length > 1 ? 'are' : 'is'} done`;
    await seen(owner.page.getByRole('heading', { level: 1, name: done }), 40_000);
    await seen(owner.page.getByText(`${run.groomerName} finished at `));
    await seen(owner.page.getByText('call your vet first'));
    expect(await owner.page.title()).toBe(`${done} · Saltmarsh Mobile Grooming`);
  });

  it('shows the dispatcher what happened', async () => {
    const { page } = runa;
    const strip = (card: VisitCard) => page.locator(`[data-visit="${card.id}"]`);
    await expect
      .poll(() => strip(first).getAttribute('aria-label'), { timeout: 30_000 })
      .toMatch(/, done$/);
    await expect
      .poll(() => strip(second).getAttribute('aria-label'), { timeout: 30_000 })
      .toMatch(/not done: no answer$/);
    expect((await visit(first.id)).status).toBe('done');
    // What has begun stays where it is.
    await strip(first).focus();
    await page.keyboard.press('Enter');
    await seen(page.getByText(/has begun and stays where it is\.$/).or(page.getByRole('dialog')));
    await page.goto('/texts');
    await seen(page.getByText(first.householdName));
  });

  it('shows the owner-operator where the hours of the week went', async () => {
    const odile = await openPerson(browser, server, 'desk');
    await signInAs(odile, server.signInOf('Odile'));
    const { page } = odile;
    await page
      .getByRole('navigation', { name: 'Main' })
      .getByRole('link', { name: 'Review' })
      .click();
    await seen(
      page.getByRole('heading', {
        level: 1,
        name: /^For every hour of driving, \d+\.\d hours of grooming$/,
      }),
    );
    const review = await readApi<Review>(odile, '/api/review');
    const figure = (words: string) =>
      page.locator('dl > div', { has: page.getByText(words, { exact: true }) }).locator('dd');
    expect(await figure('grooming').innerText()).toBe(hours(review.week.groomSeconds));
    expect(await figure('driving').innerText()).toBe(hours(review.week.driveSeconds));
    expect(review.week.groomSeconds).toBeGreaterThan(10 * 3600);
    for (const name of ['Where each day went', 'Van by van', 'Forecast against the clock'])
      await seen(page.getByRole('heading', { name }));

    const [download] = await Promise.all([
      page.waitForEvent('download'),
      page.getByRole('link', { name: 'Save as CSV' }).click(),
    ]);
    expect(download.suggestedFilename()).toBe(`furlong-${review.from}.csv`);
    const rows = readCsv(await readFile(await download.path(), 'utf8'));
    expect(rows).toHaveLength(review.vanDays.length);
    const sum = (name: string) => rows.reduce((total, row) => total + Number(row[name]), 0);
    expect(sum('visits')).toBe(review.week.visits);
    // Each row is rounded to the minute.
    expect(Math.abs(sum('groomMinutes') - review.week.groomSeconds / 60)).toBeLessThan(rows.length);
    expect(Math.abs(sum('driveMinutes') - review.week.driveSeconds / 60)).toBeLessThan(rows.length);
    expect(odile.complaints).toEqual([]);
    await odile.context.close();
  });

  it('shows a second business nothing of it', async () => {
    const stranger = await openPerson(browser, server, 'desk');
    const { page } = stranger;
    await page.goto('/sign-up');
    await page.getByRole('button', { name: 'Start the business' }).click();
    await expect.poll(() => page.locator('[aria-invalid="true"]').count()).toBe(4);
    await page.getByLabel('Your name').fill('Petra');
    await page.getByLabel('E-mail').fill('no address');
    await page.getByLabel('Password').fill('short');
    await page.getByRole('button', { name: 'Start the business' }).click();
    await expect.poll(() => page.locator('[aria-invalid="true"]').count()).toBe(3);
    expect(page.url()).toContain('/sign-up');
    await signUpThroughForm(stranger, { name: 'Petra', businessName: 'Harbour Clips' });

    await page.goto('/households');
    await seen(page.getByText('No household yet'));
    await page.goto(`/day/${demoDate}`);
    await seen(page.getByText('Before the first day'));
    const list = await readApi<z.output<typeof listHouseholds.response>>(
      stranger,
      '/api/households',
    );
    expect(list.households).toEqual([]);
    const own = await readApi<Day>(stranger, `/api/days/${demoDate}`);
    expect([own.visits, own.runs, own.log]).toEqual([[], [], []]);
    expect(await readApi(stranger, '/api/texts')).toEqual([]);

    for (const path of [
      `/api/households/${first.householdId}`,
      `/api/visits/${first.id}`,
      `/api/runs/${run.runId}`,
    ])
      expect([path, (await page.request.get(path)).status()]).toEqual([path, 404]);
    const promise = { promise: null };
    expect((await tryApi(stranger, 'PATCH', `/api/visits/${first.id}`, promise)).status()).toBe(
      404,
    );
    await page.goto(`/households/${first.householdId}`);
    await seen(page.getByRole('heading', { level: 1, name: 'This household does not open' }));
    await stranger.context.close();
  });

  it('left nobody’s screen with an error', () => {
    expect({ runa: runa.complaints, groomer: groomer.complaints, owner: owner.complaints }).toEqual(
      {
        runa: [],
        groomer: [],
        owner: [],
      },
    );
  });
});

function visitsOf(day: Day, vanId: string): string[] {
  const run = day.plan.runs.find((one) => one.vanId === vanId);
  return (run?.stops ?? []).flatMap((stop) => (stop.kind === 'visit' ? [stop.visitId] : []));
}

/** The van with most visits and the one with fewest: a move between them is a fair one. */
function twoVans(day: Day) {
  const sorted = day.runs.toSorted(
    (a, b) => visitsOf(day, b.vanId).length - visitsOf(day, a.vanId).length,
  );
  return [sorted[0]!, sorted.at(-1)!] as const;
}

/** Drags a visit to the end of another van's strip with the mouse. */
async function dragToVan(page: Page, visitId: string, vanId: string): Promise<void> {
  const from = (await page.locator(`[data-visit="${visitId}"]`).boundingBox())!;
  const to = (await page.locator(`[data-visit][data-van="${vanId}"]`).last().boundingBox())!;
  await page.mouse.move(from.x + from.width / 2, from.y + from.height / 2);
  await page.mouse.down();
  await page.mouse.move(to.x + to.width / 2 + 20, to.y + to.height / 2, { steps: 8 });
  await page.mouse.move(to.x + to.width + 12, to.y + to.height / 2, { steps: 4 });
  await seen(page.getByText(/^→ /));
  await page.mouse.up();
}

async function leaveUndone(page: Page, reason: string): Promise<void> {
  const dialog = page.getByRole('dialog', { name: /^Can't do / });
  await dialog.getByLabel(reason).check();
  await dialog.getByRole('button', { name: /^Leave undone/ }).click();
}

/** "Cinder and Laurel". */
function namesOf({ pets }: VisitCard): string {
  return new Intl.ListFormat('en-GB').format(pets.map((pet) => pet.name));
}

/** "61 h 20", as the screen writes a span. */
function hours(seconds: number): string {
  const minutes = Math.round(seconds / 60);
  return `${Math.floor(minutes / 60)} h ${String(minutes % 60).padStart(2, '0')}`;
}

/** No cell of ours holds a comma or a quote. */
function readCsv(text: string): Record<string, string>[] {
  const [head, ...lines] = text.trim().split('\r\n');
  const names = head!.split(',');
  return lines.map((line) => {
    const cells = line.split(',');
    expect(cells).toHaveLength(names.length);
    return Object.fromEntries(names.map((name, index) => [name, cells[index]!]));
  });
}

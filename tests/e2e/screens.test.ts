import { gzipSync } from 'node:zlib';
import type { Browser, Page } from 'playwright-core';
import { v7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import type { z } from 'zod';
import type { Day } from '#shared/api/days.ts';
import type { listHouseholds } from '#shared/api/households.ts';
import type { RunDetail } from '#shared/api/runs.ts';
import type { listFakePhones } from '#shared/api/texts.ts';
import {
  openPerson,
  type Person,
  readApi,
  seen,
  signInAs,
  signUpThroughForm,
  writeApi,
} from '../support/browser.ts';
import { launchChromium } from '../support/chromium.ts';
import { screenFaults } from '../support/screenFaults.ts';
import { demoDate, startTestServer, type TestServer } from '../support/startTestServer.ts';

/** A screen to look at, and words that stand on it once it is there. */
interface Screen {
  path: string;
  shows: RegExp;
  /** The chunk that is this screen's own. */
  chunk?: string;
  /** An address that answers so on purpose: the browser logs it by itself. */
  refuses?: number;
}

type Households = z.output<typeof listHouseholds.response>;
type FakePhones = z.output<typeof listFakePhones.response>;

/** Every screen of the demo at a desk's and a phone's width, before and behind the sign-in. */
describe('the screens', () => {
  let server: TestServer;
  let browser: Browser;
  let link: string;
  let runPath: string;
  let householdPath: string;
  let petPath: string;

  beforeAll(async () => {
    [server, browser] = await Promise.all([startTestServer({ demo: true }), launchChromium()]);
    const runa = await openPerson(browser, server, 'desk');
    await signInAs(runa, server.signInOf('Runa'));
    ({ link, runPath } = await startFirstRun(runa));
    const list = await readApi<Households>(runa, '/api/households');
    const household = list.households.find((one) => one.pets.length > 0)!;
    householdPath = `/households/${household.id}`;
    petPath = `${householdPath}/pets/${household.pets[0]!.id}`;
    await runa.context.close();
  });
  afterAll(async () => {
    await browser?.close();
    await server?.stop();
  });

  const doors: Screen[] = [
    { path: '/sign-in', shows: /^Sign in$/, chunk: 'SignInScreen' },
    { path: '/sign-up', shows: /^Start a business$/, chunk: 'SignUpScreen' },
    { path: '/reset', shows: /^Set a new password$/, chunk: 'ForgottenScreen' },
    { path: '/reset/nobody-has-this-token', shows: /^Choose/, chunk: 'NewPasswordScreen' },
    {
      path: '/join/nobody-has-this-token',
      shows: /^This invitation does not open$/,
      chunk: 'InvitationScreen',
      refuses: 410,
    },
    { path: '/fakes/phones', shows: /^Fake phones$/, chunk: 'FakePhonesScreen' },
    { path: '/fakes/letters', shows: /^Fake letters$/, chunk: 'FakeLettersScreen' },
  ];
  const behind = (): Screen[] => [
    { path: '/day', shows: /^3 vans, \d+ visits$/, chunk: 'DayScreen' },
    { path: '/day/2027-06-14', shows: /^3 vans, \d+ visits$/, chunk: 'DayScreen' },
    { path: '/run?all=1', shows: /^Runs today$/, chunk: 'RunListScreen' },
    { path: runPath, shows: / at /, chunk: 'RunScreen' },
    { path: `${runPath}?show=all`, shows: /16 June/, chunk: 'RunScreen' },
    { path: '/households', shows: /^Households$/, chunk: 'HouseholdsScreen' },
    { path: '/households/new', shows: /^Add a household$/, chunk: 'HouseholdFormScreen' },
    { path: householdPath, shows: /./, chunk: 'HouseholdScreen' },
    { path: `${householdPath}/edit`, shows: /^Change /, chunk: 'HouseholdFormScreen' },
    { path: `${householdPath}/pets/new`, shows: /^Add a pet$/, chunk: 'PetFormScreen' },
    { path: petPath, shows: /./, chunk: 'PetScreen' },
    { path: `${petPath}/edit`, shows: /./, chunk: 'PetFormScreen' },
    { path: `${petPath}/style`, shows: /./, chunk: 'PetStyleScreen' },
    { path: '/households/sites', shows: /^Sites$/, chunk: 'SitesScreen' },
    { path: '/forecast', shows: /./, chunk: 'ForecastScreen' },
    { path: '/texts', shows: /^Texts$/, chunk: 'TextsScreen' },
    { path: '/review', shows: /^For every hour of driving/, chunk: 'ReviewScreen' },
    ...['business', 'area', 'places', 'vans', 'groomers', 'shifts', 'styles', 'people'].map(
      (tab) => ({
        path: `/setup/${tab}`,
        shows: /^Setup$/,
        chunk: 'SetupScreen',
      }),
    ),
    { path: '/nothing', shows: /^Nothing is here$/ },
  ];

  for (const size of ['desk', 'phone'] as const) {
    it(`stand at a ${size}'s width before the sign-in`, async () => {
      const nobody = await openPerson(browser, server, size);
      expect(await faultsOf(nobody, [...doors, { path: link, shows: /^Open the door / }])).toEqual(
        [],
      );
      await nobody.context.close();
    });

    it(`stand at a ${size}'s width behind the sign-in`, async () => {
      const odile = await openPerson(browser, server, size);
      await signInAs(odile, server.signInOf('Odile'));
      expect(await faultsOf(odile, behind())).toEqual([]);
      await odile.context.close();
    });

    it(`stand at a ${size}'s width while a business is empty`, async () => {
      const petra = await openPerson(browser, server, size);
      await signUpThroughForm(petra, { name: `Petra.${size}`, businessName: 'Harbour Clips' });
      const empty: Screen[] = [
        { path: '/day', shows: /^No vans$/ },
        { path: '/run?all=1', shows: /^Runs today$/ },
        { path: '/households', shows: /^Households$/ },
        { path: '/texts', shows: /^Texts$/ },
        { path: '/review', shows: /^No finished visit this week$/ },
        { path: '/setup/shifts', shows: /^Setup$/ },
      ];
      expect(await faultsOf(petra, empty)).toEqual([]);
      await petra.context.close();
    });
  }

  it('load the map only where there is one', async () => {
    const odile = await openPerson(browser, server, 'desk');
    const { page } = odile;
    const scripts = collectScripts(page);
    const load = async (path: string) => {
      scripts.clear();
      await page.goto(path);
      await seen(page.getByRole('heading', { level: 1 }));
      await page.waitForLoadState('networkidle');
      return new Map(scripts);
    };
    const door = await load('/sign-in');
    await signInAs(odile, server.signInOf('Odile'));
    const board = await load('/day');
    const run = await load(runPath);
    expect([hasMap(door), hasMap(board), hasMap(run)]).toEqual([false, true, false]);
    expect(bytesOf(board)).toBeGreaterThan(bytesOf(door) * 1.5);
    await odile.context.close();
  });

  it('open the pet owner’s page with less than 110 kB of script', async () => {
    const owner = await openPerson(browser, server, 'phone');
    const scripts = collectScripts(owner.page);
    await owner.page.goto(link);
    await seen(owner.page.getByRole('heading', { level: 1, name: /^Open the door / }));
    await owner.page.waitForLoadState('networkidle');
    expect(hasMap(scripts)).toBe(false);
    const gzipped = [...scripts.values()].reduce((sum, text) => sum + gzipSync(text).length, 0);
    expect(gzipped).toBeGreaterThan(10_000);
    expect(gzipped).toBeLessThan(110_000);
    await owner.context.close();
  });
});

/** Loads each screen and lists what is wrong, by address. */
async function faultsOf({ page, complaints }: Person, screens: Screen[]): Promise<string[]> {
  const faults: string[] = [];
  const scripts = collectScripts(page);
  for (const { path, shows, chunk, refuses } of screens) {
    complaints.length = 0;
    scripts.clear();
    await page.goto(path);
    const found = await seen(page.getByRole('heading', { level: 1, name: shows })).then(
      () => [],
      (error: unknown) => [String(error)],
    );
    await page.waitForLoadState('networkidle');
    const unexpected = complaints.filter((one) => !refuses || !one.includes(` ${refuses} `));
    const chunks = screensIn(scripts).join();
    const wrong = chunk !== undefined && chunks !== chunk ? [`loads ${chunks}, not ${chunk}`] : [];
    for (const fault of [...found, ...unexpected, ...wrong, ...(await screenFaults(page))])
      faults.push(`${path}: ${fault}`);
  }
  return faults;
}

/** Sends the day, sets out on the first run whose household may be texted, and finds that text. */
async function startFirstRun(runa: Person): Promise<{ link: string; runPath: string }> {
  const day = await readApi<Day>(runa, `/api/days/${demoDate}`);
  const runVersions = Object.fromEntries(day.runs.map((run) => [run.vanId, run.version]));
  await writeApi(runa, 'POST', `/api/days/${demoDate}/send`, { runVersions });
  const cards = new Map(day.visits.map((card) => [card.id, card]));
  const [run, visit] = day.runs
    .map((one) => {
      const stops = day.plan.runs.find((plan) => plan.vanId === one.vanId)?.stops ?? [];
      const first = stops.find((stop) => stop.kind === 'visit');
      return [one, first?.kind === 'visit' ? cards.get(first.visitId) : undefined] as const;
    })
    .find(([, card]) => card?.textsConsent && card.phone)!;
  await writeApi<RunDetail>(runa, 'POST', `/api/runs/${run.runId}/events`, {
    events: [
      {
        id: v7(),
        v: 1,
        deviceId: v7(),
        deviceSeq: 0,
        deviceAt: new Date().toISOString(),
        offsetMs: Date.parse(await serverNow(runa)) - Date.now(),
        runVersion: run.version,
        stopId: visit!.id,
        kind: 'startDriving',
      },
    ],
  });
  const phone = await vi.waitUntil(
    async () => (await readApi<FakePhones>(runa, '/api/fake/phones'))[0],
    { timeout: 20_000, interval: 500 },
  );
  return {
    link: /http\S+/.exec(phone.texts[0]!.body)![0],
    runPath: `/run/${run.runId}`,
  };
}

async function serverNow(person: Person): Promise<string> {
  return (await readApi<{ serverNow: string }>(person, '/api/session')).serverNow;
}

/** Scripts of the page as they come, by file name. */
function collectScripts(page: Page): Map<string, string> {
  const scripts = new Map<string, string>();
  page.on('response', async (answer) => {
    const { pathname } = new URL(answer.url());
    if (pathname.endsWith('.js'))
      scripts.set(pathname.split('/').at(-1)!, await answer.text().catch(() => ''));
  });
  return scripts;
}

/** Whether Leaflet is among them, told by a class name only it sets. */
function hasMap(scripts: ReadonlyMap<string, string>): boolean {
  return [...scripts.values()].some((text) => text.includes('leaflet-container'));
}

function bytesOf(scripts: ReadonlyMap<string, string>): number {
  return [...scripts.values()].reduce((sum, text) => sum + text.length, 0);
}

/** Names of the screens among the chunks loaded. */
function screensIn(scripts: ReadonlyMap<string, string>): string[] {
  return [...scripts.keys()].flatMap((name) => /^(\w+Screen)-/.exec(name)?.[1] ?? []).sort();
}

import type { APIResponse, Browser, BrowserContext, Locator, Page } from 'playwright-core';
import { getSession } from '#shared/api/session.ts';
import type { DemoSignIn, TestServer } from './startTestServer.ts';

/** Somebody at a screen of their own: cookies and storage are shared with nobody. */
export interface Person {
  context: BrowserContext;
  page: Page;
  /** What the page complained about so far: console errors, refused content, uncaught errors. */
  complaints: string[];
}

export const deskSize = { width: 1440, height: 900 };
export const phoneSize = { width: 390, height: 844 };

/** Opens a screen of that size, a finger's when it is a phone. Nobody is signed in. */
export async function openPerson(
  browser: Browser,
  server: Pick<TestServer, 'origin'>,
  size: 'desk' | 'phone',
): Promise<Person> {
  const phone = size === 'phone';
  const context = await browser.newContext({
    baseURL: server.origin,
    viewport: phone ? phoneSize : deskSize,
    hasTouch: phone,
    isMobile: phone,
    acceptDownloads: true,
    locale: 'en-GB',
    timezoneId: 'Atlantic/Azores',
    reducedMotion: 'reduce',
  });
  context.setDefaultTimeout(30_000);
  const page = await context.newPage();
  return { context, page, complaints: collectComplaints(page) };
}

/** Signs in through the form and waits until it is gone. */
export async function signInAs({ page }: Person, who: DemoSignIn): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(who.email);
  await page.getByLabel('Password').fill(who.password);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => url.pathname !== '/sign-in');
}

/** Starts a business of one's own through the form; ends at its set-up, signed in as its operator. */
export async function signUpThroughForm(
  { page }: Person,
  fields: { name: string; businessName: string },
): Promise<void> {
  await page.goto('/sign-up');
  await page.getByLabel('Your name').fill(fields.name);
  await page.getByLabel('E-mail').fill(`${fields.name.toLowerCase()}@example.org`);
  await page.getByLabel('Password').fill('three unrelated words');
  await page.getByLabel('Business name').fill(fields.businessName);
  await page.getByRole('button', { name: 'Start the business' }).click();
  await page.waitForURL((url) => url.pathname === '/setup/business');
  await seen(page.getByRole('heading', { level: 1, name: 'Setup' }));
}

/** Waits until it can be seen. */
export function seen(locator: Locator, timeout = 30_000): Promise<void> {
  return locator.first().waitFor({ state: 'visible', timeout });
}

/** Waits until it is gone. */
export function gone(locator: Locator, timeout = 30_000): Promise<void> {
  return locator.first().waitFor({ state: 'hidden', timeout });
}

/** Reads an address as the signed-in person; throws unless the answer is 200. */
export async function readApi<Body>({ page }: Person, path: string): Promise<Body> {
  const answer = await page.request.get(path);
  if (answer.status() !== 200)
    throw new Error(`GET ${path}: ${answer.status()} ${await answer.text()}`);
  return (await answer.json()) as Body;
}

/** Changes something as the signed-in person, for a test's arrangement; throws unless it is taken. */
export async function writeApi<Body>(
  person: Person,
  method: 'POST' | 'PUT' | 'PATCH',
  path: string,
  body: object,
): Promise<Body> {
  const answer = await tryApi(person, method, path, body);
  if (answer.status() !== 200)
    throw new Error(`${method} ${path}: ${answer.status()} ${await answer.text()}`);
  return (await answer.json()) as Body;
}

/** The same without insisting on success. */
export async function tryApi(
  person: Person,
  method: 'POST' | 'PUT' | 'PATCH',
  path: string,
  body: object,
): Promise<APIResponse> {
  const { csrfToken } = getSession.response.parse(await readApi(person, getSession.path));
  return person.page.request.fetch(path, {
    method,
    headers: { 'X-Furlong-Csrf': csrfToken },
    data: body,
  });
}

/**
 * Being asked who one is before signing in answers 401, which the browser logs by itself: the only
 * complaint that is no fault.
 */
function collectComplaints(page: Page): string[] {
  const complaints: string[] = [];
  page.on('pageerror', (error) => complaints.push(`uncaught: ${error.message}`));
  page.on('console', (message) => {
    if (message.type() !== 'error') return;
    const { url } = message.location();
    const asked = /\/api\/session(\/refresh)?$/.test(url) && message.text().includes('401');
    if (!asked) complaints.push(`${message.text()} (${url})`);
  });
  return complaints;
}

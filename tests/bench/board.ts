/**
 * How long a running Furlong takes to be usable, in a real browser: `npm run bench:board -- URL
 * [DATA_FOLDER]`. Prints sign-in to board (median of five, wall ms), and the bytes each screen's
 * first visit takes. Start it with `npm start` first; the demo's sign-ins are read from its folder.
 */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Browser, Page } from 'playwright-core';
import { launchChromium } from '../support/chromium.ts';

const [base, dataFolder = '.data'] = process.argv.slice(2);
if (!base) throw new Error('Give the address npm start printed: npm run bench:board -- http://…');
const signIns = JSON.parse(readFileSync(join(dataFolder, 'demo-sign-ins.json'), 'utf8')) as {
  role: string;
  email: string;
  password: string;
}[];

const browser = await launchChromium();
try {
  const times: number[] = [];
  for (let i = 0; i < 5; i++) times.push(await signInToBoard(browser));
  times.sort((a, b) => a - b);
  console.log(`sign-in to usable board: median ${times[2]} ms, of ${times.join(', ')}`);
  for (const path of ['/sign-in', '/day', '/households', '/run', '/review', '/setup'])
    console.log(`${path}: ${await bytesOf(browser, path)} kB over the wire on a first visit`);
} finally {
  await browser.close();
}

/** From the press of the button until every van's strip is drawn and can be focused. */
async function signInToBoard(on: Browser): Promise<number> {
  const page = await on.newPage({ viewport: { width: 1440, height: 900 } });
  await fillSignIn(page);
  const start = Date.now();
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.getByRole('button', { name: 'Send to vans' }).waitFor();
  await page.locator('svg [tabindex="0"]').first().waitFor();
  const spent = Date.now() - start;
  await page.close();
  return spent;
}

async function bytesOf(on: Browser, path: string): Promise<number> {
  const context = await on.newContext();
  const page = await context.newPage();
  if (path !== '/sign-in') {
    await fillSignIn(page);
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.getByRole('button', { name: 'Send to vans' }).waitFor();
  }
  const fresh = await context.newPage();
  const client = await context.newCDPSession(fresh);
  await client.send('Network.enable');
  await client.send('Network.setCacheDisabled', { cacheDisabled: true });
  let bytes = 0;
  client.on('Network.loadingFinished', (event) => (bytes += event.encodedDataLength));
  await fresh.goto(base + path, { waitUntil: 'networkidle' });
  await context.close();
  return Math.round(bytes / 1024);
}

async function fillSignIn(page: Page): Promise<void> {
  const { email, password } = signIns.find((one) => one.role === 'dispatcher')!;
  await page.goto(`${base}/sign-in`);
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill(password);
}

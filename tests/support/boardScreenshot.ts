// `npx tsx tests/support/boardScreenshot.ts`: the README's picture of the day board, taken from the
// demo on a server of its own. Needs TEST_DATABASE_URL and a built client.
import { mkdir, writeFile } from 'node:fs/promises';
import { fileURLToPath } from 'node:url';
import { openPerson, seen, signInAs } from './browser.ts';
import { launchChromium } from './chromium.ts';
import { startTestServer } from './startTestServer.ts';

const file = fileURLToPath(new URL('../../.github/day-board.png', import.meta.url));
const mostBytes = 300_000;

const [server, browser] = await Promise.all([startTestServer({ demo: true }), launchChromium()]);
try {
  const runa = await openPerson(browser, server, 'desk');
  await signInAs(runa, server.signInOf('Runa'));
  const { page } = runa;
  await seen(page.getByRole('button', { name: /^Try / }));
  await seen(page.getByRole('button', { name: /^Stop 1 of / }));
  // The map draws its tiles on canvases, fading in.
  await page.waitForLoadState('networkidle');
  await page.waitForTimeout(2000);
  // Where the sign-in's button was is now a strip, which would tell about its steps.
  await page.mouse.move(1, 1);
  await page.waitForTimeout(500);
  const picture = await page.screenshot({ animations: 'disabled' });
  if (picture.length > mostBytes)
    throw new Error(`The picture has ${picture.length} bytes, more than ${mostBytes}.`);
  await mkdir(fileURLToPath(new URL('.', `file://${file}`)), { recursive: true });
  await writeFile(file, picture);
  process.stdout.write(`${file}: ${picture.length} bytes\n`);
} finally {
  await browser.close();
  await server.stop();
}

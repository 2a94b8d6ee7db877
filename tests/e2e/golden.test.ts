import { readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import type { Browser, Page } from 'playwright-core';
import { build } from 'vite';
import { afterAll, beforeAll, expect, it } from 'vitest';
import type { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import type { DayProblem, DayTimes, Plan } from '#shared/schedule/types.ts';
import { launchChromium } from '../support/chromium.ts';

const folder = new URL('../fixtures/golden/', import.meta.url);
const names = readdirSync(folder).filter((name) => name.endsWith('.json'));
let browser: Browser;
let page: Page;

beforeAll(async () => {
  browser = await launchChromium();
  page = await browser.newPage();
  await page.addScriptTag({ content: await bundle() });
});
afterAll(() => browser.close());

it.each(names)('evaluates %s in Chromium to the same integers as Node', async (name) => {
  const golden = JSON.parse(readFileSync(new URL(name, folder), 'utf8')) as {
    problem: DayProblem;
    plan: Plan;
    times: DayTimes;
  };
  const times = await page.evaluate(
    ({ problem, plan }) =>
      (globalThis as unknown as { evaluateDay: typeof evaluateDay }).evaluateDay(problem, plan),
    { problem: golden.problem, plan: golden.plan },
  );
  expect(times).toEqual(golden.times);
});

/** The evaluator as one script, made by the build the client is made with. */
async function bundle(): Promise<string> {
  const result = await build({
    configFile: false,
    logLevel: 'error',
    publicDir: false,
    build: {
      write: false,
      lib: {
        entry: fileURLToPath(new URL('../support/goldenEntry.ts', import.meta.url)),
        formats: ['iife'],
        name: 'golden',
      },
    },
  });
  const [first] = Array.isArray(result) ? result : [result];
  if (!first || !('output' in first)) throw new Error('The evaluator could not be bundled.');
  return first.output[0].code;
}

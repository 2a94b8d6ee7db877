import { dropDatabase, makeDatabase } from './freshDatabase.ts';
import type { Express } from 'express';
import { afterAll, beforeAll } from 'vitest';
import { buildApp } from '#server/app.ts';
import { importDemoArea } from '#server/area/importDemoArea.ts';
import { clock } from '#server/clock.ts';
import { openCarriers } from '#server/services/texts/openCarriers.ts';

/** The whole server of the file, on a database of its own. */
export let app: Express;

/**
 * Import first and call once at the top of a test file. `carriers` connects the fake SMS carrier,
 * `area` imports the made-up town.
 */
export function useApp(options: { carriers?: boolean; area?: boolean } = {}): void {
  let carriers: Awaited<ReturnType<typeof openCarriers>> | null = null;
  beforeAll(async () => {
    await makeDatabase();
    if (options.area) await importDemoArea(process.env.FURLONG_DATA!);
    app = buildApp();
    if (options.carriers)
      carriers = await openCarriers({
        origin: 'http://127.0.0.1',
        now: () => clock.now(),
        source: {},
        folder: null,
        // Nothing leaves by itself: these files look at the outbox's rows.
        fakeStepMs: 3_600_000,
      });
  });
  afterAll(async () => {
    await carriers?.close();
    await dropDatabase();
  });
}

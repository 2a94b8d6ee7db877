import { schedule } from 'node-cron';
import { clock } from '#server/clock.ts';
import { log } from '#server/log.ts';
import { resealGateCodes } from '#server/services/households/resealGateCodes.ts';
import { learnEverywhere } from '#server/services/learning/learnEverywhere.ts';
import { sweepPhotos } from '#server/services/photos/sweepPhotos.ts';
import { sendDueTexts } from '#server/services/texts/sendDueTexts.ts';
import { removeExpired } from '#server/services/upkeep/removeExpired.ts';

/**
 * Starts the tickers: every two seconds the texts that are due; at start and every hour the upkeep;
 * once a night the learning. A tick never overlaps the one before. `stop` ends them and waits for
 * the ticks under way.
 */
export function startJobs(origin: string): { stop(): Promise<void> } {
  const tickers = [
    startTicker('texts', '*/2 * * * * *', () => sendAll(origin)),
    startTicker('upkeep', '17 * * * *', keepUp),
    startTicker('learning', '7 2 * * *', () => learnEverywhere(clock.now())),
  ];
  // A key taken to the front of the ring counts from this start on.
  void tickers[1]!.tick();
  return {
    async stop() {
      await Promise.all(tickers.map((ticker) => ticker.stop()));
    },
  };
}

function startTicker(name: string, pattern: string, work: () => Promise<void>) {
  let running: Promise<void> | null = null;
  const tick = async () => {
    if (running) return;
    running = work()
      .catch((error: unknown) => log.error({ err: error, name }, 'a ticker failed; it tries again'))
      .finally(() => (running = null));
    await running;
  };
  const task = schedule(pattern, tick, {
    name,
    noOverlap: true,
    // A busy machine may miss a second; the next tick finds everything that is due.
    suppressMissedWarning: true,
  });
  return {
    tick,
    async stop() {
      await task.destroy();
      await running;
    },
  };
}

async function sendAll(origin: string): Promise<void> {
  // More may be waiting than one batch holds; rows just handled are held back by their lease.
  while ((await sendDueTexts({ now: clock.now(), dice: Math.random, origin })) > 0);
}

async function keepUp(): Promise<void> {
  await removeExpired(clock.now());
  await sweepPhotos(clock.now());
  await resealGateCodes();
}

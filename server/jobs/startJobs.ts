import { schedule } from 'node-cron';
import { clock } from '#server/clock.ts';
import { log } from '#server/log.ts';
import { sendDueTexts } from '#server/services/texts/sendDueTexts.ts';

/**
 * Starts the tickers: every two seconds the texts that are due. A tick never overlaps the one
 * before. `stop` ends them and waits for the tick under way.
 */
export function startJobs(origin: string): { stop(): Promise<void> } {
  let running: Promise<void> | null = null;
  const tick = async () => {
    if (running) return;
    running = sendAll(origin).finally(() => (running = null));
    await running;
  };
  const task = schedule('*/2 * * * * *', tick, {
    name: 'texts',
    noOverlap: true,
    // A busy machine may miss a second; the next tick finds everything that is due.
    suppressMissedWarning: true,
  });
  return {
    async stop() {
      await task.destroy();
      await running;
    },
  };
}

async function sendAll(origin: string): Promise<void> {
  try {
    // More may be waiting than one batch holds; rows just handled are held back by their lease.
    while ((await sendDueTexts({ now: clock.now(), dice: Math.random, origin })) > 0);
  } catch (error) {
    log.error({ err: error }, 'the texts ticker failed; it tries again');
  }
}

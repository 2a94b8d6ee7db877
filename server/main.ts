import type { AddressInfo } from 'node:net';
import { buildApp } from '#server/app.ts';
import { clock } from '#server/clock.ts';
import { database } from '#server/db/database.ts';
import { env } from '#server/env.ts';
import { startJobs } from '#server/jobs/startJobs.ts';
import { log } from '#server/log.ts';
import { closePlanner, warmPlanner } from '#server/optimiser/planInWorker.ts';
import { openCarriers } from '#server/services/texts/openCarriers.ts';

await database.authenticate();
const server = buildApp().listen(env.port, env.host, (error?: Error) => {
  if (error) stopWith(error);
  else ready().catch(stopWith);
});
let closeAll: () => Promise<void> = async () => {};

async function ready(): Promise<void> {
  const { port } = server.address() as AddressInfo;
  const host = env.host.includes(':') ? `[${env.host}]` : env.host;
  const origin = env.publicUrl ?? `http://${host}:${port}`;
  const carriers = await openCarriers({ origin, now: () => clock.now() });
  const jobs = startJobs(origin);
  warmPlanner();
  closeAll = async () => {
    await jobs.stop();
    await closePlanner();
    await carriers.close();
  };
  process.stdout.write(`furlong ready ${origin}\n`);
}

let stopping = false;
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const)
  process.on(signal, () => {
    if (stopping) return;
    stopping = true;
    // Connections that stay open must not keep a stopped server alive.
    setTimeout(() => process.exit(0), 5000).unref();
    void finishCalls()
      .then(() => closeAll())
      .then(() => database.close())
      .finally(() => process.exit(0));
  });

/** Takes no new calls and lets those under way have their answers, for three seconds at most. */
async function finishCalls(): Promise<void> {
  const finished = new Promise((resolve) => server.close(resolve));
  const idle = setInterval(() => server.closeIdleConnections(), 50);
  const late = new Promise((resolve) => setTimeout(resolve, 3000).unref());
  await Promise.race([finished, late]);
  clearInterval(idle);
}

function stopWith(error: Error): never {
  log.fatal({ err: error }, 'the server cannot start');
  process.stderr.write(`Furlong cannot start on ${env.host}:${env.port}: ${error.message}\n`);
  process.exit(1);
}

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
  else void ready();
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
    server.close();
    server.closeIdleConnections();
    void closeAll()
      .then(() => database.close())
      .finally(() => process.exit(0));
  });

function stopWith(error: Error): never {
  log.fatal({ err: error }, 'the server cannot listen');
  process.stderr.write(`Furlong cannot listen on ${env.host}:${env.port}: ${error.message}\n`);
  process.exit(1);
}

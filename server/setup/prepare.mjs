import { runToEnd } from './childProcess.mjs';
import { ensureClient } from './clientBuild.mjs';
import { startOwnDatabase } from './ownDatabase.mjs';
import { dataFolder } from './projectRoot.mjs';
import { step } from './say.mjs';
import { seedLine } from './seedLine.mjs';

/**
 * Everything between installed node modules and a server that can start: database, tables, and for
 * the demo its town and its business.
 * @param {import('./startMode.mjs').StartMode} mode
 * @param {{ client: boolean }} needs `client` false leaves the build to Vite's own server
 * @returns {Promise<Prepared>}
 *
 * @typedef {object} Prepared
 * @property {NodeJS.ProcessEnv} env for the server
 * @property {import('./seedLine.mjs').SignIn[]} signIns of the demo; empty without
 * @property {import('./mariadb.mjs').Mariadb | undefined} database ours, when we started one
 */
export async function prepare(mode, needs) {
  // No two of these need each other, and each waits on something else (disk, CPU, a child's start).
  const [opened] = await Promise.all([
    openDatabase(mode),
    needs.client ? ensureClient() : undefined,
    mode.demo ? importDemoTown() : undefined,
  ]);
  const signIns = mode.demo ? await seed(opened.env) : [];
  return { ...opened, signIns };
}

/** @param {import('./startMode.mjs').StartMode} mode */
async function openDatabase(mode) {
  const database = mode.databaseUrl ? undefined : await startOwnDatabase();
  const env = {
    DATABASE_URL: mode.databaseUrl ?? database?.url,
    HOST: mode.host,
    NODE_ENV: mode.nodeEnv,
    FURLONG_DATA: dataFolder,
    FURLONG_FAKES: mode.demo ? '1' : undefined,
  };
  await runTool('Bringing the tables up to date', ['server/db/migrateCli.ts'], env);
  return { database, env };
}

function importDemoTown() {
  const env = { FURLONG_DATA: dataFolder };
  return runTool('Importing the demo town', ['server/area/cli.ts', 'town'], env);
}

/** @param {NodeJS.ProcessEnv} env */
async function seed(env) {
  /** @type {import('./seedLine.mjs').SignIn[]} */
  let signIns = [];
  await step('Filling the demo business', async (progress) => {
    await runToEnd('The demo seed', process.execPath, tsx('server/db/seedCli.ts'), {
      env,
      onLine: (line) => {
        const read = seedLine(line);
        if ('signIns' in read) signIns = read.signIns;
        else if ('progress' in read) progress(read.progress);
      },
    });
  });
  return signIns;
}

/** @param {string} label @param {string[]} script @param {NodeJS.ProcessEnv} env */
function runTool(label, script, env) {
  return step(label, (progress) =>
    runToEnd(label, process.execPath, tsx(...script), { env, onLine: progress }),
  );
}

/** @param {...string} script @returns {string[]} node's arguments that run a .ts file */
export function tsx(...script) {
  return ['--import', 'tsx', ...script];
}

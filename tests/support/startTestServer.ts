import { type ChildProcess, spawn } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createInterface } from 'node:readline';
import { fileURLToPath } from 'node:url';
import mariadb from 'mariadb';

export interface DemoSignIn {
  role: string;
  name: string;
  email: string;
  password: string;
}

/** The real server in a process of its own, on a database and data folder of its own. */
export interface TestServer {
  /** `http://127.0.0.1:PORT`; the port stays the same over `kill` and `restart`. */
  origin: string;
  /** The demo's sign-in of a person, by first name. Throws for a name the demo does not have. */
  signInOf(name: string): DemoSignIn;
  /** What the server has written since it began, for a test that failed. */
  output(): string;
  /** Ends the server without a word (kill -9), as a power cut would. */
  kill(): Promise<void>;
  /** Starts it again on the same port, database and folder. */
  restart(): Promise<void>;
  /** Stops the server and removes database and folder. */
  stop(): Promise<void>;
}

/**
 * Where the demo's clock stands when the server starts: Wednesday 16 June 2027, 7:40 in the Azores.
 * A fixed morning gives the same demo day on every machine and at every hour.
 */
export const demoDate = '2027-06-16';
const demoStart = Date.parse(`${demoDate}T07:40:00Z`);

/**
 * Starts Furlong as `npm start` would: tables, then with `demo` the town and the demo business, then
 * the server. Needs `TEST_DATABASE_URL` (`npm test` sets it) and a built client. The demo takes about
 * half a minute.
 */
export async function startTestServer({ demo }: { demo: boolean }): Promise<TestServer> {
  const database = await makeDatabase();
  const folder = mkdtempSync(join(tmpdir(), 'furlong-e2e-'));
  const env = {
    ...process.env,
    DATABASE_URL: database.url,
    FURLONG_DATA: folder,
    FURLONG_FAKES: '1',
    FURLONG_CLOCK_OFFSET_MS: String(demoStart - Date.now()),
    NODE_ENV: 'development',
    HOST: '127.0.0.1',
    PORT: '0',
  };
  let running: RunningServer | null = null;
  const stop = async () => {
    await running?.end('SIGTERM');
    await database.drop();
    rmSync(folder, { recursive: true, force: true });
  };
  try {
    await runToEnd(['server/db/migrateCli.ts'], env);
    if (demo) {
      await runToEnd(['server/area/cli.ts', 'town'], env);
      await runToEnd(['server/db/seedCli.ts'], env);
    }
    // The seed took its time; the day itself begins with the server.
    env.FURLONG_CLOCK_OFFSET_MS = String(demoStart - Date.now());
    running = await startServer(env);
  } catch (error) {
    await stop();
    throw error;
  }
  const { origin } = running;
  const kept = join(folder, 'demo-sign-ins.json');
  const signIns = demo ? (JSON.parse(readFileSync(kept, 'utf8')) as DemoSignIn[]) : [];
  let written = '';
  return {
    origin,
    signInOf(name) {
      const found = signIns.find((one) => one.name === name);
      if (!found) throw new Error(`The demo has no ${name}.`);
      return found;
    },
    output: () => written + (running?.output() ?? ''),
    async kill() {
      await running?.end('SIGKILL');
      written += running?.output() ?? '';
      running = null;
    },
    async restart() {
      running = await startServer({ ...env, PORT: new URL(origin).port });
    },
    stop,
  };
}

interface RunningServer {
  origin: string;
  output(): string;
  end(signal: NodeJS.Signals): Promise<void>;
}

/** Resolves once the server says it is ready; throws with what it wrote when it ends before. */
async function startServer(env: NodeJS.ProcessEnv): Promise<RunningServer> {
  const child = startNode(['server/main.ts'], env);
  let output = '';
  const ended = new Promise<void>((resolve) => child.once('close', () => resolve()));
  const origin = await new Promise<string>((resolve, reject) => {
    for (const stream of [child.stdout!, child.stderr!])
      createInterface({ input: stream }).on('line', (line) => {
        output = `${output}${line}\n`.slice(-20_000);
        const ready = /^furlong ready (\S+)$/.exec(line)?.[1];
        if (ready) resolve(ready);
      });
    void ended.then(() => reject(new Error(`The server ended before it was ready:\n${output}`)));
  });
  return {
    origin,
    output: () => output,
    async end(signal) {
      child.kill(signal);
      await ended;
    },
  };
}

async function runToEnd(args: string[], env: NodeJS.ProcessEnv): Promise<void> {
  const child = startNode(args, env);
  let output = '';
  for (const stream of [child.stdout!, child.stderr!])
    stream.on('data', (chunk: Buffer) => (output = (output + chunk.toString()).slice(-5000)));
  const code = await new Promise<number | null>((resolve) => child.once('close', resolve));
  if (code !== 0) throw new Error(`${args.join(' ')} ended with ${code}:\n${output}`);
}

function startNode(args: string[], env: NodeJS.ProcessEnv): ChildProcess {
  const child = spawn(process.execPath, ['--import', 'tsx', ...args], {
    cwd: fileURLToPath(new URL('../..', import.meta.url)),
    env,
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  // Should the tests end without their `afterAll`, no server stays behind.
  const end = () => child.kill('SIGKILL');
  process.once('exit', end);
  child.once('close', () => process.off('exit', end));
  return child;
}

async function makeDatabase(): Promise<{ url: string; drop: () => Promise<void> }> {
  const serverUrl = process.env.TEST_DATABASE_URL;
  if (!serverUrl) throw new Error('TEST_DATABASE_URL is not set: run the tests with npm test');
  const name = `e2e_${randomBytes(6).toString('hex')}`;
  const onServer = async (sql: string) => {
    const connection = await mariadb.createConnection(`${serverUrl}mysql`);
    await connection.query(sql);
    await connection.end();
  };
  await onServer(`CREATE DATABASE ${name} CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`);
  return { url: `${serverUrl}${name}`, drop: () => onServer(`DROP DATABASE ${name}`) };
}

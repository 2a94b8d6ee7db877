// Import this first: it points the server's environment at a database of the test file's own
// before any server module reads it.
import { randomBytes } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import mariadb from 'mariadb';

const serverUrl = process.env.TEST_DATABASE_URL;
if (!serverUrl) throw new Error('TEST_DATABASE_URL is not set: run the tests with npm test');
const name = `t_${randomBytes(6).toString('hex')}`;
const folder = mkdtempSync(join(tmpdir(), 'furlong-api-'));
Object.assign(process.env, {
  DATABASE_URL: `${serverUrl}${name}`,
  FURLONG_DATA: folder,
  FURLONG_FAKES: '1',
  NODE_ENV: 'test',
});

/** Makes the database with all tables. Call once, in `beforeAll`. */
export async function makeDatabase(): Promise<void> {
  await onServer(`CREATE DATABASE ${name} CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`);
  const { migrate } = await import('#server/db/migrate.ts');
  await migrate();
}

/** Closes the pool and removes database and data folder. Call in `afterAll`. */
export async function dropDatabase(): Promise<void> {
  const { database } = await import('#server/db/database.ts');
  await database.close();
  await onServer(`DROP DATABASE ${name}`);
  rmSync(folder, { recursive: true, force: true });
}

async function onServer(sql: string): Promise<void> {
  const connection = await mariadb.createConnection(`${serverUrl}mysql`);
  await connection.query(sql);
  await connection.end();
}

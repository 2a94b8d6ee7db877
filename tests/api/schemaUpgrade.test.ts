import { dropDatabase, makeDatabase } from '../support/freshDatabase.ts';
import { readFileSync } from 'node:fs';
import { QueryTypes } from 'sequelize';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { getDay } from '#shared/api/days.ts';
import { buildApp } from '#server/app.ts';
import { database } from '#server/db/database.ts';
import { migrate } from '#server/db/migrate.ts';
import { ApiClient } from '../support/apiClient.ts';

interface Dump {
  tables: { name: string; create: string; rows: Record<string, unknown>[] }[];
}

/** The schema and a small business as they first landed. Never edited: migrations lead from here. */
const first = JSON.parse(
  readFileSync(new URL('../fixtures/schema/first.json', import.meta.url), 'utf8'),
) as Dump;

beforeAll(makeDatabase);
afterAll(dropDatabase);

it('leads from the first landed schema to the one a new database gets, rows and all', async () => {
  const fresh = await schema();
  expect(Object.keys(fresh).length).toBeGreaterThan(first.tables.length);
  await load(first);
  expect(await migrate()).toBeGreaterThan(0);
  expect(await schema()).toEqual(fresh);

  // The business goes on as if nothing had happened: its operator signs in and opens the board.
  const rowsOf = (name: string) => first.tables.find((table) => table.name === name)!.rows;
  const client = await new ApiClient(buildApp()).signIn(
    String(rowsOf('users')[0]!.email),
    'scissors and comb',
  );
  const date = String(rowsOf('visits')[0]!.date);
  const day = await client.must(getDay, { params: { date } });
  expect(day.visits.map((visit) => visit.householdName)).toEqual(['Adeyemi']);
  expect(day.runs.find((run) => run.sentVersion === 1)).toBeDefined();
});

/** Every table as MariaDB would make it again. */
async function schema(): Promise<Record<string, string>> {
  const made: Record<string, string> = {};
  for (const name of await tableNames()) {
    const [row] = await database.query<{ 'Create Table': string }>(
      `SHOW CREATE TABLE \`${name}\``,
      {
        type: QueryTypes.SELECT,
      },
    );
    made[name] = row!['Create Table'].replace(/ AUTO_INCREMENT=\d+/, '');
  }
  return made;
}

async function tableNames(): Promise<string[]> {
  const rows = await database.query<{ name: string }>(
    'SELECT TABLE_NAME name FROM information_schema.TABLES WHERE TABLE_SCHEMA = DATABASE() ORDER BY name',
    { type: QueryTypes.SELECT },
  );
  return rows.map(({ name }) => name);
}

/** Puts a dump in place of everything. Foreign keys wait until all of it is there. */
async function load(dump: Dump): Promise<void> {
  const names = await tableNames();
  await database.transaction(async (transaction) => {
    const run = (sql: string, replacements?: unknown[]) =>
      database.query(sql, { transaction, ...(replacements && { replacements }) });
    await run('SET FOREIGN_KEY_CHECKS = 0');
    for (const name of names) await run(`DROP TABLE \`${name}\``);
    for (const { create } of dump.tables) await run(create);
    for (const { name, rows } of dump.tables)
      for (const row of rows) {
        const columns = Object.keys(row).map((column) => `\`${column}\``);
        await run(
          `INSERT INTO \`${name}\` (${columns.join(', ')}) VALUES (${columns.map(() => '?').join(', ')})`,
          Object.values(row),
        );
      }
    await run('SET FOREIGN_KEY_CHECKS = 1');
  });
}

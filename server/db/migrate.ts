import { readdir } from 'node:fs/promises';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { join } from 'node:path';
import { QueryTypes } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import { database } from './database.ts';
import type { Migration } from './table.ts';

const folder = fileURLToPath(new URL('./migrations', import.meta.url));

/**
 * Brings the schema up to date, or with 'down' takes it all back; answers the number of steps. Safe
 * to run again, and by two processes (an advisory lock).
 */
export async function migrate(
  onStep: (name: string) => void = () => {},
  direction: 'up' | 'down' = 'up',
): Promise<number> {
  const files = (await readdir(folder)).filter((file) => file.endsWith('.ts')).sort();
  const umzug = new Umzug({
    migrations: files.map((file) => ({
      name: file.replace(/\.ts$/, ''),
      up: async () => (await load(file)).up(database.getQueryInterface()),
      down: async () => (await load(file)).down(database.getQueryInterface()),
    })),
    storage: new SequelizeStorage({ sequelize: database, tableName: 'migrations' }),
    logger: undefined,
  });
  umzug.on('migrated', ({ name }) => onStep(name));
  umzug.on('reverted', ({ name }) => onStep(name));
  return database.transaction(async (lock) => {
    const rows = await database.query<{ got: number }>(
      "SELECT GET_LOCK('furlong-migrate', 60) AS got",
      {
        type: QueryTypes.SELECT,
        transaction: lock,
      },
    );
    if (Number(rows[0]?.got) !== 1)
      throw new Error('Another process is still migrating the database.');
    try {
      return (await (direction === 'up' ? umzug.up() : umzug.down({ to: 0 }))).length;
    } finally {
      await database.query("DO RELEASE_LOCK('furlong-migrate')", { transaction: lock });
    }
  });
}

async function load(file: string): Promise<Migration> {
  return (await import(pathToFileURL(join(folder, file)).href)) as Migration;
}

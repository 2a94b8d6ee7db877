import { app, useApp } from '../support/useApp.ts';
import { QueryTypes } from 'sequelize';
import { expect, it } from 'vitest';
import { updateBusiness } from '#shared/api/business.ts';
import { database } from '#server/db/database.ts';
import { migrate } from '#server/db/migrate.ts';
import { ApiClient } from '../support/apiClient.ts';

useApp();

const rows = <Row extends object>(sql: string) =>
  database.query<Row>(sql, { type: QueryTypes.SELECT });
const columns = () =>
  rows(
    `SELECT TABLE_NAME, COLUMN_NAME, COLUMN_TYPE, IS_NULLABLE, COLUMN_KEY, COLLATION_NAME
      FROM information_schema.COLUMNS WHERE TABLE_SCHEMA = DATABASE()
      ORDER BY TABLE_NAME, ORDINAL_POSITION`,
  );

it('lets one business have a number, also when two ask at once', async () => {
  const [one, two] = [await new ApiClient(app).signUp(), await new ApiClient(app).signUp()];
  const body = { senderPhone: '+447700900555' };
  const answers = await Promise.all([one, two].map((as) => as.call(updateBusiness, { body })));
  expect(answers.map((answer) => answer.status).sort()).toEqual([200, 400]);
  expect(answers.find((answer) => answer.status === 400)!.error.fields).toEqual({
    senderPhone: 'is another business’s number',
  });
});

it('binds every row of a business to it: keys between its tables begin with the business', async () => {
  const keys = await rows<{ name: string; target: string; columns: string }>(
    `SELECT CONCAT(TABLE_NAME, ' → ', REFERENCED_TABLE_NAME) name, REFERENCED_TABLE_NAME target,
        GROUP_CONCAT(COLUMN_NAME ORDER BY ORDINAL_POSITION) columns
      FROM information_schema.KEY_COLUMN_USAGE
      WHERE TABLE_SCHEMA = DATABASE() AND REFERENCED_TABLE_NAME IS NOT NULL
      GROUP BY TABLE_NAME, REFERENCED_TABLE_NAME, CONSTRAINT_NAME`,
  );
  const inside = keys.filter(({ target }) => !['businesses', 'users'].includes(target));
  expect(inside.length).toBeGreaterThan(20);
  expect(inside.filter((key) => !/^businessId,\w+$/.test(key.columns))).toEqual([]);
  const owned = new Set(
    keys.flatMap(({ name, target }) => (target === 'businesses' ? name.split(' ')[0]! : [])),
  );
  const tables = (
    await rows<{ TABLE_NAME: string }>(
      'SELECT TABLE_NAME FROM information_schema.TABLES WHERE TABLE_SCHEMA = DATABASE()',
    )
  ).map((table) => table.TABLE_NAME);
  expect(tables.filter((name) => !owned.has(name)).sort()).toEqual([
    'businesses',
    'migrations',
    'passwordResets',
    'users',
  ]);
});

it('keeps milliseconds in every time and every letter in every text', async () => {
  const all = (await columns()) as { COLUMN_TYPE: string; COLLATION_NAME: string | null }[];
  expect(all.filter((one) => one.COLUMN_TYPE.startsWith('timestamp'))).toEqual([]);
  const times = all.filter((one) => one.COLUMN_TYPE.startsWith('datetime'));
  expect(new Set(times.map((one) => one.COLUMN_TYPE))).toEqual(new Set(['datetime(3)']));
  const texts = all.flatMap((one) => one.COLLATION_NAME ?? []);
  expect(texts.filter((name) => !name.startsWith('utf8'))).toEqual([]);
});

it('runs again without effect, goes down to nothing and comes up the same', async () => {
  const before = await columns();
  expect(await migrate()).toBe(0);
  const steps = await migrate(undefined, 'down');
  expect(steps).toBeGreaterThan(25);
  expect(await rows('SHOW TABLES')).toHaveLength(1);
  expect(await migrate()).toBe(steps);
  expect(await columns()).toEqual(before);
});

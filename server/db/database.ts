import { AsyncLocalStorage } from 'node:async_hooks';
import { Sequelize, Transaction } from 'sequelize';
import { env } from '#server/env.ts';
import { log } from '#server/log.ts';
import { currentScope, hasTransaction, withScope } from './scope.ts';

/** One pool per process. Times are UTC on the wire and in the tables. */
export const database = new Sequelize(env.databaseUrl, {
  dialect: 'mariadb',
  timezone: '+00:00',
  logging: process.env.LOG_SQL ? (sql) => log.warn(sql) : false,
  pool: { max: 10, min: 0, acquire: 20_000, idle: 10_000 },
  define: {
    charset: 'utf8mb4',
    collate: 'utf8mb4_unicode_ci',
    timestamps: false,
    freezeTableName: true,
  },
  dialectOptions: { connectTimeout: 5000, bigIntAsNumber: true, insertIdAsNumber: true },
});

const { READ_COMMITTED, REPEATABLE_READ } = Transaction.ISOLATION_LEVELS;

/**
 * Opens the business's scope and a transaction around `fn`, or joins the transaction already open;
 * another business inside it is a programming error. A use-case that only reads sees everything as
 * of one moment. One that writes sees what is committed: after waiting for a lock it must find what
 * the holder wrote, which a picture taken before the wait would hide.
 */
export async function inBusiness<Result>(
  businessId: string,
  fn: () => Promise<Result>,
  options: { onlyReads?: boolean } = {},
): Promise<Result> {
  const scope = currentScope();
  if (scope !== null && scope !== 'across' && scope !== businessId)
    throw new Error('inBusiness: already inside another business');
  // Joining also matters for rows just written: a second connection would wait for the first.
  const isolation = options.onlyReads ? REPEATABLE_READ : READ_COMMITTED;
  return withScope(businessId, () => (hasTransaction() ? fn() : transact(fn, isolation)));
}

/** A transaction over global tables only (users, sessions): scoped tables still refuse. */
export function inTransaction<Result>(fn: () => Promise<Result>): Promise<Result> {
  return hasTransaction() ? fn() : transact(fn);
}

/**
 * Unscoped reading and writing of business tables. Named unsafe on purpose: only for finding a
 * business by a secret (a link, a sign-in) and for the tickers (outbox, upkeep).
 */
export function unsafeAcrossBusinesses<Result>(fn: () => Promise<Result>): Promise<Result> {
  return withScope('across', () => (hasTransaction() ? fn() : transact(fn)));
}

const afterCommits = new AsyncLocalStorage<(() => void)[]>();

/** Runs `fn` once the surrounding transaction has committed; at once when there is none. */
export function afterCommit(fn: () => void): void {
  const list = afterCommits.getStore();
  if (list) list.push(fn);
  else fn();
}

async function transact<Result>(
  fn: () => Promise<Result>,
  isolationLevel = READ_COMMITTED,
): Promise<Result> {
  const list: (() => void)[] = [];
  const result = await afterCommits.run(list, () => withDeadlockRetry(list, fn, isolationLevel));
  for (const run of list) run();
  return result;
}

/** MariaDB picks a victim when two transactions wait for each other; the work is whole, so run it again. */
async function withDeadlockRetry<Result>(
  list: (() => void)[],
  fn: () => Promise<Result>,
  isolationLevel: Transaction.ISOLATION_LEVELS,
): Promise<Result> {
  for (let attempt = 1; ; attempt++) {
    try {
      list.length = 0;
      return await database.transaction({ isolationLevel }, () => fn());
    } catch (error) {
      if (attempt >= 4 || !isDeadlock(error)) throw error;
    }
  }
}

function isDeadlock(error: unknown): boolean {
  const parent = (error as { parent?: { errno?: number } }).parent;
  return parent?.errno === 1213 || parent?.errno === 1020;
}

import { QueryTypes } from 'sequelize';
import { database } from '../database.ts';

/**
 * Ids of texts whose turn it is, locked until the transaction around it ends; rows another process
 * has locked are passed over (Sequelize's own `skipLocked` does nothing on MariaDB). `leaseUntil`
 * holds back both a waiting row's next try and a row some process is just working on.
 */
export async function claimDueTexts(now: Date, limit: number): Promise<string[]> {
  // Found without locks and then locked by primary key: locking along the status index would lock
  // more rows than it takes, and in the opposite order to a status update, which ends in deadlocks.
  // More are found than wanted, because other processes may hold the first ones.
  const lost = await findDue('attempting', now, limit * 4);
  const found = [...lost, ...(await findDue('waiting', now, limit * 4))];
  if (found.length === 0) return [];
  const rows = await database.query<{ id: string }>(
    `SELECT id FROM outbox FORCE INDEX (PRIMARY)
      WHERE id IN (:found) AND status IN ('waiting', 'attempting')
        AND (leaseUntil IS NULL OR leaseUntil <= :now)
      LIMIT ${Math.trunc(limit)} FOR UPDATE SKIP LOCKED`,
    { type: QueryTypes.SELECT, replacements: { found, now: sqlTime(now) } },
  );
  return rows.map((row) => row.id);
}

async function findDue(status: string, now: Date, limit: number): Promise<string[]> {
  const rows = await database.query<{ id: string }>(
    `SELECT id FROM outbox
      WHERE status = :status AND dueAt <= :now AND (leaseUntil IS NULL OR leaseUntil <= :now)
      ORDER BY dueAt, id LIMIT ${Math.trunc(limit)}`,
    { type: QueryTypes.SELECT, replacements: { status, now: sqlTime(now) } },
  );
  return rows.map((row) => row.id);
}

/** As text, because a Date loses its milliseconds on the way. */
function sqlTime(now: Date): string {
  return now.toISOString().slice(0, 23).replace('T', ' ');
}

import { QueryTypes } from 'sequelize';
import { database } from '../database.ts';

/**
 * Ids of texts whose turn it is, locked until the transaction around it ends; rows another process
 * has locked are passed over (Sequelize's own `skipLocked` does nothing on MariaDB). `leaseUntil`
 * holds back both a waiting row's next try and a row some process is just working on.
 */
export async function claimDueTexts(now: Date, limit: number): Promise<string[]> {
  const rows = await database.query<{ id: string }>(
    `SELECT id FROM outbox
      WHERE status IN ('waiting', 'attempting') AND dueAt <= :now
        AND (leaseUntil IS NULL OR leaseUntil <= :now)
      ORDER BY dueAt, id LIMIT ${Math.trunc(limit)} FOR UPDATE SKIP LOCKED`,
    // As text, because a Date loses its milliseconds on the way.
    {
      type: QueryTypes.SELECT,
      replacements: { now: now.toISOString().slice(0, 23).replace('T', ' ') },
    },
  );
  return rows.map((row) => row.id);
}

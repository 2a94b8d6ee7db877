import type { QueryInterface } from 'sequelize';

export interface Migration {
  up(query: QueryInterface): Promise<void>;
  down(query: QueryInterface): Promise<void>;
}

/** A migration that makes one table. MariaDB's DDL does not roll back, so it can run again. */
export function table(name: string, columns: string): Migration {
  return {
    async up(query) {
      await query.sequelize.query(
        `CREATE TABLE IF NOT EXISTS \`${name}\` (${columns}) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci`,
      );
    },
    async down(query) {
      await query.sequelize.query(`DROP TABLE IF EXISTS \`${name}\``);
    },
  };
}

/** First columns of every table of a business. Foreign keys are composite: includes and joins cannot cross. */
export const owned = `
  id UUID NOT NULL PRIMARY KEY,
  businessId UUID NOT NULL,
  UNIQUE KEY ofBusiness (businessId, id)`;

/** A composite foreign key to another table of the same business. */
export function owns(column: string, target: string, onDelete = 'RESTRICT'): string {
  return `FOREIGN KEY (businessId, ${column}) REFERENCES \`${target}\` (businessId, id) ON DELETE ${onDelete}`;
}

export const ofBusiness = 'FOREIGN KEY (businessId) REFERENCES businesses (id) ON DELETE CASCADE';

/** A migration that adds columns to a table that is there already, all or none. */
export function addColumns(name: string, columns: Record<string, string>): Migration {
  const run = (query: QueryInterface, parts: string[]) =>
    query.sequelize.query(`ALTER TABLE \`${name}\` ${parts.join(', ')}`);
  return {
    async up(query) {
      await run(
        query,
        Object.entries(columns).map(([key, type]) => `ADD COLUMN IF NOT EXISTS ${key} ${type}`),
      );
    },
    async down(query) {
      await run(
        query,
        Object.keys(columns).map((key) => `DROP COLUMN IF EXISTS ${key}`),
      );
    },
  };
}

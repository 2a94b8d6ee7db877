import { styles } from '#shared/grooming/styles.ts';
import type { Style } from '#shared/grooming/types.ts';
import { Style as StyleRow } from '#server/models/Style.ts';

/** A style and where it comes from. */
export interface KnownStyle {
  style: Style;
  source: 'starting' | 'own';
  basedOn: string | null;
  retired: boolean;
}

const starting = new Map(
  styles.map((style): [string, KnownStyle] => [
    style.id,
    { style, source: 'starting', basedOn: null, retired: false },
  ]),
);

export const startingStyles = [...starting.values()];

/** The styles with these ids, starting or own, in one query at most; unknown ids are left out. */
export async function findStyles(ids: Iterable<string>): Promise<Map<string, KnownStyle>> {
  const found = new Map<string, KnownStyle>();
  const own: string[] = [];
  for (const id of new Set(ids)) {
    const known = starting.get(id);
    if (known) found.set(id, known);
    else if (uuid.test(id)) own.push(id);
  }
  if (own.length > 0)
    for (const row of await StyleRow.findAll({ where: { id: own } })) found.set(row.id, known(row));
  return found;
}

/** Anything else in a UUID column makes the database complain instead of finding nothing. */
const uuid = /^[\da-f]{8}(-[\da-f]{4}){3}-[\da-f]{12}$/i;

export function known(row: StyleRow): KnownStyle {
  const { id, name, species, coats, cuts, finish, services, planB } = row;
  return {
    style: { id, name, species, coats, cuts, finish, services, planB },
    source: 'own',
    basedOn: row.basedOn ?? null,
    retired: row.retired,
  };
}

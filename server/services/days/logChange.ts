import type { Move, Plan } from '#shared/schedule/types.ts';
import type { Day } from '#server/models/Day.ts';
import { DayChange } from '#server/models/DayChange.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';

/**
 * Writes one line of the day's log under the day's lock. `seq` is the day's new version, so log and
 * later streams share one order. `before`/`after` are kept for changes undo can take back.
 */
export async function logChange(
  day: Day,
  entry: {
    actor: Pick<Actor, 'userId' | 'userName'> | null;
    now: Date;
    kind: string;
    words: string;
    move?: Move;
    before?: Plan;
    after?: Plan;
    undoes?: string;
  },
): Promise<DayChange> {
  const seq = day.version + 1;
  await day.update({ version: seq });
  return DayChange.create({
    dayId: day.id,
    seq,
    at: entry.now,
    userId: entry.actor?.userId ?? null,
    who: entry.actor?.userName ?? 'Furlong',
    kind: entry.kind,
    words: entry.words.slice(0, 300),
    move: entry.move ?? null,
    before: entry.before ?? null,
    after: entry.after ?? null,
    undoes: entry.undoes ?? null,
  });
}

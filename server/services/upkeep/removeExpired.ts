import { Op } from 'sequelize';
import { unsafeAcrossBusinesses } from '#server/db/database.ts';
import { ArrivalLink } from '#server/models/ArrivalLink.ts';
import { DayChange } from '#server/models/DayChange.ts';
import { Invitation } from '#server/models/Invitation.ts';
import { PasswordReset } from '#server/models/PasswordReset.ts';
import { Proposal } from '#server/models/Proposal.ts';
import { RunFix } from '#server/models/RunFix.ts';
import { Session } from '#server/models/Session.ts';

const dayMs = 86_400_000;
/** At most this many rows of a kind at once, so that no sweep holds many locks for long. */
const limit = 5000;

/**
 * Removes what only took up room, of every business: sign-ins and links that are over, places of
 * vans older than a day (there is no trail), offers nobody can keep any more, and the plans by which
 * moves of a month ago were taken back. What happened, was promised or was sent stays.
 */
export async function removeExpired(now: Date): Promise<void> {
  const before = (days: number) => ({ [Op.lt]: new Date(now.getTime() - days * dayMs) });
  // Links stay a month longer, so that an old text still says that its visit is over.
  await inTurn(
    () => RunFix.destroy({ where: { at: before(1) }, limit }),
    () => Session.destroy({ where: { expiresAt: before(0) }, limit }),
    () => Session.destroy({ where: { revokedAt: before(30) }, limit }),
    () => PasswordReset.destroy({ where: { expiresAt: before(30) }, limit }),
    () => Invitation.destroy({ where: { expiresAt: before(30) }, limit }),
    () => ArrivalLink.destroy({ where: { expiresAt: before(30) }, limit }),
    () => Proposal.destroy({ where: { createdAt: before(7) }, limit }),
    () =>
      DayChange.update(
        { move: null, before: null, after: null },
        { where: { at: before(30), move: { [Op.ne]: null } }, limit },
      ),
  );
}

/** Each in a transaction of its own: a sweep broken off half-way has still swept. */
async function inTurn(...steps: (() => Promise<unknown>)[]): Promise<void> {
  for (const step of steps) await unsafeAcrossBusinesses(step);
}

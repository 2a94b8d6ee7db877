import { AppError, notFound } from '#server/errors.ts';
import { Run } from '#server/models/Run.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';

/** True for the run's own groomer; a dispatcher or operator may stand in for anyone. */
export function mayWork(actor: Actor, run: Run): boolean {
  return run.groomerId === actor.groomerId || isDesk(actor);
}

export function isDesk(actor: Actor): boolean {
  return actor.roles.includes('dispatcher') || actor.roles.includes('operator');
}

/** The run, when the actor may work it. */
export async function needRun(actor: Actor, runId: string, lock = false): Promise<Run> {
  const run = await Run.findByPk(runId, { lock });
  if (!run) throw notFound('run');
  if (!mayWork(actor, run)) throw new AppError('notAllowed', 'This is another groomer’s run.');
  return run;
}

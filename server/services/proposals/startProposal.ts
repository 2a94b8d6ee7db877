import type { DayProblem, Plan } from '#shared/schedule/types.ts';
import { afterCommit } from '#server/db/database.ts';
import { AppError } from '#server/errors.ts';
import { Proposal, type ProposalScope } from '#server/models/Proposal.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { loadDay } from '#server/services/days/loadDay.ts';
import { lockDay } from '#server/services/days/lockDay.ts';
import { leaseMs, searchProposal } from './searchProposal.ts';

/**
 * Starts a search for a better day in the worker thread. One runs per day: a second click gets the
 * one already working. The seed comes from the day's version, so the same draft gives the same offer.
 */
export async function startProposal(
  actor: Actor,
  date: string,
  options: { scope: ProposalScope; seconds: number },
  now: Date,
): Promise<{ proposal: Proposal; date: string }> {
  const day = await lockDay(date);
  const open = await Proposal.findOne({ where: { dayId: day.id, state: 'working' } });
  if (open && open.leaseUntil && open.leaseUntil > now) return { proposal: open, date };
  await Proposal.update(
    { state: 'dropped' },
    { where: { dayId: day.id, state: ['working', 'ready'] } },
  );
  const loaded = await loadDay(actor.businessId, date, now);
  if (loaded.problem.vans.length === 0)
    throw new AppError(
      'notReady',
      'No van has a shift on this day. Set one in Setup, then ask again.',
    );
  if (loaded.problem.visits.length === 0)
    throw new AppError('notReady', 'No visit is booked on this day.');
  const proposal = await Proposal.create({
    dayId: day.id,
    scope: options.scope,
    state: 'working',
    runVersions: Object.fromEntries(loaded.runs.map(({ run }) => [run.vanId, run.version])),
    plan: null,
    seed: day.version,
    leaseUntil: new Date(now.getTime() + leaseMs),
    createdAt: now,
    createdBy: actor.userName,
  });
  const { problem, plan } = narrow(loaded.problem, loaded.plan, options.scope);
  afterCommit(
    () => void searchProposal(actor.businessId, proposal.id, problem, plan, options.seconds, now),
  );
  return { proposal, date };
}

/** For 'only what is not placed', every placed visit is pinned to its van and keeps its order by cost. */
function narrow(
  problem: DayProblem,
  plan: Plan,
  scope: ProposalScope,
): { problem: DayProblem; plan: Plan } {
  if (scope === 'day') return { problem, plan };
  const vanOf = new Map(
    plan.runs.flatMap((run) => run.stops.map((stop) => [stop.id, run.vanId] as const)),
  );
  return {
    problem: {
      ...problem,
      visits: problem.visits.map((visit) => {
        const vanId = vanOf.get(visit.id);
        return vanId ? { ...visit, pin: { ...visit.pin, vanId } } : visit;
      }),
    },
    plan,
  };
}

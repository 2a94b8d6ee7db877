import { AppError, notFound } from '#server/errors.ts';
import { Day } from '#server/models/Day.ts';
import { Proposal } from '#server/models/Proposal.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { type LoadedDay, loadDay } from '#server/services/days/loadDay.ts';
import { lockDay } from '#server/services/days/lockDay.ts';
import { logChange } from '#server/services/days/logChange.ts';
import { type Conflict, makeMove } from '#server/services/days/moveVisit.ts';
import { savePlan } from '#server/services/days/savePlan.ts';
import { stopSearch } from './searchProposal.ts';

/** How far a proposal is. One whose server died is told as failed. */
export async function getProposal(
  proposalId: string,
  now: Date,
): Promise<{ proposal: Proposal; date: string }> {
  const proposal = await needProposal(proposalId);
  if (proposal.state === 'working' && proposal.leaseUntil && proposal.leaseUntil < now)
    await proposal.update({
      state: 'failed',
      message: 'The search did not finish. Nothing changed; ask again.',
    });
  return { proposal, date: (await Day.findByPk(proposal.dayId))!.date };
}

/** Makes the offered day the draft, as one move that undo takes back. */
export async function keepProposal(
  actor: Actor,
  proposalId: string,
  now: Date,
): Promise<LoadedDay | Conflict> {
  const found = await needProposal(proposalId);
  const { date } = (await Day.findByPk(found.dayId))!;
  const day = await lockDay(date);
  const proposal = await needProposal(proposalId, true);
  if (proposal.state !== 'ready' || !proposal.plan)
    throw new AppError(
      'refusedMove',
      proposal.state === 'kept'
        ? 'This proposal was kept already.'
        : 'This proposal is no longer on offer.',
    );
  const loaded = await loadDay(actor.businessId, date, now, { lock: true });
  if (hasMovedOn(loaded, proposal)) return { conflict: true, day: loaded };
  const move = { kind: 'replacePlan' as const, plan: proposal.plan };
  const next = makeMove(loaded, move);
  await proposal.update({ state: 'kept' });
  if (next === loaded.plan) return loaded;
  await logChange(day, {
    actor,
    now,
    kind: 'keepProposal',
    words: 'A better day kept',
    move,
    before: loaded.plan,
    after: next,
  });
  return savePlan(loaded, next);
}

/** Drops a proposal; while it is working the search stops. */
export async function dropProposal(
  proposalId: string,
): Promise<{ proposal: Proposal; date: string }> {
  const proposal = await needProposal(proposalId, true);
  if (proposal.state === 'working' || proposal.state === 'ready')
    await proposal.update({ state: 'dropped' });
  stopSearch(proposalId);
  return { proposal, date: (await Day.findByPk(proposal.dayId))!.date };
}

/** True when a run changed, came or went since the search began, or a visit it places is off. */
function hasMovedOn(loaded: LoadedDay, { plan, runVersions }: Proposal): boolean {
  const vanIds = new Set([...loaded.runs.map(({ van }) => van.id), ...Object.keys(runVersions)]);
  const visitIds = new Set(loaded.problem.visits.map(({ id }) => id));
  const runs = new Map(loaded.runs.map(({ van, run }) => [van.id, run.version]));
  return (
    [...vanIds].some((vanId) => runs.get(vanId) !== runVersions[vanId]) ||
    plan!.runs.some(({ stops }) =>
      stops.some((stop) => stop.kind === 'visit' && !visitIds.has(stop.visitId)),
    )
  );
}

async function needProposal(proposalId: string, lock = false): Promise<Proposal> {
  const proposal = await Proposal.findByPk(proposalId, { lock });
  if (!proposal) throw notFound('proposal');
  return proposal;
}

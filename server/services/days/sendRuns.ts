import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import { restrictToVan } from '#shared/schedule/restrictToVan.ts';
import type { DayTimes, RuleName } from '#shared/schedule/types.ts';
import { areaFor } from '#server/area/openAreas.ts';
import { AppError, badField } from '#server/errors.ts';
import { RunVersion } from '#server/models/RunVersion.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { type LoadedDay, type LoadedRun, loadDay } from './loadDay.ts';
import { lockDay } from './lockDay.ts';
import { logChange } from './logChange.ts';
import { type Conflict, isStale } from './moveVisit.ts';
import { needsSending } from './needsSending.ts';

/** Rules a person may never send a van out with: they are about animals and hands, not minutes. */
const neverSent: RuleName[] = ['skill', 'tableLimit', 'barredGroomer'];

export const evaluatorVersion = 'evaluateDay/1';

/**
 * Fixes a version of the runs for the phones: problem, plan, displayed times and the versions of
 * area, model and evaluator, whole and never changed. Unchanged runs keep the version they have.
 */
export async function sendRuns(
  actor: Actor,
  date: string,
  vanIds: string[] | undefined,
  runVersions: Record<string, number>,
  now: Date,
): Promise<LoadedDay | Conflict> {
  const day = await lockDay(date);
  const loaded = await loadDay(actor.businessId, date, now, { lock: true });
  const chosen = chooseRuns(loaded, vanIds);
  if (
    isStale(
      loaded,
      chosen.map(({ van }) => van.id),
      runVersions,
    )
  )
    return { conflict: true, day: loaded };
  const times = evaluateDay(loaded.problem, loaded.plan);
  refuseUnsafe(loaded, times, chosen);
  const area = loaded.business.areaName ? areaFor(loaded.business.areaName) : null;
  const sent: string[] = [];
  for (const one of chosen) {
    if (!needsSending(loaded, one)) continue;
    await fixVersion(loaded, one, actor.userName, area?.version ?? null, now);
    sent.push(one.van.name);
  }
  if (sent.length > 0)
    await logChange(day, { actor, now, kind: 'sendRuns', words: `Sent to ${sent.join(', ')}` });
  return loadDay(actor.businessId, date, now);
}

function chooseRuns(loaded: LoadedDay, vanIds: string[] | undefined): LoadedRun[] {
  if (!vanIds) return loaded.runs;
  return [...new Set(vanIds)].map((vanId) => {
    const found = loaded.runs.find(({ van }) => van.id === vanId);
    if (!found) throw badField('vanIds', 'must be vans with a shift that day');
    return found;
  });
}

function refuseUnsafe(loaded: LoadedDay, times: DayTimes, chosen: LoadedRun[]): void {
  for (const { van } of chosen) {
    const broken = times.runs
      .find((run) => run.vanId === van.id)
      ?.broken.find((one) => one.hard && !one.inherited && neverSent.includes(one.rule));
    if (!broken) continue;
    const visit = loaded.problem.visits.find((one) => one.id === broken.stopId);
    const why = {
      skill: `needs ${visit?.needs.join(' and ')}`,
      tableLimit: 'has a pet over the table limit',
      barredGroomer: 'does not want this groomer',
    }[broken.rule as 'skill'];
    throw new AppError(
      'refusedMove',
      `${visit?.label ?? 'A visit'} on ${van.name} ${why}. Move it before sending.`,
    );
  }
}

async function fixVersion(
  loaded: LoadedDay,
  { run, van }: LoadedRun,
  sentBy: string,
  areaVersion: string | null,
  now: Date,
): Promise<void> {
  const { problem, plan } = restrictToVan(loaded.problem, loaded.plan, van.id);
  const version = (run.sentVersion ?? 0) + 1;
  const cards = loaded.visits
    .filter(({ visit }) => problem.visits.some((one) => one.id === visit.id))
    .map(({ visit }) => ({
      visitId: visit.id,
      forecast: visit.forecast,
      modelVersion: visit.modelVersion,
    }));
  await RunVersion.create({
    runId: run.id,
    version,
    sentAt: now,
    sentBy,
    problem,
    plan,
    times: evaluateDay(problem, plan),
    cards,
    areaVersion,
    modelVersion: loaded.visits[0]?.visit.modelVersion ?? '',
    evaluatorVersion,
  });
  await run.update({ sentVersion: version, sentAt: now, draftVersionSent: run.version });
}

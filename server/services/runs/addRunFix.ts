import { RunFix } from '#server/models/RunFix.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { needRun } from './needRun.ts';

const keptFixes = 20;

/** Keeps the phone's place: only the latest few, there is no trail. A time ahead of ours counts as now. */
export async function addRunFix(
  actor: Actor,
  runId: string,
  fix: { lat: number; lon: number; at: string; accuracyMetres: number },
  now: Date,
): Promise<void> {
  const run = await needRun(actor, runId);
  // Nobody looks for a van whose run was not sent, and such a run may still be taken away.
  if (!run.sentAt) return;
  const at = new Date(Math.min(Date.parse(fix.at), now.getTime()));
  await RunFix.create({
    runId: run.id,
    lat: fix.lat,
    lon: fix.lon,
    at,
    accuracyMetres: fix.accuracyMetres,
  });
  const old = await RunFix.findAll({
    where: { runId: run.id },
    attributes: ['id', 'businessId'],
    order: [['at', 'DESC']],
    offset: keptFixes,
    limit: 100,
  });
  if (old.length > 0) await RunFix.destroy({ where: { id: old.map((one) => one.id) } });
}

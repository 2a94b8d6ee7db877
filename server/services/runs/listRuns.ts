import { Groomer } from '#server/models/Groomer.ts';
import { Run } from '#server/models/Run.ts';
import { Van } from '#server/models/Van.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { today } from '#server/services/days/today.ts';
import { mayWork } from './needRun.ts';

/** Runs of a date the person may work, their own first. */
export async function listRuns(actor: Actor, date: string | undefined, now: Date) {
  const on = date ?? (await today(actor.businessId, now));
  const runs = (await Run.findAll({ where: { date: on } })).filter((run) => mayWork(actor, run));
  const [vans, groomers] = await Promise.all([Van.findAll(), Groomer.findAll()]);
  return {
    date: on,
    runs: runs
      .map((run) => ({
        run,
        van: vans.find((van) => van.id === run.vanId)!,
        groomer: groomers.find((groomer) => groomer.id === run.groomerId)!,
        mine: run.groomerId === actor.groomerId,
      }))
      .sort((a, b) => Number(b.mine) - Number(a.mine) || a.van.name.localeCompare(b.van.name)),
  };
}

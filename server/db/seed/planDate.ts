import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import { optimise } from '#shared/optimiser/optimise.ts';
import { secondsToWall } from '#shared/time/wallSeconds.ts';
import { Van } from '#server/models/Van.ts';
import { Groomer } from '#server/models/Groomer.ts';
import { Visit } from '#server/models/Visit.ts';
import type { Actor } from '#server/services/accounts/Actor.ts';
import { loadDay } from '#server/services/days/loadDay.ts';
import { lockDay } from '#server/services/days/lockDay.ts';
import { logChange } from '#server/services/days/logChange.ts';
import { makeMove } from '#server/services/days/moveVisit.ts';
import { savePlan } from '#server/services/days/savePlan.ts';
import { setShift } from '#server/services/setup/shifts.ts';
import { addPromise, createVisit } from '#server/services/visits/createVisit.ts';
import type { Rhythm } from './dueOn.ts';

const iterations = 500;

/** Shifts, visits, an order and promises for one date, through the services a dispatcher uses. */
export async function planDate(
  actor: Actor,
  date: string,
  due: Rhythm[],
  now: Date,
  options: { leaveOut: number },
): Promise<void> {
  const [vans, groomers] = await Promise.all([
    Van.findAll({ order: [['name', 'ASC']] }),
    Groomer.findAll(),
  ]);
  const crew: Record<string, string> = { Otter: 'Mika', Plover: 'Ines', Curlew: 'Tobi' };
  for (const van of vans)
    await setShift({
      date,
      vanId: van.id,
      groomerId: groomers.find((groomer) => groomer.name === crew[van.name])!.id,
      startMinutes: 7 * 60 + 30,
      endMinutes: 17 * 60,
      mostOvertimeMinutes: 30,
      meal: {
        lengthMinutes: 30,
        earliestMinutes: 11 * 60,
        latestMinutes: 13 * 60 + 30,
        dueAfterMinutes: 360,
      },
    });
  for (const { household, petIds } of due)
    await createVisit(
      actor,
      {
        householdId: household.id,
        date,
        petIds,
        promise: null,
        allowed: [],
        preferredGroomerId: null,
        note: '',
      },
      now,
    );
  const day = await lockDay(date);
  const loaded = await loadDay(actor.businessId, date, now, { lock: true });
  // The last few stay open, so that a dispatcher has something to place.
  const held = new Set(loaded.problem.visits.slice(0, options.leaveOut).map((visit) => visit.id));
  const problem = {
    ...loaded.problem,
    visits: loaded.problem.visits.filter((visit) => !held.has(visit.id)),
  };

  const result = optimise(
    problem,
    { ...loaded.plan, notPlaced: problem.visits.map((visit) => visit.id) },
    {
      seed: 1,
      iterations,
    },
  );
  const plan = makeMove(loaded, {
    kind: 'replacePlan',
    plan: { ...result.plan, notPlaced: [...result.plan.notPlaced, ...held] },
  });
  await savePlan(loaded, plan);
  await logChange(day, { actor, now, kind: 'planDay', words: 'The day planned' });
  const times = evaluateDay(loaded.problem, plan);
  for (const stop of times.runs.flatMap((run) => run.stops)) {
    if (stop.kind !== 'visit') continue;
    const visit = await Visit.findByPk(stop.stopId);
    const wall = (seconds: number) => secondsToWall(date, loaded.problem.timeZone, seconds);
    await addPromise(
      visit!,
      promiseAround(wall(stop.arriveEarlySeconds), wall(stop.arriveLateSeconds)),
      1,
      actor.userName,
      now,
    );
  }
}

/** Wall minutes around an arrival's 1-in-10 range, on half hours: two hours to two and a half. */
function promiseAround(early: number, late: number): { startMinutes: number; endMinutes: number } {
  const startMinutes = Math.max(7 * 60 + 30, Math.floor(early / 30) * 30);
  const wanted = Math.ceil(late / 30) * 30 - startMinutes;
  return { startMinutes, endMinutes: startMinutes + Math.min(150, Math.max(120, wanted)) };
}

import type { Day } from '#shared/api/days.ts';
import type { DayTimes, Plan } from '#shared/schedule/types.ts';
import { stripOf, type StripSource } from '#src/strips/stripOf.ts';
import type { Strip } from '#src/strips/types.ts';

/** The strips of a plan of a day, in the order of the day's vans. */
export function stripsOf(day: Day, plan: Plan, times: DayTimes): Strip[] {
  const source: StripSource = {
    problem: day.problem,
    facts: new Map(day.problem.visits.map((visit) => [visit.id, visit])),
    cards: new Map(day.visits.map((card) => [card.id, card])),
    failedReasons: new Map(
      day.problem.facts.flatMap((fact) =>
        fact.failedReason === null ? [] : [[fact.stopId, reasonWords(fact.failedReason)] as const],
      ),
    ),
  };
  return day.problem.vans.flatMap((van) => {
    const at = plan.runs.findIndex((run) => run.vanId === van.vanId);
    const run = plan.runs[at] ?? { vanId: van.vanId, stops: [] };
    const runTimes = times.runs.find((one) => one.vanId === van.vanId);
    return runTimes ? [stripOf(source, van, run, runTimes, SAFE_PERMILLE)] : [];
  });
}

/** 'nowhereToPark' → 'nowhere to park'. */
export function reasonWords(reason: string): string {
  return reason.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);
}

/** A promise is safe from 900 ‰ on (shared/schedule/RULES.md). */
export const SAFE_PERMILLE = 900;

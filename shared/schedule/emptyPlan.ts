import type { DayProblem, Plan } from './types.ts';

/** A plan with an empty run for every van and every visit not placed. */
export function emptyPlan(problem: DayProblem): Plan {
  return {
    runs: problem.vans.map((van) => ({ vanId: van.vanId, stops: [] })),
    notPlaced: problem.visits.map((visit) => visit.id),
  };
}

import { isGivenUp } from '#shared/schedule/stepFact.ts';
import type { DayProblem, Move, Plan } from '#shared/schedule/types.ts';
import { otherVisits, placeOf } from './moveWords.ts';

/**
 * The move one arrow key makes of a picked-up visit: left and right change its place in the run, up
 * and down the van, past the last van to not placed and back. `plan` is the day as it is; null when
 * the key leads nowhere. Places before stops that have begun are jumped over.
 */
export function carryVisit(
  problem: DayProblem,
  plan: Plan,
  move: Move,
  key: string,
  startSecondsOf: (visitId: string) => number,
): Move | null {
  if (move.kind !== 'placeVisit' && move.kind !== 'unplaceVisit') return null;
  const { visitId } = move;
  const vans = problem.vans.map((van) => van.vanId);
  const at = move.kind === 'placeVisit' ? vans.indexOf(move.vanId) : vans.length;
  const place = (vanId: string, index: number): Move => {
    const others = otherVisits(plan, vanId, visitId);
    const least = begunBefore(problem, others);
    return {
      kind: 'placeVisit',
      visitId,
      vanId,
      index: Math.min(others.length, Math.max(least, index)),
    };
  };
  if (key === 'ArrowLeft' || key === 'ArrowRight') {
    if (move.kind !== 'placeVisit') return null;
    const next = place(move.vanId, move.index + (key === 'ArrowLeft' ? -1 : 1));
    return next.kind === 'placeVisit' && next.index === move.index ? null : next;
  }
  const to = at + (key === 'ArrowUp' ? -1 : key === 'ArrowDown' ? 1 : 0);
  if (to === at || to < 0 || to > vans.length) return null;
  const vanId = vans[to];
  if (vanId === undefined) return { kind: 'unplaceVisit', visitId };
  // In another van it lands where it would be at about the same time of day.
  const seconds = startSecondsOf(visitId);
  const earlier = otherVisits(plan, vanId, visitId).filter((id) => startSecondsOf(id) < seconds);
  return place(vanId, earlier.length);
}

/** The move that leaves a visit where it is: what picking it up begins with. */
export function stayMove(plan: Plan, visitId: string): Move {
  const place = placeOf(plan, visitId);
  return place ? { kind: 'placeVisit', visitId, ...place } : { kind: 'unplaceVisit', visitId };
}

/** How many of these visits, from the first on, have begun: nothing lands before them. */
export function begunBefore(problem: DayProblem, visitIds: readonly string[]): number {
  const begun = new Set(
    problem.facts.filter((fact) => !isGivenUp(fact)).map((fact) => fact.stopId),
  );
  return visitIds.findLastIndex((id) => begun.has(id)) + 1;
}

import { applyMove } from '#shared/schedule/applyMove.ts';
import { diffDay, type KnockOn } from '#shared/schedule/diffDay.ts';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import type { DayProblem, DayTimes, Move, Plan } from '#shared/schedule/types.ts';
import { placeOf } from './moveWords.ts';

/** What a move would do to a day; `refusedBecause` says in words why it cannot be made. */
export interface Trial {
  plan: Plan;
  times: DayTimes;
  knockOn: KnockOn;
  moved: boolean;
  refusedBecause: string | null;
}

/** The same functions the server runs on the move, so what is shown is what will be kept. */
export function tryMove(problem: DayProblem, plan: Plan, before: DayTimes, move: Move): Trial {
  const stay = (refusedBecause: string): Trial => ({
    plan,
    times: before,
    knockOn: diffDay(problem, before, before),
    moved: false,
    refusedBecause,
  });
  // Where it is already: settling the run anew could still shift a meal, which nobody asked for.
  if (isWhere(plan, move)) return { ...stay(''), refusedBecause: null };
  try {
    const result = applyMove(problem, plan, move);
    if (result.refusedBecause !== undefined) return stay(result.refusedBecause);
    const times = result.moved ? evaluateDay(problem, result.plan) : before;
    return {
      plan: result.plan,
      times,
      knockOn: diffDay(problem, before, times),
      moved: result.moved,
      refusedBecause: null,
    };
  } catch (error) {
    // Someone else cancelled the visit or took the van's shift away since the move was drawn.
    if (error instanceof RangeError)
      return stay('It is not on this day any more. The day is shown as it is now.');
    throw error;
  }
}

function isWhere(plan: Plan, move: Move): boolean {
  if (move.kind !== 'placeVisit') return false;
  const place = placeOf(plan, move.visitId);
  return place?.vanId === move.vanId && place.index === move.index;
}

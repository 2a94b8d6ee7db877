import { useMemo, type RefObject } from 'react';
import type { DayProblem, DayTimes, Move, Plan } from '#shared/schedule/types.ts';
import { writeSpan } from '#src/lib/words.ts';
import { targetWords } from './moveWords.ts';
import { tryMove } from './tryMove.ts';
import type { DragTarget } from './useVisitDrag.ts';

/** The card that follows the pointer: what is in hand, where it would land, what that costs. */
export function DragGhost({
  problem,
  plan,
  times,
  dragging,
  ghost,
}: {
  problem: DayProblem;
  plan: Plan;
  times: DayTimes;
  dragging: { visitId: string; target: DragTarget };
  ghost: RefObject<HTMLDivElement | null>;
}) {
  const { visitId, target } = dragging;
  const label = problem.visits.find((visit) => visit.id === visitId)?.label ?? '';
  // A target keeps its identity until the pointer reaches another place.
  const words = useMemo(
    () => (target ? ghostWords(problem, plan, times, moveOf(visitId, target)) : null),
    [problem, plan, times, visitId, target],
  );
  return (
    <div
      ref={ghost}
      aria-hidden="true"
      className="card pointer-events-none fixed top-0 left-0 z-50 max-w-72 border-collar px-3 py-2 text-sm"
    >
      <p className="font-semibold">
        {label} <span className="text-collar">→ {words?.place ?? '…'}</span>
      </p>
      <p className={words?.bad ? 'font-semibold text-rosette' : 'text-slate'}>
        {words?.about ?? 'Over a strip it shows what would change'}
      </p>
    </div>
  );
}

export function moveOf(visitId: string, target: Exclude<DragTarget, null>): Move {
  return target === 'notPlaced'
    ? { kind: 'unplaceVisit', visitId }
    : { kind: 'placeVisit', visitId, ...target };
}

function ghostWords(problem: DayProblem, plan: Plan, times: DayTimes, move: Move) {
  const trial = tryMove(problem, plan, times, move);
  const place = targetWords(problem, plan, move);
  if (trial.refusedBecause) return { place, about: trial.refusedBecause, bad: true };
  if (!trial.moved) return { place, about: 'it is there now', bad: false };
  const drive = trial.knockOn.driveSeconds;
  const risk = trial.times.promisesAtRisk - times.promisesAtRisk;
  const hard = trial.knockOn.newlyBroken.some((broken) => broken.hard);
  const parts = [
    Math.abs(drive) < 30
      ? 'driving the same'
      : `${writeSpan(Math.abs(drive))} ${drive < 0 ? 'less' : 'more'} driving`,
    ...(risk > 0 ? [`▲ ${risk} more at risk`] : []),
    ...(risk < 0 ? [`${-risk} fewer at risk`] : []),
    ...(hard ? ['▲ breaks a rule'] : []),
  ];
  return { place, about: parts.join(' · '), bad: risk > 0 || hard };
}

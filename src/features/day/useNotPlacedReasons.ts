import { useEffect, useState } from 'react';
import { explainVisit, type NotPlacedReason } from '#shared/schedule/explainNotPlaced.ts';
import type { DayProblem, Plan } from '#shared/schedule/types.ts';

/**
 * Why each visit is not placed, one visit per idle turn: trying every place of every van takes longer
 * than a frame on a full day. Reasons of visits that stay are kept until their new ones are known.
 */
export function useNotPlacedReasons(
  problem: DayProblem,
  plan: Plan,
): ReadonlyMap<string, NotPlacedReason> {
  const [reasons, setReasons] = useState<ReadonlyMap<string, NotPlacedReason>>(new Map());
  useEffect(() => {
    const waiting = [...plan.notPlaced];
    let timer = setTimeout(next, 30);
    function next() {
      const visitId = waiting.shift();
      const visit = problem.visits.find((one) => one.id === visitId);
      if (!visit) return;
      try {
        const reason = explainVisit(problem, plan, visit);
        setReasons((known) => new Map(known).set(visit.id, reason));
      } catch (error) {
        if (!(error instanceof RangeError)) throw error;
      }
      timer = setTimeout(next, 10);
    }
    return () => clearTimeout(timer);
  }, [problem, plan]);
  return reasons;
}

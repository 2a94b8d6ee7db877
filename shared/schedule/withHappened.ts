import type { RunHappened } from './reduceEvents.ts';
import { isGivenUp } from './stepFact.ts';
import type { DayProblem, Plan } from './types.ts';

/**
 * A day with what happened on one van in it, ready for `evaluateDay`: the van's facts and the clock
 * set, its started stops first in the order they were touched. A stop given up before the van set
 * out for it keeps its place among those ahead: nobody drives there and it takes no time.
 */
export function withHappened(
  problem: DayProblem,
  plan: Plan,
  vanId: string,
  happened: RunHappened,
  nowSeconds: number | null,
): { problem: DayProblem; plan: Plan } {
  const run = plan.runs.find((one) => one.vanId === vanId);
  const planned = new Set(run?.stops.map(({ id }) => id));
  const facts = happened.facts
    .filter(({ stopId }) => planned.has(stopId))
    .sort((a, b) => touchedAt(a) - touchedAt(b));
  const place = new Map(
    facts.filter((fact) => !isGivenUp(fact)).map(({ stopId }, index) => [stopId, index]),
  );
  return {
    problem: {
      ...problem,
      nowSeconds,
      facts: [...problem.facts.filter((fact) => fact.vanId !== vanId), ...facts],
    },
    plan: {
      ...plan,
      runs: plan.runs.map((one) =>
        one.vanId === vanId
          ? {
              ...one,
              stops: one.stops.toSorted(
                (a, b) => (place.get(a.id) ?? LAST) - (place.get(b.id) ?? LAST),
              ),
            }
          : one,
      ),
    },
  };
}

const LAST = Number.MAX_SAFE_INTEGER;

function touchedAt(fact: RunHappened['facts'][number]): number {
  return (
    fact.drivingSinceSeconds ??
    fact.arrivedSeconds ??
    fact.workingSinceSeconds ??
    fact.leftSeconds ??
    LAST
  );
}

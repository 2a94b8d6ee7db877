import { withHappened } from '#shared/schedule/withHappened.ts';
import type { DayProblem, Plan } from '#shared/schedule/types.ts';
import type { LoadedDay, LoadedRun } from './loadDay.ts';

/** True when the phone has no version yet, or its order, promises, windows or hours are not the draft's. */
export function needsSending(
  loaded: Pick<LoadedDay, 'problem' | 'plan'>,
  { van, sent, happened }: LoadedRun,
): boolean {
  if (!sent) return stopsOf(loaded.plan, van.id).length > 0;
  // The phone, too, shows started stops in the order they were touched.
  const onPhone = withHappened(sent.problem, sent.plan, van.id, happened, null);
  return told(loaded.problem, loaded.plan, van.id) !== told(onPhone.problem, onPhone.plan, van.id);
}

/** What a groomer goes by, as one text: stops in order, what each visit was promised, the hours. */
function told(problem: DayProblem, plan: Plan, vanId: string): string {
  const van = problem.vans.find((one) => one.vanId === vanId)!;
  const stops = stopsOf(plan, vanId).map((stop) => {
    const visit = problem.visits.find((one) => one.id === stop.id);
    return [stop, visit?.promise, visit?.allowed];
  });
  return JSON.stringify([stops, van.startSeconds, van.endSeconds, van.meal]);
}

function stopsOf(plan: Plan, vanId: string) {
  return plan.runs.find((run) => run.vanId === vanId)?.stops ?? [];
}

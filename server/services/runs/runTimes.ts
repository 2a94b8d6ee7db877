import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import type { RunHappened } from '#shared/schedule/reduceEvents.ts';
import type { RunTimes } from '#shared/schedule/types.ts';
import { withHappened } from '#shared/schedule/withHappened.ts';
import { instantToSeconds } from '#shared/time/wallSeconds.ts';
import type { RunVersion } from '#server/models/RunVersion.ts';

/** A sent run's times given what happened so far; `now` null for a day that is over. */
export function runTimes(
  version: Pick<RunVersion, 'problem' | 'plan'>,
  happened: RunHappened,
  now: Date | null,
): RunTimes {
  const { problem, plan } = version;
  const vanId = problem.vans[0]!.vanId;
  const nowSeconds = now && instantToSeconds(problem.dayStartUtc, now.toISOString());
  const state = withHappened(problem, plan, vanId, happened, nowSeconds);
  return evaluateDay(state.problem, state.plan).runs[0]!;
}

import { type RunHappened, reduceEvents, type TapEvent } from '#shared/schedule/reduceEvents.ts';
import { dayStart } from '#shared/time/dayStart.ts';
import type { Run } from '#server/models/Run.ts';
import { RunEvent } from '#server/models/RunEvent.ts';

/** What happened on each run so far, from its taps; keyed by run id. */
export async function loadHappened(
  runs: Run[],
  timeZone: string,
): Promise<Map<string, RunHappened>> {
  const rows = await RunEvent.findAll({ where: { runId: runs.map((run) => run.id) } });
  const byRun = new Map<string, RunEvent[]>();
  for (const row of rows) {
    const list = byRun.get(row.runId);
    if (list) list.push(row);
    else byRun.set(row.runId, [row]);
  }
  return new Map(
    runs.map((run) => [
      run.id,
      reduceEvents((byRun.get(run.id) ?? []).map(tapOf), {
        vanId: run.vanId,
        dayStartUtc: dayStart(run.date, timeZone).dayStartUtc,
      }),
    ]),
  );
}

/** A stored row as the tap the phone made. */
function tapOf(row: RunEvent): TapEvent {
  return {
    id: row.id,
    deviceId: row.deviceId,
    deviceSeq: row.deviceSeq,
    deviceAt: row.deviceAt.toISOString(),
    offsetMs: row.offsetMs,
    stopId: row.stopId,
    kind: row.kind,
    ...row.data,
  } as TapEvent;
}

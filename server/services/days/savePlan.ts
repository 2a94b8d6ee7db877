import type { Plan } from '#shared/schedule/types.ts';
import type { LoadedDay } from './loadDay.ts';

/** Writes the runs whose order changed and raises their versions; returns the day with the new plan. */
export async function savePlan(loaded: LoadedDay, plan: Plan): Promise<LoadedDay> {
  for (const { run } of loaded.runs) {
    const stops = plan.runs.find((one) => one.vanId === run.vanId)?.stops ?? [];
    if (JSON.stringify(stops) !== JSON.stringify(run.stops))
      await run.update({ stops, version: run.version + 1 });
  }
  return { ...loaded, plan };
}

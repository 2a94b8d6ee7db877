import type { RunDetail } from '#shared/api/runs.ts';
import { writeList } from '#src/lib/words.ts';

/**
 * What the desk changed between two sent versions of a run, in one sentence; null when the version
 * is the same.
 */
export function runChange(seen: RunDetail, now: RunDetail): string | null {
  if (now.version <= seen.version) return null;
  const before = stopNames(seen);
  const after = stopNames(now);
  const added = [...after].filter(([id]) => !before.has(id)).map(([, name]) => name);
  const gone = [...before].filter(([id]) => !after.has(id)).map(([, name]) => name);
  const parts = [
    added.length > 0 ? `new: ${writeList(added)}` : '',
    gone.length > 0 ? `no longer yours: ${writeList(gone)}` : '',
  ].filter(Boolean);
  if (parts.length > 0) return parts.join('; ');
  const order = (names: ReadonlyMap<string, string>) => [...names.keys()].join();
  return order(before) === order(after) ? 'same stops, other times' : 'the order changed';
}

/** Visits only: refills and meals find their own place. */
function stopNames(run: RunDetail): Map<string, string> {
  const stops = run.plan?.runs.find(({ vanId }) => vanId === run.vanId)?.stops ?? [];
  return new Map(
    stops.flatMap((stop) => {
      if (stop.kind !== 'visit') return [];
      const visit = run.visits.find(({ id }) => id === stop.visitId);
      return [[stop.id, visit ? visit.pets.map(({ name }) => name).join(' & ') : 'a visit']];
    }),
  );
}

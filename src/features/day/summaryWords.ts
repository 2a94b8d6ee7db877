import type { DayTimes, Plan } from '#shared/schedule/types.ts';
import { writeDistance, type DistanceUnit } from '#src/lib/measures.ts';
import { writeCount, writeSpan } from '#src/lib/words.ts';

export interface SummaryWords {
  /** "3 vans, 17 visits" */
  title: string;
  parts: { words: string; tone: 'plain' | 'good' | 'bad' }[];
}

/**
 * The day in one sentence, in the design's order: work, driving, way, promises, what is open. Of a
 * `past` day only stops that were done count as promises kept or not.
 */
export function summaryWords(
  plan: Plan,
  times: DayTimes,
  unit: DistanceUnit,
  past = false,
): SummaryWords {
  if (plan.runs.length === 0)
    return {
      title: 'No vans',
      parts: plan.notPlaced.length === 0 ? [] : [notPlacedPart(plan)],
    };
  const placed = plan.runs.reduce(
    (sum, run) => sum + run.stops.filter((stop) => stop.kind === 'visit').length,
    0,
  );
  const safe = past ? keptPromises(times).length : times.promisesSafe;
  const risk = past ? promisesMet(times).length - safe : times.promisesAtRisk;
  const promises = safe + risk;
  const parts: SummaryWords['parts'] = [
    { words: `${writeSpan(times.workSeconds)} grooming`, tone: 'plain' },
    { words: `${writeSpan(times.driveSeconds)} driving`, tone: 'plain' },
    { words: writeDistance(times.driveMetres, unit), tone: 'plain' },
  ];
  if (promises > 0)
    parts.push({
      words: `${safe} of ${writeCount(promises, 'promise')} ${past ? 'kept' : 'safe'}`,
      tone: 'good',
    });
  if (risk > 0) parts.push({ words: past ? `${risk} not kept` : `${risk} at risk`, tone: 'bad' });
  if (plan.notPlaced.length > 0) parts.push(notPlacedPart(plan));
  return {
    title: `${writeCount(plan.runs.length, 'van')}, ${writeCount(placed, 'visit')}`,
    parts,
  };
}

function notPlacedPart(plan: Plan): SummaryWords['parts'][number] {
  return { words: `${plan.notPlaced.length} not placed`, tone: 'plain' };
}

function promisesMet(times: DayTimes) {
  return times.runs
    .flatMap((run) => run.stops)
    .filter((stop) => stop.state === 'done' && stop.onTimePermille !== null);
}

/** Of a done stop the chance is a fact: it came in time or not. */
function keptPromises(times: DayTimes) {
  return promisesMet(times).filter((stop) => stop.onTimePermille! >= 500);
}

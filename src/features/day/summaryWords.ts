import type { DayTimes, Plan } from '#shared/schedule/types.ts';
import { writeDistance, type DistanceUnit } from '#src/lib/measures.ts';
import { writeCount, writeSpan } from '#src/lib/words.ts';

export interface SummaryWords {
  /** "3 vans, 17 visits" */
  title: string;
  parts: { words: string; tone: 'plain' | 'good' | 'bad' }[];
}

/** The day in one sentence, in the design's order: work, driving, way, promises, what is open. */
export function summaryWords(plan: Plan, times: DayTimes, unit: DistanceUnit): SummaryWords {
  const placed = plan.runs.reduce(
    (sum, run) => sum + run.stops.filter((stop) => stop.kind === 'visit').length,
    0,
  );
  const promises = times.promisesSafe + times.promisesAtRisk;
  const parts: SummaryWords['parts'] = [
    { words: `${writeSpan(times.workSeconds)} grooming`, tone: 'plain' },
    { words: `${writeSpan(times.driveSeconds)} driving`, tone: 'plain' },
    { words: writeDistance(times.driveMetres, unit), tone: 'plain' },
  ];
  if (promises > 0)
    parts.push({
      words: `${times.promisesSafe} of ${writeCount(promises, 'promise')} safe`,
      tone: 'good',
    });
  if (times.promisesAtRisk > 0)
    parts.push({ words: `${times.promisesAtRisk} at risk`, tone: 'bad' });
  if (plan.notPlaced.length > 0)
    parts.push({ words: `${plan.notPlaced.length} not placed`, tone: 'plain' });
  return {
    title: `${writeCount(plan.runs.length, 'van')}, ${writeCount(placed, 'visit')}`,
    parts,
  };
}

import type { DayProblem, DayTimes, Plan } from '#shared/schedule/types.ts';
import { formatWall, formatWallRange } from '#shared/time/formatWall.ts';
import { writeDistance, type DistanceUnit } from '#src/lib/measures.ts';
import { writeSpan } from '#src/lib/words.ts';

export interface ProposalRow {
  label: string;
  before: string;
  after: string;
  tone: 'same' | 'better' | 'worse';
}

interface Side {
  plan: Plan;
  times: DayTimes;
}

/** The day now against the day offered, number by number; rows that stay the same are said so. */
export function proposalRows(
  problem: DayProblem,
  now: Side,
  offered: Side,
  unit: DistanceUnit,
): ProposalRow[] {
  const row = (
    label: string,
    read: (side: Side) => number,
    write: (value: number) => string,
    better: 'less' | 'more' = 'less',
  ): ProposalRow => {
    const before = read(now);
    const after = read(offered);
    const gain = better === 'less' ? before - after : after - before;
    const same = write(before) === write(after);
    return {
      label,
      before: write(before),
      after: write(after),
      tone: same ? 'same' : gain > 0 ? 'better' : 'worse',
    };
  };
  const last = (side: Side) => Math.max(0, ...side.times.runs.map((run) => run.finishSeconds));
  return [
    row('Promises at risk', (side) => side.times.promisesAtRisk, String),
    row('Not placed', (side) => side.plan.notPlaced.length, String),
    row('Driving', (side) => side.times.driveSeconds, writeSpan),
    row(
      'Way',
      (side) => side.times.driveMetres,
      (metres) => writeDistance(metres, unit),
    ),
    row('Waiting', (side) => side.times.waitSeconds, writeSpan),
    row(
      'Overtime',
      (side) => side.times.runs.reduce((sum, run) => sum + run.overtimeSeconds, 0),
      writeSpan,
    ),
    row('Last van finishes', last, (seconds) => formatWall(problem, seconds)),
  ];
}

/** Visits the offer takes off the vans, and those it puts on one, with what they were promised. */
export function placedAndTakenOff(
  problem: DayProblem,
  now: Plan,
  offered: Plan,
): { takenOff: string[]; placed: string[] } {
  const words = (visitId: string) => {
    const visit = problem.visits.find((one) => one.id === visitId);
    if (!visit?.promise) return visit?.label ?? '';
    const { startSeconds, endSeconds } = visit.promise;
    return `${visit.label} (promised ${formatWallRange(problem, startSeconds, endSeconds)})`;
  };
  const minus = (one: string[], other: string[]) =>
    one.filter((visitId) => !other.includes(visitId)).map(words);
  return {
    takenOff: minus(offered.notPlaced, now.notPlaced),
    placed: minus(now.notPlaced, offered.notPlaced),
  };
}

/** Visits whose van or neighbours change, for drawing them as moved. */
export function movedVisits(now: Plan, offered: Plan): Set<string> {
  const before = neighbours(now);
  const moved = new Set<string>();
  for (const [visitId, place] of neighbours(offered))
    if (before.get(visitId) !== place) moved.add(visitId);
  return moved;
}

function neighbours(plan: Plan): Map<string, string> {
  return new Map(
    plan.runs.flatMap((run) => {
      const visits = run.stops.filter((stop) => stop.kind === 'visit');
      return visits.map((stop, index) => [
        stop.visitId,
        `${run.vanId} ${visits[index - 1]?.visitId ?? ''}`,
      ]);
    }),
  );
}

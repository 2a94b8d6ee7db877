import type { DayProblem, RunTimes, VanShift } from '#shared/schedule/types.ts';
import { seededRandom } from './random.ts';

/**
 * Drives one evaluated run many times over with log-normal legs and work, waiting where the plan says
 * a van is held, and counts. Own dice, own loop; of the evaluation it takes only order and places.
 */
export function simulateRun(
  problem: DayProblem,
  times: RunTimes,
  draws: number,
  seed: number,
): Map<string, { onTime: number; lateSeconds: number }> {
  const van = problem.vans.find((each) => each.vanId === times.vanId)!;
  const uniform = seededRandom(seed);
  const normal = () => Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform());
  const cv = problem.drive.cvPermille / 1000;
  const steps = times.stops.map((stop) => stepOf(problem, van, times, stop.stopId));
  const found = new Map(times.stops.map((stop) => [stop.stopId, { onTime: 0, lateSeconds: 0 }]));
  for (let draw = 0; draw < draws; draw += 1) {
    let time = van.startSeconds + van.loadSeconds;
    for (const [i, stop] of times.stops.entries()) {
      const step = steps[i]!;
      time += logNormal(normal, stop.driveSeconds, (cv * stop.driveSeconds) ** 2);
      const seen = found.get(stop.stopId)!;
      if (step.promiseEnd !== null) {
        if (time <= step.promiseEnd) seen.onTime += 1 / draws;
        else seen.lateSeconds += (time - step.promiseEnd) / draws;
      }
      time = Math.max(time, step.heldUntil) + step.fixed;
      time += logNormal(normal, step.mean, step.variance);
    }
  }
  return found;
}

function stepOf(problem: DayProblem, van: VanShift, times: RunTimes, stopId: string) {
  const stop = times.stops.find((each) => each.stopId === stopId)!;
  const visit = problem.visits.find((each) => each.id === stopId);
  if (visit) {
    const work = visit.workByGroomer[van.groomerId] ?? visit.work;
    return {
      promiseEnd: visit.promise?.endSeconds ?? null,
      heldUntil: Math.max(visit.promise?.startSeconds ?? 0, visit.pin?.startSeconds ?? 0),
      fixed: stop.setUpSeconds + visit.cleanDownSeconds,
      mean: work.meanSeconds,
      variance: work.varianceSeconds2,
    };
  }
  const place = problem.refills.find((each) => each.point === stop.point);
  return {
    promiseEnd: null,
    heldUntil: stop.kind === 'meal' ? van.meal!.earliestStartSeconds : (place?.opensSeconds ?? 0),
    fixed: stop.endSeconds - stop.startSeconds,
    mean: 0,
    variance: 0,
  };
}

function logNormal(normal: () => number, mean: number, variance: number): number {
  if (mean <= 0 || variance <= 0) return Math.max(0, mean);
  const s2 = Math.log(1 + variance / (mean * mean));
  return mean * Math.exp(-s2 / 2 + Math.sqrt(s2) * normal());
}

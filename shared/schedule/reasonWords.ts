import { formatWall } from '#shared/time/formatWall.ts';
import type { DayProblem, VanShift, VisitFact } from './types.ts';
import type { VanReason } from './vanReason.ts';

/** One van's reason in words, e.g. "fits if Curlew may finish 25 min later". */
export function reasonWords(
  problem: DayProblem,
  visit: VisitFact,
  van: VanShift,
  reason: Omit<VanReason, 'words'>,
): string {
  const name = van.vanName;
  const minutes = `${Math.ceil(reason.byAmount / 60)} min`;
  const more = reason.otherRules > 0 ? ', and more stands in the way' : '';
  switch (reason.rule) {
    case 'fits':
      return `fits ${name} for ${Math.ceil(reason.addedCost / 60)} min of driving or the like`;
    case 'notWorking':
      return `${name} does not work then`;
    case 'skill':
      return `${name} needs skill ${visit.needs.filter((skill) => !van.skills.includes(skill)).join(', ')}`;
    case 'tableLimit':
      return `pet is ${(reason.byAmount / 1000).toFixed(1)} kg over ${name}'s table limit`;
    case 'barredGroomer':
      return `household does not want ${van.groomerName}`;
    case 'pin':
      return reason.index === null
        ? `pinned to ${pinnedVan(problem, visit)}`
        : `another visit is pinned to that place on ${name}`;
    case 'overtime':
      return `fits if ${name} may finish ${minutes} later${more}`;
    case 'driveLimit':
      return `fits if ${name} may drive ${minutes} more${more}`;
    case 'window':
      return windowWords(problem, visit, van, reason, minutes) + more;
    case 'tank':
      return `${name} would need ${(reason.byAmount / 1000).toFixed(1)} l more tank or another refill place${more}`;
    case 'meal':
      return van.meal
        ? `leaves ${van.groomerName} no meal between ${formatWall(problem, van.meal.earliestStartSeconds)} and ${formatWall(problem, van.meal.latestStartSeconds)}${more}`
        : `leaves ${van.groomerName} no meal${more}`;
    case 'refillHours':
      return `fits if the refill stays open ${minutes} longer${more}`;
    case 'promise':
    case 'started':
      return `${name} has already started`;
  }
}

function windowWords(
  problem: DayProblem,
  visit: VisitFact,
  van: VanShift,
  reason: Omit<VanReason, 'words'>,
  minutes: string,
): string {
  if (reason.stopId === visit.id) return `fits ${van.vanName} if its window ends ${minutes} later`;
  const pushed = problem.visits.find((each) => each.id === reason.stopId);
  return `fits ${van.vanName} if ${pushed?.label ?? 'another visit'} may be ${minutes} past their window`;
}

function pinnedVan(problem: DayProblem, visit: VisitFact): string {
  const van = problem.vans.find((each) => each.vanId === visit.pin?.vanId);
  return van?.vanName ?? 'a van that does not work this day';
}

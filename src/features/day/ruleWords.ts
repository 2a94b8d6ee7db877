import type { BrokenRule, DayProblem } from '#shared/schedule/types.ts';
import { writeWeight, type WeightUnit } from '#src/lib/measures.ts';
import { writeSpan } from '#src/lib/words.ts';

/** A broken rule as a short sentence with its number, for the person about to keep it. */
export function ruleWords(problem: DayProblem, broken: BrokenRule, unit: WeightUnit): string {
  const van = problem.vans.find((one) => one.vanId === broken.vanId);
  const visit = problem.visits.find((one) => one.id === broken.stopId);
  const vanName = van?.vanName ?? 'The van';
  const label = visit?.label ?? 'A stop';
  const by = writeSpan(broken.byAmount);
  switch (broken.rule) {
    case 'skill':
      return `${label} needs ${visit?.needs.filter((need) => !van?.skills.includes(need)).join(' and ') || 'a skill'}, which ${vanName} has not today`;
    case 'tableLimit':
      return `${label} is ${writeWeight(broken.byAmount, unit)} over what ${vanName}’s table takes`;
    case 'barredGroomer':
      return `${label} does not go to ${van?.groomerName ?? 'this groomer'}`;
    case 'window':
      return `${label} misses the hours it is allowed by ${by}`;
    case 'promise':
      return `${label} is expected ${by} after its promise ends`;
    case 'overtime':
      return `${vanName} finishes ${by} past its longest overtime`;
    case 'driveLimit':
      return `${vanName} drives ${by} over its limit`;
    case 'tank':
      return `${vanName}’s water runs ${Math.max(1, Math.round(broken.byAmount / 1000))} L short at ${label}`;
    case 'meal':
      return `${van?.groomerName ?? vanName} has no meal within its hours`;
    case 'pin':
      return `${label} is pinned elsewhere`;
    case 'refillHours':
      return `${vanName} reaches the refill ${by} after it closes`;
    case 'started':
      return `${label} has begun and stays where it is`;
  }
}

import type {
  AllowedWindow,
  DayProblem,
  Plan,
  RefillPlace,
  StopFact,
  VanShift,
  VisitFact,
} from '#shared/schedule/types.ts';
import { seededRandom } from './random.ts';
import { smallDay, smallVan, smallVisit } from './smallDay.ts';

/** What a random day has; everything left out is thrown. */
export interface RandomDayShape {
  vans?: number;
  visits?: number;
  /** Rules, tanks, meals, windows, sites and traffic; without: bare driving and work. */
  rules?: boolean;
  promises?: boolean;
}

const hour = 3600;

/** A made-up day: places in a 20 km square, driving at about 30 km/h and one-way detours. */
export function randomDay(seed: number, shape: RandomDayShape = {}): DayProblem {
  const random = seededRandom(seed * 7919 + 13);
  const below = (n: number) => Math.floor(random() * n);
  const chance = (p: number) => random() < p;
  const rules = shape.rules ?? true;
  const vanCount = shape.vans ?? 1 + below(4);
  const visitCount = shape.visits ?? 1 + below(vanCount * 8);
  const refillCount = rules ? below(3) : 0;
  const depots = 1 + below(2);
  const n = depots + refillCount + visitCount;
  const places = Array.from({ length: n }, () => [random() * 20, random() * 20] as const);
  const km = places.flatMap(([x, y], i) =>
    places.map(([u, v], j) =>
      i === j ? 0 : Math.hypot(x - u, y - v) * (1.2 + 0.2 * random()) + 0.2,
    ),
  );
  const base = smallDay(Array.from({ length: n }, (_, i) => i));
  return {
    ...base,
    drive: {
      baseSeconds: km.map((each) => Math.round(each * 120)),
      metres: km.map((each) => Math.round(each * 1000)),
      bands:
        rules && chance(0.5)
          ? [
              { fromSeconds: 0, permille: 1000 },
              { fromSeconds: 8 * hour, permille: 1300 + below(500) },
              { fromSeconds: 9 * hour + 1800, permille: 1000 + below(100) },
              { fromSeconds: 16 * hour, permille: 1500 },
            ]
          : [{ fromSeconds: 0, permille: 1000 }],
      cvPermille: chance(0.5) ? 200 : 0,
    },
    vans: Array.from({ length: vanCount }, (_, i) => throwVan(i)),
    visits: Array.from({ length: visitCount }, (_, i) => throwVisit(i)),
    refills: Array.from({ length: refillCount }, (_, i) => throwRefill(i)),
  };

  function throwVan(i: number): VanShift {
    const start = (7 + below(3)) * hour;
    return smallVan(`van${i}`, {
      startSeconds: start,
      endSeconds: start + (7 + below(3)) * hour,
      mostOvertimeSeconds: below(3) * 1800,
      mostDriveSeconds: rules && chance(0.3) ? (2 + below(3)) * hour : null,
      loadSeconds: below(3) * 300,
      washDownSeconds: below(3) * 300,
      startPoint: below(depots),
      endPoint: below(depots),
      skills: rules ? ['cats', 'hand-stripping'].filter(() => chance(0.7)) : [],
      tableLimitGrams: rules && chance(0.3) ? 40_000 : 90_000,
      tanks: rules
        ? (['fresh', 'grey'] as const)
            .filter(() => chance(0.7))
            .map((kind) => ({
              kind,
              capacityMl: 100_000 + below(200) * 1000,
              usedAtStartMl: below(50) * 1000,
            }))
        : [],
      meal:
        rules && chance(0.7)
          ? {
              lengthSeconds: 1800,
              earliestStartSeconds: 11 * hour + below(3) * 1800,
              latestStartSeconds: 14 * hour,
              dueAfterSeconds: (4 + below(4)) * hour,
            }
          : null,
    });
  }

  function throwVisit(i: number): VisitFact {
    const mean = 1800 + below(20) * 300;
    const from = (8 + below(8)) * hour;
    const window = (): AllowedWindow => ({
      startSeconds: from,
      endSeconds: from + (1 + below(4)) * hour,
      binds: chance(0.3) ? 'stay' : 'arrival',
    });
    const promiseFrom = (8 + below(7)) * hour;
    return smallVisit(`v${i}`, depots + refillCount + i, {
      siteId: rules && chance(0.25) ? `site${below(3)}` : null,
      work: {
        meanSeconds: mean,
        varianceSeconds2: chance(0.7) ? Math.round((mean * 0.25) ** 2) : 0,
      },
      workByGroomer:
        rules && chance(0.2)
          ? { 'g-van0': { meanSeconds: Math.round(mean * 0.8), varianceSeconds2: 90_000 } }
          : {},
      setUpSeconds: below(3) * 180,
      cleanDownSeconds: below(3) * 180,
      allowed: rules && chance(0.25) ? [window(), ...(chance(0.3) ? [window()] : [])] : [],
      promise:
        (shape.promises ?? true) && chance(0.5)
          ? { startSeconds: promiseFrom, endSeconds: promiseFrom + 2 * hour, version: 1 }
          : null,
      tankUse: rules
        ? [
            { kind: 'fresh', ml: 15_000 + below(50) * 1000 },
            { kind: 'grey', ml: 15_000 + below(50) * 1000 },
          ]
        : [],
      needs: rules && chance(0.2) ? [chance(0.5) ? 'cats' : 'hand-stripping'] : [],
      heaviestGrams: 5000 + below(50) * 1000,
      preferredGroomerIds: rules && chance(0.3) ? ['g-van0'] : [],
      barredGroomerIds: rules && chance(0.05) ? ['g-van0'] : [],
      valueSeconds: 10_000 + below(10) * 5000,
      pin:
        rules && chance(0.06)
          ? chance(0.5)
            ? { vanId: `van${below(vanCount)}` }
            : { position: chance(0.5) ? 'first' : 'last', startSeconds: 8 * hour }
          : null,
    });
  }

  function throwRefill(i: number): RefillPlace {
    return {
      id: `refill${i}`,
      name: `Refill ${i}`,
      point: depots + i,
      kinds: i === 0 ? ['fresh', 'grey'] : chance(0.5) ? ['fresh'] : ['grey'],
      lengthSeconds: 600 + below(3) * 300,
      opensSeconds: chance(0.5) ? 0 : 9 * hour,
      closesSeconds: chance(0.5) ? 86_400 : 17 * hour,
    };
  }
}

/** The same day some hours in: each van's first stops of `plan` have happened, a little late. */
export function begin(problem: DayProblem, plan: Plan, seed: number): DayProblem {
  const random = seededRandom(seed * 31 + 7);
  const now = 10 * hour + Math.floor(random() * 3 * hour);
  const facts: StopFact[] = [];
  for (const run of plan.runs) {
    const van = problem.vans.find((each) => each.vanId === run.vanId)!;
    let free = van.startSeconds + van.loadSeconds;
    for (const stop of run.stops) {
      const driving = free + 60;
      const arrived = driving + 300 + Math.floor(random() * 900);
      const working = arrived + 240;
      const left = working + 1800 + Math.floor(random() * 3600);
      if (driving > now) break;
      const failed = left <= now && random() < 0.1 && stop.kind === 'visit';
      facts.push({
        stopId: stop.id,
        vanId: run.vanId,
        drivingSinceSeconds: random() < 0.9 || arrived > now ? driving : null,
        arrivedSeconds: arrived <= now ? arrived : null,
        workingSinceSeconds: working <= now && !failed ? working : null,
        leftSeconds: left <= now ? left : null,
        failedReason: failed ? 'nobody home' : null,
      });
      if (left > now) break;
      free = left;
    }
  }
  return { ...problem, nowSeconds: now, facts, sent: plan };
}

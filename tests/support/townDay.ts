import type { DayProblem } from '#shared/schedule/types.ts';
import { seededRandom } from './random.ts';
import { smallDay, smallVan, smallVisit } from './smallDay.ts';

const hour = 3600;

/**
 * A busy but workable day of a town: vans of 8 to 17 with meal and tanks, visits of 40–80 min in six
 * neighbourhoods, most with a two-hour promise, one tap with a drain. For benches.
 */
export function townDay(seed: number, vans: number, perVan: number): DayProblem {
  const random = seededRandom(seed * 104_729 + 1);
  const between = (low: number, high: number) => low + Math.floor(random() * (high - low + 1));
  const visits = vans * perVan;
  const size = 6 * Math.sqrt(vans / 3);
  const middles = Array.from({ length: 6 }, () => [random() * size, random() * size] as const);
  const places = Array.from({ length: visits + 2 }, (_, i) => {
    const [x, y] = i < 2 ? [size / 2, size / 2] : middles[between(0, 5)]!;
    return [x + random() * 2 - 1, y + random() * 2 - 1] as const;
  });
  const km = places.flatMap(([x, y]) =>
    places.map(([u, v]) => (Math.abs(x - u) + Math.abs(y - v)) * 0.9),
  );
  const base = smallDay(Array.from({ length: visits + 2 }, (_, i) => i));
  return {
    ...base,
    drive: {
      baseSeconds: km.map((each) => Math.round(each * 120 + (each > 0 ? 60 : 0))),
      metres: km.map((each) => Math.round(each * 1000)),
      bands: [{ fromSeconds: 0, permille: 1000 }],
      cvPermille: 200,
    },
    vans: Array.from({ length: vans }, (_, i) =>
      smallVan(`van${i}`, {
        mostOvertimeSeconds: 1800,
        loadSeconds: 600,
        washDownSeconds: 600,
        skills: i % 3 === 0 ? ['cats', 'hand-stripping'] : ['cats'],
        tanks: [
          { kind: 'fresh', capacityMl: 250_000, usedAtStartMl: 0 },
          { kind: 'grey', capacityMl: 250_000, usedAtStartMl: 0 },
        ],
        meal: {
          lengthSeconds: 1800,
          earliestStartSeconds: 11 * hour,
          latestStartSeconds: 14 * hour,
          dueAfterSeconds: 6 * hour,
        },
      }),
    ),
    visits: Array.from({ length: visits }, (_, i) => {
      const mean = between(30, 62) * 60;
      const from = between(8, 15) * hour;
      const ml = between(20, 55) * 1000;
      return smallVisit(`v${i}`, i + 2, {
        work: { meanSeconds: mean, varianceSeconds2: Math.round((mean * 0.2) ** 2) },
        setUpSeconds: 240,
        cleanDownSeconds: 180,
        promise:
          random() < 0.6 ? { startSeconds: from, endSeconds: from + 2 * hour, version: 1 } : null,
        tankUse: [
          { kind: 'fresh', ml },
          { kind: 'grey', ml },
        ],
        needs: random() < 0.1 ? ['hand-stripping'] : [],
        heaviestGrams: between(3, 45) * 1000,
        preferredGroomerIds: random() < 0.3 ? [`g-van${between(0, vans - 1)}`] : [],
        valueSeconds: 20_000,
      });
    }),
    refills: [
      {
        id: 'tap',
        name: 'Harbour tap',
        point: 1,
        kinds: ['fresh', 'grey'],
        lengthSeconds: 900,
        opensSeconds: 7 * hour,
        closesSeconds: 19 * hour,
      },
    ],
  };
}

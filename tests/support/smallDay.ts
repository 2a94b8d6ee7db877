import type { DayProblem, VanShift, VisitFact } from '#shared/schedule/types.ts';

/** Points on a line, 60 s of driving and 500 m per unit; one band, no spread unless asked. */
export function smallDay(
  places: number[],
  parts: Partial<DayProblem> = {},
  cvPermille = 0,
): DayProblem {
  const n = places.length;
  const legs = places.flatMap((from) => places.map((to) => Math.abs(to - from)));
  return {
    v: 1,
    date: '2026-06-01',
    dayStartUtc: '2026-05-31T22:00:00.000Z',
    timeZone: 'Europe/Vaduz',
    dayLengthSeconds: 86_400,
    points: places.map((place, i) => ({
      id: `p${i}`,
      lat: 47,
      lon: 9 + place / 1000,
      rough: false,
    })),
    drive: {
      baseSeconds: legs.map((leg) => leg * 60),
      metres: legs.map((leg) => leg * 500),
      bands: [{ fromSeconds: 0, permille: 1000 }],
      cvPermille,
    },
    vans: n > 0 ? [smallVan('otter')] : [],
    visits: [],
    refills: [],
    weights: {
      lateFactor: 6,
      waitFactorPermille: 500,
      overtimeFactor: 2,
      otherGroomerSeconds: 600,
      disturbSeconds: 900,
    },
    nowSeconds: null,
    facts: [],
    sent: null,
    ...parts,
  };
}

/** A van at point 0 from 8:00 to 17:00 with an hour of overtime and no meal. */
export function smallVan(vanId: string, parts: Partial<VanShift> = {}): VanShift {
  return {
    vanId,
    vanName: vanId[0]!.toUpperCase() + vanId.slice(1),
    groomerId: `g-${vanId}`,
    groomerName: `Groomer of ${vanId}`,
    startSeconds: 8 * 3600,
    endSeconds: 17 * 3600,
    mostOvertimeSeconds: 3600,
    mostDriveSeconds: null,
    loadSeconds: 0,
    washDownSeconds: 0,
    startPoint: 0,
    endPoint: 0,
    skills: [],
    tableLimitGrams: 50_000,
    tanks: [],
    meal: null,
    ...parts,
  };
}

/** A visit of an hour at `point`, without spread, set-up or rules. */
export function smallVisit(id: string, point: number, parts: Partial<VisitFact> = {}): VisitFact {
  return {
    id,
    householdId: `h-${id}`,
    label: id,
    point,
    siteId: null,
    work: { meanSeconds: 3600, varianceSeconds2: 0 },
    workByGroomer: {},
    setUpSeconds: 0,
    cleanDownSeconds: 0,
    allowed: [],
    promise: null,
    tankUse: [],
    needs: [],
    heaviestGrams: 10_000,
    preferredGroomerIds: [],
    barredGroomerIds: [],
    valueSeconds: 36_000,
    pin: null,
    ...parts,
  };
}

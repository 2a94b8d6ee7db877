import { dayStart } from '#shared/time/dayStart.ts';
import { instantToSeconds, wallToSeconds } from '#shared/time/wallSeconds.ts';
import type {
  DayProblem,
  MealRule,
  Plan,
  RefillPlace,
  StopFact,
  VanShift,
  VisitFact,
} from '#shared/schedule/types.ts';
import type { Business } from '#server/models/Business.ts';
import type { Groomer } from '#server/models/Groomer.ts';
import type { Place } from '#server/models/Place.ts';
import type { Shift, ShiftMeal } from '#server/models/Shift.ts';
import type { Van } from '#server/models/Van.ts';
import { labelOf, type VisitFacts } from '#server/services/visits/visitFacts.ts';
import { driveTable } from './driveTable.ts';
import { PointList } from './PointList.ts';

export interface ProblemParts {
  business: Business;
  date: string;
  shifts: { shift: Shift; van: Van; groomer: Groomer }[];
  places: Place[];
  visits: VisitFacts[];
  facts: StopFact[];
  /** null unless the day has begun. */
  now: Date | null;
  sent: Plan | null;
}

/**
 * Placing a visit is worth this much driving. With a promise it outweighs being four hours late to
 * another one (at the starting weights): a promised visit comes off a van only when nothing else goes.
 */
const promisedValueSeconds = 100_000;
const unpromisedValueSeconds = 20_000;
/** Spread of a leg; a shared city day is wider, learned factors come with the traffic part. */
const driveCvPermille = 200;
const loadSeconds = 600;
const washDownSeconds = 900;

/** A day's facts as plain JSON, with drive seconds and groom minutes already in it. */
export async function buildProblem(parts: ProblemParts): Promise<DayProblem> {
  const { business, date } = parts;
  const { dayStartUtc, dayLengthSeconds } = dayStart(date, business.timeZone);
  const at = (wallMinutes: number) => wallToSeconds(date, business.timeZone, wallMinutes);
  const points = new PointList();
  const placePoint = (place: Place) => points.add(`place:${place.id}`, place.lat, place.lon);
  const placeById = new Map(parts.places.map((place) => [place.id, place]));

  const vans = parts.shifts.map(({ shift, van, groomer }): VanShift => ({
    vanId: van.id,
    vanName: van.name,
    groomerId: groomer.id,
    groomerName: groomer.name,
    startSeconds: at(shift.startMinutes),
    endSeconds: at(shift.endMinutes),
    mostOvertimeSeconds: shift.mostOvertimeMinutes * 60,
    mostDriveSeconds: null,
    loadSeconds,
    washDownSeconds,
    startPoint: placePoint(placeById.get(van.startPlaceId)!),
    endPoint: placePoint(placeById.get(van.endPlaceId)!),
    skills: groomer.skills,
    tableLimitGrams: van.tableLimitGrams,
    tanks: van.tanks.map(({ kind, capacityMl }) => ({ kind, capacityMl, usedAtStartMl: 0 })),
    meal: shift.meal ? mealRule(shift.meal, at) : null,
  }));
  const visits = parts.visits.map((facts) => visitFact(facts, points, at));
  const refills = parts.places.flatMap((place) => refillPlace(place, placePoint, at));

  return {
    v: 1,
    date,
    dayStartUtc,
    timeZone: business.timeZone,
    dayLengthSeconds,
    ...(await driveTable(business.areaName, points.list, driveCvPermille)),
    vans,
    visits,
    refills,
    weights: business.weights,
    nowSeconds: parts.now ? instantToSeconds(dayStartUtc, parts.now.toISOString()) : null,
    facts: parts.facts,
    sent: parts.sent,
  };
}

function visitFact(facts: VisitFacts, points: PointList, at: (wall: number) => number): VisitFact {
  const { visit, household, promise } = facts;
  const { forecast } = visit;
  return {
    id: visit.id,
    householdId: household.id,
    label: labelOf(facts),
    point: points.add(`household:${household.id}`, household.lat, household.lon),
    siteId: household.siteId ?? null,
    work: forecast.work,
    workByGroomer: forecast.workByGroomer ?? {},
    setUpSeconds: forecast.setUpSeconds,
    cleanDownSeconds: forecast.cleanDownSeconds,
    allowed: visit.allowed.map(({ startMinutes, endMinutes, binds }) => ({
      startSeconds: at(startMinutes),
      endSeconds: at(endMinutes),
      binds,
    })),
    promise: promise && {
      startSeconds: at(promise.startMinutes),
      endSeconds: at(promise.endMinutes),
      version: promise.version,
    },
    tankUse: forecast.tankUse,
    needs: forecast.needs,
    heaviestGrams: forecast.heaviestGrams,
    preferredGroomerIds: visit.preferredGroomerId ? [visit.preferredGroomerId] : [],
    barredGroomerIds: [],
    valueSeconds: promise ? promisedValueSeconds : unpromisedValueSeconds,
    pin: visit.pin ?? null,
  };
}

function refillPlace(
  place: Place,
  placePoint: (place: Place) => number,
  at: (wall: number) => number,
): RefillPlace[] {
  const kinds = refillKinds[place.kind];
  if (!kinds) return [];
  return [
    {
      id: place.id,
      name: place.name,
      point: placePoint(place),
      kinds,
      lengthSeconds: place.lengthMinutes * 60,
      opensSeconds: at(place.opensMinutes),
      closesSeconds: at(place.closesMinutes),
    },
  ];
}

const refillKinds: Partial<Record<Place['kind'], RefillPlace['kinds']>> = {
  waterFill: ['fresh'],
  waterDump: ['grey'],
  fillAndDump: ['fresh', 'grey'],
};

function mealRule(meal: ShiftMeal, at: (wall: number) => number): MealRule {
  return {
    lengthSeconds: meal.lengthMinutes * 60,
    earliestStartSeconds: at(meal.earliestMinutes),
    latestStartSeconds: at(meal.latestMinutes),
    dueAfterSeconds: meal.dueAfterMinutes * 60,
  };
}

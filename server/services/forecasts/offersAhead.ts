import { Op } from 'sequelize';
import { type DayOffer, findOffers } from '#shared/schedule/findOffers.ts';
import type { DayProblem, VisitFact } from '#shared/schedule/types.ts';
import { addDays } from '#shared/time/localDate.ts';
import { secondsToWall } from '#shared/time/wallSeconds.ts';
import type { Business } from '#server/models/Business.ts';
import { Shift } from '#server/models/Shift.ts';
import type { VisitForecast } from '#server/models/Visit.ts';
import { driveTable } from '#server/services/days/driveTable.ts';
import { type LoadedDay, loadDay } from '#server/services/days/loadDay.ts';
import { localDateOf } from '#server/services/days/today.ts';

/** An offer of one day, for people: wall minutes and names. */
export interface DatedOffer extends Pick<
  DayOffer,
  'vanId' | 'driveSecondsMore' | 'rough' | 'onTimePermille' | 'othersOnTimePermille'
> {
  date: string;
  startMinutes: number;
  endMinutes: number;
  vanName: string;
  groomerName: string;
}

const daysAhead = 14;
/** Days looked at together: one drive table for all, and often the first few are enough. */
const daysAtOnce = 4;
const mostADay = 2;
const pointId = 'asked';

/**
 * The earliest windows a household at a place could be offered, from tomorrow on, by trial insertion
 * into the days as they are planned now. Nothing is changed or held.
 */
export async function offersAhead(
  business: Business,
  place: { lat: number; lon: number },
  forecast: VisitForecast,
  now: Date,
  most: number,
): Promise<{ offers: DatedOffer[]; noOfferWords: string | null }> {
  const dates = await datesWithShifts(localDateOf(now, business.timeZone));
  const offers: DatedOffer[] = [];
  for (let from = 0; from < dates.length && offers.length < most; from += daysAtOnce) {
    const days: LoadedDay[] = [];
    for (const date of dates.slice(from, from + daysAtOnce))
      days.push(await loadDay(business.id, date, now));
    const problems = await withPoint(business, days, place);
    for (const [index, day] of days.entries())
      offers.push(...offersOf(day, problems[index]!, forecast));
  }
  if (offers.length > 0) return { offers: offers.slice(0, most), noOfferWords: null };
  return {
    offers,
    noOfferWords:
      dates.length === 0
        ? `No van has a shift in the next ${daysAhead} days. Set shifts, then ask again.`
        : `Nothing fits in the ${dates.length} planned days ahead without breaking a promise or going over hours.`,
  };
}

async function datesWithShifts(today: string): Promise<string[]> {
  const shifts = await Shift.findAll({
    where: { date: { [Op.between]: [addDays(today, 1), addDays(today, daysAhead)] } },
    attributes: ['id', 'businessId', 'date'],
    order: [['date', 'ASC']],
  });
  return [...new Set(shifts.map((shift) => shift.date))];
}

/** The days' problems with the place as their last point: its legs come from one table for all. */
async function withPoint(
  business: Business,
  days: LoadedDay[],
  place: { lat: number; lon: number },
): Promise<DayProblem[]> {
  const all = new Map(
    days.flatMap(({ problem }) => problem.points.map((point) => [point.id, point])),
  );
  const asked = { id: pointId, ...place };
  const table = await driveTable(business.areaName, [...all.values(), asked], 0);
  const size = table.points.length;
  const row = new Map(table.points.map((point, index) => [point.id, index]));
  const cell = (from: string, to: string) => row.get(from)! * size + row.get(to)!;
  return days.map(({ problem }) => {
    const points = [...problem.points, table.points.at(-1)!];
    const grown = (own: number[], wide: number[]) =>
      points.flatMap((from, i) =>
        points.map((to, j) => {
          const isOld = i < problem.points.length && j < problem.points.length;
          return isOld ? own[i * problem.points.length + j]! : wide[cell(from.id, to.id)]!;
        }),
      );
    const drive = {
      ...problem.drive,
      baseSeconds: grown(problem.drive.baseSeconds, table.drive.baseSeconds),
      metres: grown(problem.drive.metres, table.drive.metres),
    };
    return { ...problem, points, drive };
  });
}

function offersOf(day: LoadedDay, problem: DayProblem, forecast: VisitForecast): DatedOffer[] {
  const wall = (seconds: number) => secondsToWall(day.date, problem.timeZone, seconds);
  return findOffers(problem, day.plan, askedVisit(forecast, problem.points.length - 1))
    .slice(0, mostADay)
    .map((offer) => {
      const van = problem.vans.find(({ vanId }) => vanId === offer.vanId)!;
      return {
        date: day.date,
        startMinutes: wall(offer.startSeconds),
        endMinutes: wall(offer.endSeconds),
        vanId: offer.vanId,
        vanName: van.vanName,
        groomerName: van.groomerName,
        driveSecondsMore: offer.driveSecondsMore,
        rough: offer.rough,
        onTimePermille: offer.onTimePermille,
        othersOnTimePermille: offer.othersOnTimePermille,
      };
    })
    .sort((a, b) => a.startMinutes - b.startMinutes);
}

function askedVisit(forecast: VisitForecast, point: number): VisitFact {
  return {
    id: pointId,
    householdId: pointId,
    label: 'Asked for',
    point,
    siteId: null,
    work: forecast.work,
    workByGroomer: forecast.workByGroomer ?? {},
    setUpSeconds: forecast.setUpSeconds,
    cleanDownSeconds: forecast.cleanDownSeconds,
    allowed: [],
    promise: null,
    tankUse: forecast.tankUse,
    needs: forecast.needs,
    heaviestGrams: forecast.heaviestGrams,
    preferredGroomerIds: [],
    barredGroomerIds: [],
    valueSeconds: 0,
    pin: null,
  };
}

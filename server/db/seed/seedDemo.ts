import { addDays, daysBetween } from '#shared/time/localDate.ts';
import { localDateAt } from '#shared/time/dayStart.ts';
import { areaFor } from '#server/area/openAreas.ts';
import { inBusiness } from '#server/db/database.ts';
import { env } from '#server/env.ts';
import { Business } from '#server/models/Business.ts';
import { Household } from '#server/models/Household.ts';
import { Pet } from '#server/models/Pet.ts';
import { Run } from '#server/models/Run.ts';
import { Shift } from '#server/models/Shift.ts';
import { type DemoSignIn, demoSignIns } from './demoSignIns.ts';
import { dueOn, type Rhythm } from './dueOn.ts';
import { householdCount, makeHouseholds } from './makeHouseholds.ts';
import { makeBusiness } from './makeBusiness.ts';
import { keptFit } from '#server/services/learning/keptFit.ts';
import { learnMinutes } from '#server/services/learning/learnMinutes.ts';
import { stylesOf } from '#server/services/styles/stylesOf.ts';
import { forecastOf } from '#server/services/visits/forecastOf.ts';
import { planDate } from './planDate.ts';
import { seedActor } from './seedActor.ts';
import { workDate } from './workDate.ts';

const pastDays = 42;
const futureDays = 14;
/** Per date: what three vans take without running late, and a usual drive to a stop. */
const mostStaySeconds = 3 * 8.5 * 3600;
const driveSeconds = 600;
const demoArea = 'pellan-bay';

export type OnStep = (step: string, done: number, of: number) => void;

/**
 * Makes the demo business, or tops it up to today: six weeks of worked days behind, today and two
 * weeks ahead booked. Each date is one transaction, so a killed seed goes on where it stopped.
 * null when the database belongs to someone else.
 */
export async function seedDemo(now: Date, onStep: OnStep): Promise<DemoSignIn[] | null> {
  const demo = await Business.findOne({ where: { isDemo: true } });
  if (!demo && (await Business.count()) > 0) return null;
  const area = areaFor(demoArea);
  if (!area) throw new Error('The demo area is not imported yet: run npm run area -- town first.');
  const signIns = demoSignIns(env.dataFolder);
  const start = new Date(now.getTime() - (pastDays + 1) * 86_400_000);
  const business = demo ?? (await makeBusiness(area, signIns, start));
  if ((await inBusiness(business.id, () => Household.count())) < householdCount)
    await makeHouseholds(business.id, area, start, (done, of) => onStep('Households', done, of));
  await seedDates(business, now, onStep);
  await learnOnce(business.id, now, onStep);
  return signIns;
}

async function seedDates(business: Business, now: Date, onStep: OnStep): Promise<void> {
  const today = localDateAt(now.getTime(), business.timeZone);
  const first = addDays(today, -pastDays);
  const total = pastDays + futureDays + 1;
  const rhythms = await inBusiness(business.id, () => loadRhythms(business.id, today));
  const dispatcher = await inBusiness(business.id, () =>
    seedActor(business.id, 'runa@saltmarsh.example'),
  );
  for (let i = 0; i < total; i++) {
    const date = addDays(first, i);
    await inBusiness(business.id, async () => {
      if (!(await Shift.findOne({ where: { date } }))) {
        // Booked a fortnight before, so that the past was once a future.
        const bookedOn = new Date(
          Math.min(now.getTime(), Date.parse(date) - futureDays * 86_400_000),
        );
        const due = fitting(dueOn(date, rhythms));
        await planDate(dispatcher, date, due, bookedOn, { leaveOut: date === today ? 1 : 0 });
      }
      const open = await Run.findOne({ where: { date, sentVersion: null } });
      if (date < today && open)
        await workDate(business, dispatcher, date, Math.floor(daysBetween(first, date) / 7));
    });
    onStep('Days', i + 1, total);
  }
}

/** So that the demo shows learning on its first day; later nights learn by themselves. */
async function learnOnce(businessId: string, now: Date, onStep: OnStep): Promise<void> {
  if (await inBusiness(businessId, () => keptFit(businessId))) return;
  onStep('Learning', 0, 1);
  await learnMinutes(businessId, now);
  onStep('Learning', 1, 1);
}

async function loadRhythms(businessId: string, date: string): Promise<Rhythm[]> {
  const [business, households, pets] = await Promise.all([
    Business.findByPk(businessId),
    Household.findAll({
      order: [
        ['name', 'ASC'],
        ['addressLabel', 'ASC'],
      ],
    }),
    Pet.findAll({ where: { active: true }, order: [['name', 'ASC']] }),
  ]);
  const styleOf = await stylesOf(pets);
  return households.flatMap((household) => {
    const own = pets.filter((pet) => pet.householdId === household.id);
    // Somebody trying the demo may have added a household and no pet yet.
    if (own.length === 0) return [];
    const { forecast } = forecastOf(own, business!, date, new Map(), styleOf);
    const { work, setUpSeconds, cleanDownSeconds } = forecast;
    return {
      household,
      petIds: own.map((pet) => pet.id),
      intervalWeeks: Math.min(...own.map((pet) => pet.intervalWeeks)),
      staySeconds: work.meanSeconds + setUpSeconds + cleanDownSeconds + driveSeconds,
    };
  });
}

/** As many of the due as the day's hours hold; the rest come another week. */
function fitting(due: Rhythm[]): Rhythm[] {
  let left = mostStaySeconds;
  return due.filter((one) => {
    if (one.staySeconds > left) return false;
    left -= one.staySeconds;
    return true;
  });
}

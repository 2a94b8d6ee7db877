import { app, useApp } from '../support/useApp.ts';
import { describe, expect, it } from 'vitest';
import { updateBusiness } from '#shared/api/business.ts';
import { day as daySchema, getDay, moveVisit, sendRuns } from '#shared/api/days.ts';
import { setShift } from '#shared/api/groomers.ts';
import { cancelVisit } from '#shared/api/visits.ts';
import { addDays } from '#shared/time/localDate.ts';
import { inBusiness } from '#server/db/database.ts';
import { RunVersion } from '#server/models/RunVersion.ts';
import { boardDay, bookPet, ordersOf, versionsOf } from '../support/boardDay.ts';
import { buildBusiness } from '../support/buildBusiness.ts';
import { tomorrow } from '../support/tomorrow.ts';

useApp();

/** The date of the `nth` Sunday of a month (0: the last) in next year. */
function sundayOf(month: number, nth: number): string {
  const year = Number(tomorrow().slice(0, 4)) + 1;
  if (nth === 0) {
    const last = new Date(Date.UTC(year, month, 0));
    return addDays(last.toISOString().slice(0, 10), -last.getUTCDay());
  }
  const first = new Date(Date.UTC(year, month - 1, 1));
  const untilSunday = (7 - first.getUTCDay()) % 7;
  return addDays(first.toISOString().slice(0, 10), untilSunday + 7 * (nth - 1));
}

describe('days on which clocks change', () => {
  // Directive 2000/84/EC: last Sundays of March and October. 15 U.S.C. 260a: second Sunday of March,
  // first of November. Lord Howe Island moves by half an hour on first Sundays of April and October.
  const cases: [string, string, number, string][] = [
    ['Europe/Lisbon', sundayOf(3, 0), 23, 'March'],
    ['Europe/Lisbon', sundayOf(10, 0), 25, 'October'],
    ['America/New_York', sundayOf(3, 2), 23, 'March'],
    ['America/New_York', sundayOf(11, 1), 25, 'November'],
    ['Australia/Lord_Howe', sundayOf(4, 1), 24.5, 'April'],
    ['Australia/Lord_Howe', sundayOf(10, 1), 23.5, 'October'],
    ['Europe/Lisbon', addDays(sundayOf(3, 0), 1), 24, 'the Monday after'],
  ];
  for (const [timeZone, date, hours, when] of cases)
    it(`${timeZone} in ${when}: ${hours} hours, windows by the wall, seconds by what passes`, async () => {
      const { client, vans } = await buildBusiness(app, date);
      await client.must(updateBusiness, { body: { timeZone } });
      const { visit } = await bookPet(client, date, 'Rook', {
        promise: { startMinutes: 570, endMinutes: 690 },
      });
      const day = await client.must(getDay, { params: { date } });
      expect(daySchema.parse(day)).toEqual(day);
      const { problem } = day;
      expect(problem.dayLengthSeconds).toBe(hours * 3600);
      // The change is in the night, so at 8:00 the day is that much younger or older than 8 hours.
      const shift = (hours - 24) * 3600;
      expect(problem.vans[0]!.startSeconds).toBe(8 * 3600 + shift);
      expect(problem.visits[0]!.promise).toMatchObject({
        startSeconds: 570 * 60 + shift,
        endSeconds: 690 * 60 + shift,
      });
      const next = await client.must(getDay, { params: { date: addDays(date, 1) } });
      const length = Date.parse(next.problem.dayStartUtc) - Date.parse(problem.dayStartUtc);
      expect(length).toBe(hours * 3_600_000);
      const moved = await client.must(moveVisit, {
        params: { date },
        body: {
          move: { kind: 'placeVisit', visitId: visit.id, vanId: vans[0]!.id, index: 0 },
          runVersions: versionsOf(day),
        },
      });
      await client.must(sendRuns, { params: { date }, body: { runVersions: versionsOf(moved) } });
      const [sent] = await inBusiness(client.session!.business.id, () => RunVersion.findAll());
      // Held for the promise at 9:30 by the wall: the stored times are elapsed seconds too.
      expect(sent!.times.runs[0]!.stops[0]!.startSeconds).toBe(570 * 60 + shift);
    });
});

describe('a cancelled visit', () => {
  it('takes with it the meal that was only due because of it', async () => {
    const { client, date, otter, groomers, place, visits, read } = await boardDay(app);
    await client.must(setShift, {
      body: {
        date,
        vanId: otter,
        groomerId: groomers[0]!.id,
        startMinutes: 480,
        endMinutes: 1020,
        // Due only on a run longer than four hours, which one visit is not and three are.
        meal: { lengthMinutes: 30, earliestMinutes: 600, latestMinutes: 840, dueAfterMinutes: 240 },
      },
    });
    for (const petName of ['Rook', 'Wren', 'Sorrel']) await place(petName, otter);
    const kinds = async () => (await read()).plan.runs[0]!.stops.map((stop) => stop.kind);
    expect((await kinds()).filter((kind) => kind === 'meal')).toHaveLength(1);
    for (const petName of ['Wren', 'Sorrel'])
      await client.must(cancelVisit, {
        params: { visitId: visits[petName]! },
        body: { reason: 'ill' },
      });
    expect(await kinds()).toEqual(['visit']);
    expect(ordersOf(await read()).Otter).toEqual(['Rook']);
  });

  it('cancelled on two screens at once is cancelled once', async () => {
    const { client, otter, place, visits, read } = await boardDay(app);
    await place('Rook', otter);
    const params = { visitId: visits.Rook! };
    const answers = await Promise.all(
      ['ill', 'away'].map((reason) => client.call(cancelVisit, { params, body: { reason } })),
    );
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
    const { log } = await read();
    expect(log.filter((line) => line.words.startsWith('Rook cancelled'))).toHaveLength(1);
  });

  it('against a move of the same visit at the same moment: both are told the truth', async () => {
    const { client, otter, place, move, visits, read } = await boardDay(app);
    await place('Wren', otter);
    const [moved, cancelled] = await Promise.all([
      move({ kind: 'placeVisit', visitId: visits.Rook!, vanId: otter, index: 0 }),
      client.call(cancelVisit, { params: { visitId: visits.Rook! }, body: { reason: 'ill' } }),
    ]);
    expect(cancelled.status).toBe(200);
    // Made before the cancelling, or refused after it: never left on the run.
    expect([200, 404, 409]).toContain(moved.status);
    expect(ordersOf(await read())).toMatchObject({ Otter: ['Wren'], notPlaced: ['Sorrel'] });
  });
});

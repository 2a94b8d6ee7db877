import { app, useApp } from '../support/useApp.ts';
import { afterEach, describe, expect, it } from 'vitest';
import { exportReview, getReview } from '#shared/api/review.ts';
import { getRun } from '#shared/api/runs.ts';
import { updateVan } from '#shared/api/vans.ts';
import { getVisit } from '#shared/api/visits.ts';
import { straightLineLeg } from '#shared/travel/straightLineLeg.ts';
import { addDays } from '#shared/time/localDate.ts';
import { weekOf } from '#shared/time/weekOf.ts';
import { clock } from '#server/clock.ts';
import { ApiClient } from '../support/apiClient.ts';
import { workDay } from '../support/workDay.ts';

useApp();
afterEach(() => {
  clock.offsetMs = 0;
});

const minutes = (count: number) => count * 60;
const depot = { lat: 41, lon: -36 };
const homeOf = (index: number) => ({ lat: 41.01 + index / 100, lon: -36.01 });

/**
 * Rook is reached at 8:25 after 15 minutes, every step tapped 5 minutes after the one before. Wren
 * is reached at 12:00 after 10 minutes, waits for the promised 12:10 and takes 45 minutes. At Kit's,
 * reached at 13:30 after 20 minutes and late, nobody opens for 10 minutes.
 */
async function workedDay() {
  const work = await workDay(app, [
    { petName: 'Rook', promise: { startMinutes: 480, endMinutes: 540 } },
    { petName: 'Wren', promise: { startMinutes: 730, endMinutes: 760 } },
    { petName: 'Kit', promise: { startMinutes: 780, endMinutes: 800 } },
  ]);
  const { phone, stopOf, visits, client, runId } = work;
  const run = await client.must(getRun, { params: { runId } });
  const steps = run.visits.find((visit) => visit.id === stopOf('Rook'))!.steps;
  const wall = (total: number) =>
    `${Math.floor(total / 60)}:${String(total % 60).padStart(2, '0')}`;
  const [rook, wren, kit] = [stopOf('Rook'), stopOf('Wren'), stopOf('Kit')];
  const petId = visits.Rook!.pet.id;
  const onTable = 511;
  const rookDone = wall(onTable + 5 * steps.length);
  await work.at('14:00');
  const answer = await work.post([
    phone('startDriving', rook, '8:10'),
    phone('arrived', rook, '8:25'),
    phone('petOnTable', rook, wall(onTable), { petId }),
    ...steps.map((step, index) =>
      phone('stepDone', rook, wall(onTable + 5 * (index + 1)), { petId, stepKey: step.key }),
    ),
    phone('petDone', rook, rookDone, { petId }),
    phone('stopDone', rook, wall(onTable + 5 * steps.length + 6), { note: '' }),
    phone('startDriving', wren, '11:50'),
    phone('arrived', wren, '12:00'),
    phone('petOnTable', wren, '12:16', { petId: visits.Wren!.pet.id }),
    phone('petDone', wren, '13:01', { petId: visits.Wren!.pet.id }),
    phone('stopDone', wren, '13:07', { note: '' }),
    phone('startDriving', kit, '13:10'),
    phone('arrived', kit, '13:30'),
    phone('cannotDo', kit, '13:40', { reason: 'noAnswer', note: '' }),
  ]);
  if (answer.status !== 200) throw new Error(answer.text);
  return { ...work, steps };
}

describe('getReview', () => {
  it('sums a worked run to the second', async () => {
    const { client, date, steps, otter, stopOf } = await workedDay();
    const review = await client.must(getReview, { query: { date } });
    const legs = [depot, homeOf(0), homeOf(1), homeOf(2), depot].flatMap((to, index, all) =>
      index === 0 ? [] : straightLineLeg(all[index - 1]!, to),
    );
    const wren = await client.must(getVisit, { params: { visitId: stopOf('Wren') } });
    const median = (of: typeof wren.steps) => of.reduce((sum, step) => sum + step.medianSeconds, 0);
    const scissors = (of: typeof wren.steps) => of.filter((step) => step.family === 'scissor');
    const totals = {
      // Rook's tapped steps and Wren's 45 minutes; Kit was not groomed.
      groomSeconds: minutes(5 * steps.length + 45),
      // Rook's scissor steps as tapped; of Wren's clock the share the forecast gives the scissors.
      scissorSeconds:
        minutes(5 * scissors(steps).length) +
        Math.round((minutes(45) * median(scissors(wren.steps))) / median(wren.steps)),
      // 15, 10 and 20 minutes as tapped, and the way home as planned.
      driveSeconds: minutes(15 + 10 + 20) + legs[3]!.seconds,
      driveMetres: legs.reduce((sum, leg) => sum + leg.metres, 0),
      // 10 minutes for Wren's promise to begin, 10 at Kit's door.
      waitSeconds: minutes(10 + 10),
      visits: 2,
      promises: 3,
      promisesKept: 2,
    };
    expect(review.week).toEqual(totals);
    expect(review.days.map((day) => day.date)).toEqual(weekOf(date));
    expect(review.days.find((day) => day.date === date)).toEqual({ date, ...totals });
    expect(review.vans).toEqual([{ vanId: otter, vanName: 'Otter', shape: 'square', ...totals }]);
    expect(review.vanDays).toEqual([{ date, vanId: otter, vanName: 'Otter', ...totals }]);
    expect(review.weekBefore.visits).toBe(0);
    expect(review.visits.map((one) => [one.label, one.clockSeconds, one.promiseKept])).toEqual([
      ['Rook', minutes(5 * steps.length), true],
      ['Wren', minutes(45), true],
    ]);
    // The forecast is the one sent, with its 8-in-10 band.
    expect(review.visits[1]).toMatchObject({
      p10Seconds: wren.p10Seconds,
      p90Seconds: wren.p90Seconds,
      groomerName: 'Mika',
    });
    expect(review.leans).toEqual([]);
    const next = await client.must(getReview, { query: { date: addDays(date, 7) } });
    expect(next.weekBefore).toEqual(totals);
    expect(next).toMatchObject({ vans: [], vanDays: [], visits: [] });
  });

  it('takes the stay less set-up and clean-down where no pet was tapped', async () => {
    const work = await workDay(app, [{ petName: 'Rook' }]);
    await work.at('10:00');
    await work.post([
      work.phone('startDriving', work.stopOf('Rook'), '8:10'),
      work.phone('arrived', work.stopOf('Rook'), '8:20'),
      work.phone('stopDone', work.stopOf('Rook'), '9:50', { note: '' }),
    ]);
    const { week } = await work.client.must(getReview, { query: { date: work.date } });
    // 90 minutes there, 6 to set up and 6 to clean down.
    expect(week).toMatchObject({ groomSeconds: minutes(90 - 12), waitSeconds: 0, promises: 0 });
  });

  it('counts a promise as broken when the van never came', async () => {
    const work = await workDay(app, [
      { petName: 'Rook', promise: { startMinutes: 480, endMinutes: 600 } },
      { petName: 'Wren', promise: { startMinutes: 720, endMinutes: 840 } },
    ]);
    await work.at('8:40');
    await work.post([
      work.phone('startDriving', work.stopOf('Rook'), '8:10'),
      work.phone('arrived', work.stopOf('Rook'), '8:20'),
      work.phone('cannotDo', work.stopOf('Rook'), '8:35', { reason: 'groomerUnwell', note: '' }),
      work.phone('cannotDo', work.stopOf('Wren'), '8:36', { reason: 'groomerUnwell', note: '' }),
    ]);
    const { week } = await work.client.must(getReview, { query: { date: work.date } });
    expect(week).toMatchObject({ promises: 2, promisesKept: 1, visits: 0, groomSeconds: 0 });
  });

  it('leaves out runs nobody began, other businesses, and everybody but the operator', async () => {
    const { date, member } = await workedDay();
    const idle = await workDay(app, [{ petName: 'Rook' }]);
    const empty = await idle.client.must(getReview);
    expect(empty.from).toBe(weekOf(idle.date)[0]);
    expect(empty).toMatchObject({ week: { visits: 0, driveSeconds: 0 }, vans: [], visits: [] });
    for (const role of ['groomer', 'dispatcher'] as const) {
      const person = await member([role]);
      expect((await person.call(getReview, { query: { date } })).status).toBe(403);
      expect((await person.call(exportReview, { query: { date } })).status).toBe(403);
    }
    expect((await idle.client.call(getReview, { query: { date: '2026-13-01' } })).status).toBe(400);
  });
});

describe('exportReview', () => {
  const header =
    'date,van,visits,groomMinutes,scissorMinutes,driveMinutes,waitMinutes,driveMetres,promises,promisesKept\r\n';

  it('is RFC 4180: a header and one row per van and day, CRLF after each, as a file', async () => {
    const { client, date } = await workedDay();
    const { week } = await client.must(getReview, { query: { date } });
    const answer = await client.call(exportReview, { query: { date } });
    expect(answer.headers['content-type']).toBe('text/csv; charset=utf-8');
    expect(answer.headers['content-disposition']).toBe(
      `attachment; filename=furlong-${weekOf(date)[0]}.csv`,
    );
    expect(answer.headers['cache-control']).toBe('no-store');
    const inMinutes = [
      week.groomSeconds,
      week.scissorSeconds,
      week.driveSeconds,
      week.waitSeconds,
    ].map((seconds) => Math.round(seconds / 60));
    expect(answer.text).toBe(
      `${header}${date},Otter,2,${inMinutes.join(',')},${week.driveMetres},3,2\r\n`,
    );
  });

  it('keeps a van’s name from being a formula, and quotes what needs quotes', async () => {
    const { client, date, otter } = await workedDay();
    for (const [name, cell] of [
      ['=HYPERLINK("http://x","y")', `"'=HYPERLINK(""http://x"",""y"")"`],
      ['+1', "'+1"],
      ['-1', "'-1"],
      ['@sum', "'@sum"],
      ['Otter, the old', '"Otter, the old"'],
    ] as const) {
      await client.must(updateVan, { params: { vanId: otter }, body: { name } });
      const rows = (await client.call(exportReview, { query: { date } })).text.split('\r\n');
      expect(rows[1]!.startsWith(`${date},${cell},2,`), `${rows[1]}`).toBe(true);
    }
  });

  it('of an empty week is the header alone', async () => {
    const client = await new ApiClient(app).signUp();
    expect((await client.call(exportReview)).text).toBe(header);
  });
});

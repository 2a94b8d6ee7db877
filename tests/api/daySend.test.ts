import { app, useApp } from '../support/useApp.ts';
import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { sendRuns, undoMove } from '#shared/api/days.ts';
import { createPet } from '#shared/api/pets.ts';
import { updateVan } from '#shared/api/vans.ts';
import { cancelVisit, createVisit, updateVisit } from '#shared/api/visits.ts';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import { inBusiness } from '#server/db/database.ts';
import { Run } from '#server/models/Run.ts';
import { RunVersion } from '#server/models/RunVersion.ts';
import type { ApiClient } from '../support/apiClient.ts';
import { boardDay, ordersOf, versionsOf } from '../support/boardDay.ts';

useApp();

async function sendableDay(petNames?: string[]) {
  const board = await boardDay(app, petNames);
  const send = async (vanIds?: string[], versions?: Record<string, number>) =>
    board.client.call(sendRuns, {
      params: { date: board.date },
      body: {
        ...(vanIds && { vanIds }),
        runVersions: versions ?? versionsOf(await board.read()),
      },
    });
  const changed = async () =>
    Object.fromEntries((await board.read()).runs.map((run) => [run.vanName, run.changedSinceSent]));
  return { ...board, send, changed };
}

function sentRows(client: ApiClient): Promise<RunVersion[]> {
  return inBusiness(client.session!.business.id, () =>
    RunVersion.findAll({ order: ['sentAt', 'id'] }),
  );
}

const hashOf = (rows: RunVersion[]) =>
  createHash('sha256')
    .update(JSON.stringify(rows.map((row) => row.get({ plain: true }))))
    .digest('hex');

describe('sendRuns', () => {
  it('stores problem, plan, displayed times and versions of one van whole', async () => {
    const { client, visits, otter, place, send, date } = await sendableDay();
    await place('Rook', otter);
    const draft = await place('Wren', otter);
    const sent = (await send()).body;
    expect(sent.runs.map((run) => run.sentVersion)).toEqual([1, null]);
    expect(sent.log[0]!.words).toBe('Sent to Otter');
    const rows = await sentRows(client);
    expect(rows).toHaveLength(1);
    const row = rows[0]!;
    expect(row).toMatchObject({ version: 1, sentBy: 'Odile', areaVersion: null });
    expect(row.evaluatorVersion).toBe('evaluateDay/1');
    expect(row.modelVersion).not.toBe('');
    // One van's share: nothing of Sorrel's household, who is not on this run.
    expect(row.problem.visits.map((visit) => visit.id).sort()).toEqual(
      [visits.Rook, visits.Wren].sort(),
    );
    expect(JSON.stringify(row.problem)).not.toContain('Sorrel');
    expect(row.plan.runs[0]!.stops).toEqual(draft.plan.runs[0]!.stops);
    expect(row.times).toEqual(JSON.parse(JSON.stringify(evaluateDay(row.problem, row.plan))));
    const run = await inBusiness(client.session!.business.id, () =>
      Run.findOne({ where: { date, vanId: otter } }),
    );
    expect(run).toMatchObject({ sentVersion: 1, draftVersionSent: run!.version });
  });

  it('never changes a stored version, whatever is moved, cancelled or sent later', async () => {
    const { client, visits, otter, plover, place, send } = await sendableDay();
    await place('Rook', otter);
    await place('Wren', otter);
    await send();
    const [first] = await sentRows(client);
    const before = hashOf([first!]);
    await place('Rook', plover);
    await client.must(cancelVisit, { params: { visitId: visits.Wren! }, body: { reason: 'ill' } });
    await place('Sorrel', otter);
    expect((await send()).status).toBe(200);
    const rows = await sentRows(client);
    expect(rows.map((row) => row.version).sort()).toEqual([1, 1, 2]);
    expect(hashOf(rows.filter((row) => row.id === first!.id))).toBe(before);
  });

  it('sends again only what changed; nothing changed sends nothing', async () => {
    const { client, otter, plover, place, send } = await sendableDay();
    await place('Rook', otter);
    await place('Wren', plover);
    expect((await send()).body.log[0]!.words).toBe('Sent to Otter, Plover');
    const again = (await send()).body;
    expect(again.runs.map((run) => run.sentVersion)).toEqual([1, 1]);
    expect(again.log.filter((line) => line.words.startsWith('Sent'))).toHaveLength(1);
    await place('Sorrel', plover);
    const third = (await send()).body;
    expect(third.runs.map((run) => run.sentVersion)).toEqual([1, 2]);
    expect(third.log[0]!.words).toBe('Sent to Plover');
    expect(await sentRows(client)).toHaveLength(3);
  });

  it('fixes one version however often it is clicked or a van is named', async () => {
    const { client, otter, place, send } = await sendableDay();
    await place('Rook', otter);
    const answers = await Promise.all([send(), send(), send([otter, otter])]);
    expect(answers.map((answer) => answer.status)).toEqual([200, 200, 200]);
    expect((await sentRows(client)).map((row) => row.version)).toEqual([1]);
    await place('Wren', otter);
    await send([otter, otter]);
    expect((await sentRows(client)).map((row) => row.version)).toEqual([1, 2]);
  });

  it('takes only the vans named, and refuses vans without a shift', async () => {
    const { otter, plover, place, send, visits } = await sendableDay();
    await place('Rook', otter);
    await place('Wren', plover);
    expect((await send([plover])).body.runs.map((run) => run.sentVersion)).toEqual([null, 1]);
    expect((await send([visits.Rook!])).error.fields).toEqual({
      vanIds: 'must be vans with a shift that day',
    });
    expect((await send([])).status).toBe(400);
  });

  it('answers 409 with the day when a run moved on since it was seen', async () => {
    const { client, otter, plover, place, send, read } = await sendableDay();
    const seen = versionsOf(await place('Rook', otter));
    await place('Wren', otter);
    const late = await send([otter], seen);
    expect(late.status).toBe(409);
    expect((late.body as unknown as { day: unknown }).day).toEqual(await read());
    expect(await sentRows(client)).toEqual([]);
    // Plover is as it was seen; it has no stops, so there is nothing to fix.
    expect((await send([plover], seen)).status).toBe(200);
    expect(await sentRows(client)).toEqual([]);
  });

  it('refuses a pet over the table limit and a missing skill, and sends no van at all', async () => {
    const { client, date, vans, otter, plover, place, move, send, read } = await sendableDay([
      'Rook',
      'Wren',
    ]);
    await place('Rook', otter);
    await place('Wren', plover);
    await client.must(updateVan, { params: { vanId: plover }, body: { tableLimitGrams: 5000 } });
    const heavy = await send();
    expect(heavy.error).toMatchObject({ code: 'refusedMove' });
    expect(heavy.error.message).toBe(
      'Wren on Plover has a pet over the table limit. Move it before sending.',
    );
    expect(await sentRows(client)).toEqual([]);
    await client.must(updateVan, { params: { vanId: plover }, body: { tableLimitGrams: 60_000 } });
    const { householdId } = (await read()).visits[0]!;
    const cat = await client.must(createPet, {
      params: { householdId },
      body: {
        name: 'Minou',
        species: 'cat',
        breedId: null,
        weightGrams: 4000,
        styleId: 'cat-comb-out',
        coatType: 'catShort',
      },
    });
    const visit = await client.must(createVisit, { body: { householdId, date, petIds: [cat.id] } });
    await move({ kind: 'placeVisit', visitId: visit.id, vanId: vans[1]!.id, index: 0 });
    expect((await send()).error.message).toBe(
      'Minou on Plover needs cats. Move it before sending.',
    );
    expect((await send([otter])).status).toBe(200);
  });
});

describe('changedSinceSent', () => {
  it('is true only while the draft differs from what the phone has', async () => {
    const { client, date, visits, otter, plover, place, send, changed } = await sendableDay();
    await place('Rook', otter);
    await place('Wren', otter);
    expect(await changed()).toEqual({ Otter: false, Plover: false });
    await send();
    expect(await changed()).toEqual({ Otter: false, Plover: false });
    await place('Wren', otter, 0);
    expect(await changed()).toEqual({ Otter: true, Plover: false });
    await client.must(undoMove, { params: { date } });
    expect(await changed()).toEqual({ Otter: false, Plover: false });
    await place('Sorrel', plover);
    expect(await changed()).toEqual({ Otter: false, Plover: false });
    await client.must(cancelVisit, { params: { visitId: visits.Rook! }, body: { reason: 'ill' } });
    expect(await changed()).toEqual({ Otter: true, Plover: false });
    const sent = (await send()).body;
    expect(ordersOf(sent)).toMatchObject({ Otter: ['Wren'], Plover: ['Sorrel'] });
    expect(await changed()).toEqual({ Otter: false, Plover: false });
  });

  it('counts a new promise: the phone shows the old one until it is sent', async () => {
    const { client, visits, otter, place, send, changed } = await sendableDay();
    await place('Rook', otter);
    await send();
    await client.must(updateVisit, {
      params: { visitId: visits.Rook! },
      body: { promise: { startMinutes: 600, endMinutes: 720 } },
    });
    expect(await changed()).toEqual({ Otter: true, Plover: false });
    await send();
    expect(await changed()).toEqual({ Otter: false, Plover: false });
    expect((await sentRows(client)).at(-1)!.problem.visits[0]!.promise).toMatchObject({
      version: 1,
    });
  });
});

import { app, useApp } from '../support/useApp.ts';
import { afterAll, describe, expect, it } from 'vitest';
import {
  dropProposal,
  getProposal,
  keepProposal,
  type Proposal,
  startProposal,
  undoMove,
} from '#shared/api/days.ts';
import { listShifts, removeShift } from '#shared/api/groomers.ts';
import { cancelVisit } from '#shared/api/visits.ts';
import { inBusiness } from '#server/db/database.ts';
import { Proposal as ProposalRow } from '#server/models/Proposal.ts';
import { closePlanner } from '#server/optimiser/planInWorker.ts';
import { boardDay, ordersOf } from '../support/boardDay.ts';

useApp();
afterAll(closePlanner);

/** A day with the means to ask for proposals on it and to wait for them. */
async function proposingDay(petNames?: string[]) {
  const board = await boardDay(app, petNames);
  const { client, date } = board;
  const start = (body: { scope?: 'day' | 'notPlaced'; seconds?: number } = {}) =>
    client.must(startProposal, { params: { date }, body: { seconds: 1, ...body } });
  const call = (endpoint: typeof keepProposal | typeof dropProposal, { id }: Proposal) =>
    client.call(endpoint, { params: { proposalId: id } });
  const look = ({ id }: Proposal) => client.must(getProposal, { params: { proposalId: id } });
  const ready = async (proposal: Proposal) => {
    await expect
      .poll(async () => (await look(proposal)).state, { timeout: 12_000, interval: 100 })
      .toBe('ready');
    return look(proposal);
  };
  const row = ({ id }: Proposal) =>
    inBusiness(client.session!.business.id, () => ProposalRow.findByPk(id));
  return { ...board, start, call, look, ready, row };
}

describe('a proposal', () => {
  it('is searched, offered, kept as one move, and taken back by undo', async () => {
    const { client, date, start, ready, call, read, row } = await proposingDay();
    const before = await read();
    const started = await start();
    expect(started).toMatchObject({ date, state: 'working', scope: 'day', plan: null });
    expect((await read()).openProposalId).toBe(started.id);
    const offer = await ready(started);
    expect(offer.progressPermille).toBe(1000);
    expect(offer.plan!.notPlaced).toEqual([]);
    // Nothing changed yet.
    expect(ordersOf(await read())).toEqual(ordersOf(before));
    const kept = await call(keepProposal, offer);
    expect(kept.status).toBe(200);
    const day = await read();
    expect(day.plan).toEqual(offer.plan);
    expect(day).toMatchObject({ openProposalId: null, undo: { words: 'A better day kept' } });
    expect((await row(offer))!.state).toBe('kept');
    const undone = await client.must(undoMove, { params: { date } });
    expect(ordersOf(undone)).toEqual(ordersOf(before));
  });

  it('keeps placed visits on their vans when only the rest is asked for', async () => {
    const { otter, plover, place, start, ready, visits } = await proposingDay();
    await place('Rook', otter);
    await place('Wren', plover);
    const offer = await ready(await start({ scope: 'notPlaced' }));
    const vanOf = (petName: string) =>
      offer.plan!.runs.find((run) => run.stops.some((stop) => stop.id === visits[petName]))?.vanId;
    expect([vanOf('Rook'), vanOf('Wren')]).toEqual([otter, plover]);
    expect(offer.plan!.notPlaced).toEqual([]);
  });

  it('asked for twice is one search, from the same answer', async () => {
    const { start, call } = await proposingDay();
    const [one, two] = await Promise.all([start({ seconds: 20 }), start({ seconds: 20 })]);
    expect(one.id).toBe(two.id);
    expect((await start()).id).toBe(one.id);
    expect((await call(dropProposal, one)).body).toMatchObject({ state: 'dropped' });
  });

  it('shows progress and the best so far while it works, to every business', async () => {
    // The thread was woken by another business's search: its news must still reach this one.
    const { start, look, call } = await proposingDay();
    const working = await start({ seconds: 30 });
    await expect
      .poll(async () => (await look(working)).progressPermille, { timeout: 8000 })
      .toBeGreaterThan(0);
    expect(await look(working)).toMatchObject({ state: 'working', plan: { notPlaced: [] } });
    await call(dropProposal, working);
  });

  it('dropped while working stops, stays dropped and frees the thread', async () => {
    const { start, call, look, ready, read } = await proposingDay();
    const long = await start({ seconds: 60 });
    expect((await call(dropProposal, long)).status).toBe(200);
    expect((await read()).openProposalId).toBeNull();
    // The thread takes the next search at once, long before the first would have ended.
    await ready(await start());
    expect((await look(long)).state).toBe('dropped');
    expect((await call(keepProposal, long)).error).toMatchObject({
      code: 'refusedMove',
      message: 'This proposal is no longer on offer.',
    });
  });

  it('kept twice at once is kept once', async () => {
    const { start, ready, call, read } = await proposingDay();
    const offer = await ready(await start());
    const answers = await Promise.all([call(keepProposal, offer), call(keepProposal, offer)]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
    expect(answers.find((answer) => answer.status === 409)!.error).toMatchObject({
      code: 'refusedMove',
      message: 'This proposal was kept already.',
    });
    const day = await read();
    expect(day.log.filter((line) => line.words === 'A better day kept')).toHaveLength(1);
  });

  it('cannot be kept before it is ready', async () => {
    const { start, call, read } = await proposingDay();
    const before = ordersOf(await read());
    const working = await start({ seconds: 30 });
    expect((await call(keepProposal, working)).error.code).toBe('refusedMove');
    expect(ordersOf(await read())).toEqual(before);
    await call(dropProposal, working);
  });
});

describe('a day that moved on meanwhile', () => {
  it('answers 409 with the day and changes nothing: a move, a cancelled visit, a removed shift', async () => {
    const changes = [
      async ({ otter, place }: Board) => void (await place('Rook', otter)),
      async ({ client, visits }: Board) =>
        void (await client.must(cancelVisit, {
          params: { visitId: visits.Rook! },
          body: { reason: 'ill' },
        })),
      async ({ client, date }: Board) => {
        const [shift] = await client.must(listShifts, { query: { from: date, to: date } });
        await client.must(removeShift, { params: { shiftId: shift!.id } });
      },
    ];
    for (const change of changes) {
      const board = await proposingDay(['Rook', 'Wren']);
      const offer = await board.ready(await board.start());
      await change(board);
      const before = await board.read();
      const answer = await board.call(keepProposal, offer);
      expect(answer.status).toBe(409);
      expect(answer.error.code).toBe('versionMoved');
      expect((answer.body as unknown as { day: unknown }).day).toEqual(before);
      expect(await board.read()).toEqual(before);
    }
  });
});

describe('a search that ended badly', () => {
  it('of a dead server is told as failed, and the next start does not wait for it', async () => {
    const { client, start, look, call, row } = await proposingDay();
    const dead = await start({ seconds: 30 });
    await call(dropProposal, dead);
    // As a server killed half-way leaves it: working, its lease over.
    await inBusiness(client.session!.business.id, () =>
      ProposalRow.update(
        { state: 'working', leaseUntil: new Date(Date.now() - 1000) },
        { where: { id: dead.id } },
      ),
    );
    expect(await look(dead)).toMatchObject({
      state: 'failed',
      message: 'The search did not finish. Nothing changed; ask again.',
    });
    expect((await row(dead))!.state).toBe('failed');
    const next = await start();
    expect(next.id).not.toBe(dead.id);
  });

  it('by a crash of the thread says so, and the next search gets a new thread', async () => {
    const { start, look, ready } = await proposingDay();
    const doomed = await start({ seconds: 30 });
    await expect
      .poll(async () => (await look(doomed)).progressPermille, { timeout: 8000 })
      .toBeGreaterThan(0);
    await closePlanner();
    await expect.poll(async () => (await look(doomed)).state).toBe('failed');
    expect((await look(doomed)).message).toBe('The search broke off. Nothing changed; ask again.');
    await ready(await start());
  });

  it('refuses a day without vans or visits in words', async () => {
    const { client } = await proposingDay([]);
    const empty = await client.call(startProposal, { params: { date: '2031-03-03' }, body: {} });
    expect(empty.error).toMatchObject({ code: 'notReady' });
    expect(empty.error.message).toContain('No van has a shift');
  });
});

type Board = Awaited<ReturnType<typeof proposingDay>>;

import { app, useApp } from '../support/useApp.ts';
import { describe, expect, it } from 'vitest';
import { redoMove, undoMove } from '#shared/api/days.ts';
import { listShifts, removeShift } from '#shared/api/groomers.ts';
import { cancelVisit } from '#shared/api/visits.ts';
import { boardDay, bookPet, ordersOf } from '../support/boardDay.ts';

useApp();

async function undoableDay(petNames?: string[]) {
  const board = await boardDay(app, petNames);
  const params = { date: board.date };
  return {
    ...board,
    undo: () => board.client.call(undoMove, { params }),
    redo: () => board.client.call(redoMove, { params }),
  };
}

describe('undo and redo', () => {
  it('has nothing to take back on a fresh day: booking and pinning are no moves', async () => {
    const { undo, redo, read } = await undoableDay();
    expect(await read()).toMatchObject({ undo: null, redo: null });
    expect((await undo()).error).toMatchObject({
      code: 'refusedMove',
      message: 'There is nothing to undo on this day.',
    });
    expect((await redo()).error.code).toBe('refusedMove');
  });

  it('walks a chain back to the start and forward again, order for order', async () => {
    const { otter, plover, place, move, visits, undo, redo } = await undoableDay();
    const seen = [
      await place('Rook', otter),
      await place('Wren', otter, 0),
      await place('Sorrel', plover),
      (await move({ kind: 'swapRuns', vanId: otter, otherVanId: plover })).body,
      (await move({ kind: 'unplaceVisit', visitId: visits.Rook! })).body,
    ].map(ordersOf);
    const start = { Otter: [], Plover: [], notPlaced: ['Rook', 'Sorrel', 'Wren'] };
    expect(seen[4]).toEqual({ Otter: ['Sorrel'], Plover: ['Wren'], notPlaced: ['Rook'] });
    for (const before of [...seen.slice(0, 4).reverse(), start]) {
      const answer = await undo();
      expect(answer.status).toBe(200);
      expect(ordersOf(answer.body)).toEqual(before);
    }
    expect((await undo()).status).toBe(409);
    for (const after of seen) expect(ordersOf((await redo()).body)).toEqual(after);
    const last = await redo();
    expect(last.status).toBe(409);
    expect(last.error.message).toBe('There is nothing to redo on this day.');
  });

  it('says what it would do, and logs what it did', async () => {
    const { otter, place, undo, redo } = await undoableDay(['Rook']);
    const placed = await place('Rook', otter);
    expect(placed).toMatchObject({ undo: { words: 'Rook to Otter, first' }, redo: null });
    const undone = (await undo()).body;
    expect(undone).toMatchObject({ undo: null, redo: { words: 'Rook to Otter, first' } });
    expect(undone.log[0]!.words).toBe('Undone: Rook to Otter, first');
    expect((await redo()).body.log[0]!.words).toBe('Redone: Rook to Otter, first');
  });

  it('never takes back a move the screen has not shown, nor two for a double click', async () => {
    const { otter, plover, place, client, date } = await undoableDay();
    const shown = (await place('Rook', otter)).undo!;
    const newer = await place('Wren', plover);
    const body = { changeId: shown.changeId };
    const late = await client.call(undoMove, { params: { date }, body });
    expect(late).toMatchObject({ status: 409, error: { code: 'versionMoved' } });
    expect(late.body).toMatchObject({ day: { undo: newer.undo } });
    const again = { changeId: newer.undo!.changeId };
    const clicks = [1, 2].map(() => client.call(undoMove, { params: { date }, body: again }));
    expect((await Promise.all(clicks)).map(({ status }) => status).sort()).toEqual([200, 409]);
    const redo = await client.call(redoMove, { params: { date }, body });
    expect(redo.status).toBe(409);
  });

  it('forgets what was taken back once another move is made', async () => {
    const { otter, plover, place, undo, redo, read } = await undoableDay();
    await place('Rook', otter);
    await undo();
    expect((await place('Wren', plover)).redo).toBeNull();
    expect((await redo()).status).toBe(409);
    // After taking the newer move back, that one comes again: not the one given up before it.
    await undo();
    expect((await read()).redo).toMatchObject({ words: 'Wren to Plover, first' });
    expect(ordersOf((await redo()).body)).toMatchObject({ Otter: [], Plover: ['Wren'] });
    expect((await redo()).status).toBe(409);
  });

  it('keeps what changed elsewhere meanwhile', async () => {
    const { client, date, otter, place, undo } = await undoableDay();
    await place('Rook', otter);
    await place('Wren', otter);
    await bookPet(client, date, 'Kit');
    const day = (await undo()).body;
    expect(ordersOf(day)).toMatchObject({ Otter: ['Rook'], notPlaced: ['Kit', 'Sorrel', 'Wren'] });
  });

  it('passes over the moves of a visit that was cancelled since', async () => {
    const { client, visits, otter, place, undo, redo } = await undoableDay();
    await place('Rook', otter);
    await place('Wren', otter);
    await client.must(cancelVisit, { params: { visitId: visits.Wren! }, body: { reason: 'ill' } });
    const answer = await undo();
    expect(ordersOf(answer.body)).toMatchObject({ Otter: [], notPlaced: ['Rook', 'Sorrel'] });
    expect(ordersOf((await redo()).body)).toMatchObject({ Otter: ['Rook'], notPlaced: ['Sorrel'] });
    expect((await redo()).status).toBe(409);
  });

  it('gives a reason when the van has no shift any more, and changes nothing', async () => {
    const { client, date, visits, otter, plover, place, move, undo, read } = await undoableDay();
    await place('Rook', otter);
    await move({ kind: 'placeVisit', visitId: visits.Rook!, vanId: plover, index: 0 });
    const [shift] = (await client.must(listShifts, { query: { from: date, to: date } })).filter(
      (one) => one.vanId === otter,
    );
    await client.must(removeShift, { params: { shiftId: shift!.id } });
    const before = await read();
    const answer = await undo();
    expect(answer.error).toMatchObject({ code: 'refusedMove' });
    expect(answer.error.message).toMatch(/no longer|any more/);
    expect(await read()).toEqual(before);
  });

  it('clicked twice at once takes back two moves, each once', async () => {
    const { otter, place, undo, read } = await undoableDay();
    await place('Rook', otter);
    await place('Wren', otter);
    await place('Sorrel', otter);
    const answers = await Promise.all([undo(), undo()]);
    expect(answers.map((answer) => answer.status)).toEqual([200, 200]);
    expect(ordersOf(await read())).toMatchObject({
      Otter: ['Rook'],
      notPlaced: ['Sorrel', 'Wren'],
    });
  });
});

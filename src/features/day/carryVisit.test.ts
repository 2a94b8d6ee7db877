import { describe, expect, it } from 'vitest';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import type { Move } from '#shared/schedule/types.ts';
import { carryVisit, stayMove } from './carryVisit.ts';
import { moveWords, targetWords } from './moveWords.ts';
import { sampleDay, uuid } from './sampleDay.ts';

const { problem, plan } = sampleDay();
const starts = new Map(
  evaluateDay(problem, plan).runs.flatMap((run) =>
    run.stops.map((stop) => [stop.stopId, stop.startSeconds] as const),
  ),
);
const idOf = (label: string) => problem.visits.find((visit) => visit.label === label)!.id;
const press = (move: Move | null, ...keys: string[]) =>
  keys.reduce<Move | null>(
    (at, key) => at && carryVisit(problem, plan, at, key, (id) => starts.get(id) ?? 0),
    move,
  );
const juniper = idOf('Juniper');

describe('carryVisit', () => {
  it('picks up a visit where it is', () => {
    expect(stayMove(plan, juniper)).toEqual({
      kind: 'placeVisit',
      visitId: juniper,
      vanId: uuid(100),
      index: 2,
    });
    expect(stayMove(plan, idOf('Biscuit')).kind).toBe('unplaceVisit');
  });
  it('moves left and right within the run and stops at its ends', () => {
    expect(press(stayMove(plan, juniper), 'ArrowLeft', 'ArrowLeft')).toMatchObject({ index: 0 });
    expect(press(stayMove(plan, juniper), 'ArrowLeft', 'ArrowLeft', 'ArrowLeft')).toBeNull();
    expect(press(stayMove(plan, juniper), 'ArrowRight')).toMatchObject({ index: 3 });
  });
  it('lands in another van at about the same time of day', () => {
    const move = press(stayMove(plan, juniper), 'ArrowDown')!;
    expect(targetWords(problem, plan, move)).toBe('Plover, after Sorrel');
    expect(moveWords(problem, plan, move)).toBe('Juniper moves to Plover, after Sorrel');
  });
  it('leaves the vans below the last one and comes back', () => {
    const off = press(stayMove(plan, juniper), 'ArrowDown', 'ArrowDown', 'ArrowDown')!;
    expect(off.kind).toBe('unplaceVisit');
    expect(moveWords(problem, plan, off)).toBe('Juniper leaves the vans, not placed');
    expect(press(off, 'ArrowUp')).toMatchObject({ kind: 'placeVisit', vanId: uuid(102) });
    expect(press(off, 'ArrowDown')).toBeNull();
  });
  it('never lands before a stop that has begun', () => {
    const begun = {
      ...problem,
      facts: [
        {
          stopId: idOf('Hazel'),
          vanId: uuid(100),
          drivingSinceSeconds: 36_000,
          arrivedSeconds: null,
          workingSinceSeconds: null,
          leftSeconds: null,
          failedReason: null,
        },
      ],
    };
    const move = carryVisit(begun, plan, stayMove(plan, juniper), 'ArrowLeft', () => 0);
    expect(move).toBeNull();
  });
});

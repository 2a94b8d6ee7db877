import { describe, expect, it } from 'vitest';
import { applyMove } from '#shared/schedule/applyMove.ts';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import { findOffers } from '#shared/schedule/findOffers.ts';
import { optimise } from '#shared/optimiser/optimise.ts';
import type { DayProblem, Plan } from '#shared/schedule/types.ts';
import { smallDay, smallVan, smallVisit } from './support/smallDay.ts';
import { townDay } from './support/townDay.ts';

const hour = 3600;
const visitStop = (id: string) => ({ kind: 'visit' as const, id, visitId: id });

/** Depot at 0; a at 10, b at 20 and the asked-for place at 15, on one line of a minute a unit. */
function line(parts: Partial<DayProblem> = {}): { problem: DayProblem; plan: Plan } {
  const problem = smallDay([0, 10, 20, 15], {
    visits: [smallVisit('a', 1), smallVisit('b', 2)],
    ...parts,
  });
  const runs = problem.vans.map(({ vanId }, i) => ({
    vanId,
    stops: i === 0 ? [visitStop('a'), visitStop('b')] : [],
  }));
  return { problem, plan: { runs, notPlaced: [] } };
}

describe('an offer', () => {
  it('goes where it costs no driving, with a window around the arrival', () => {
    const { problem, plan } = line();
    // 8:00 + 10 min, an hour at a, 5 min: there at 9:15 for sure. The latest two hours with it inside.
    expect(findOffers(problem, plan, smallVisit('new', 3))).toEqual([
      {
        vanId: 'otter',
        index: 1,
        startSeconds: 9.25 * hour,
        endSeconds: 11.25 * hour,
        arriveSeconds: 9.25 * hour,
        driveSecondsMore: 0,
        rough: false,
        onTimePermille: 1000,
        othersOnTimePermille: null,
      },
    ]);
  });

  it('of an empty van costs the way there and back', () => {
    const { problem, plan } = line({ vans: [smallVan('otter'), smallVan('plover')] });
    const offers = findOffers(problem, plan, smallVisit('new', 3));
    expect(offers.map(({ vanId, driveSecondsMore }) => [vanId, driveSecondsMore])).toEqual([
      ['otter', 0],
      ['plover', 30 * 60],
    ]);
  });

  it('leaves the others’ promises safe: b, due by 10:00, comes first then', () => {
    const { problem, plan } = line();
    // b is reached at 9:20. With an hour of work before it, it would be 10:20.
    problem.visits[1] = smallVisit('b', 2, {
      promise: { startSeconds: 9 * hour, endSeconds: 10 * hour, version: 1 },
    });
    const [offer, ...more] = findOffers(problem, plan, smallVisit('new', 3));
    expect([offer!.index, offer!.driveSecondsMore, offer!.othersOnTimePermille]).toEqual([
      2, 0, 1000,
    ]);
    expect(more).toEqual([]);
  });

  it('is never one that breaks a hard rule: skill, table, hours, allowed window', () => {
    const { problem, plan } = line();
    for (const parts of [
      { needs: ['cats'] },
      { heaviestGrams: 50_001 },
      { barredGroomerIds: ['g-otter'] },
      { work: { meanSeconds: 9 * hour, varianceSeconds2: 0 } },
      {
        allowed: [{ startSeconds: 6 * hour, endSeconds: 7 * hour, binds: 'arrival' as const }],
      },
    ])
      expect(findOffers(problem, plan, smallVisit('new', 3, parts))).toEqual([]);
  });

  it('of a visit the day has is refused, and the day is left as it was', () => {
    const { problem, plan } = line();
    const before = JSON.stringify([problem, plan]);
    expect(() => findOffers(problem, plan, smallVisit('a', 3))).toThrow(/visit.id: 'a'/);
    findOffers(problem, plan, smallVisit('new', 3));
    expect(JSON.stringify([problem, plan])).toBe(before);
  });
});

describe('in a town', () => {
  it.each([1, 2, 3])('is what the day says once the move is made (day %i)', (seed) => {
    const whole = townDay(seed, 3, 5);
    const visit = { ...whole.visits.at(-1)!, promise: null, allowed: [] };
    const problem = { ...whole, visits: whole.visits.slice(0, -1) };
    const { plan } = optimise(
      problem,
      { runs: problem.vans.map(({ vanId }) => ({ vanId, stops: [] })), notPlaced: problem.visits.map(({ id }) => id) },
      { seed: 1, iterations: 300 },
    ); // prettier-ignore
    const offers = findOffers(problem, plan, visit, { leastOnTimePermille: 0 });
    const asked = { ...problem, visits: [...problem.visits, visit] };
    const start = { ...plan, notPlaced: [...plan.notPlaced, visit.id] };
    const before = evaluateDay(asked, start);
    expect(offers.length).toBeGreaterThan(0);
    for (const offer of offers) {
      const { plan: next } = applyMove(asked, start, { kind: 'placeVisit', visitId: visit.id, vanId: offer.vanId, index: offer.index }); // prettier-ignore
      const after = evaluateDay(asked, next);
      expect(after.driveSeconds - before.driveSeconds).toBe(offer.driveSecondsMore);
      expect(offer.startSeconds).toBeLessThanOrEqual(offer.arriveSeconds);
      expect(offer.arriveSeconds).toBeLessThanOrEqual(offer.endSeconds);
    }
  });
});

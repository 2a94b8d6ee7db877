import { describe, expect, it } from 'vitest';
import { emptyPlan } from '#shared/schedule/emptyPlan.ts';
import { explainNotPlaced } from '#shared/schedule/explainNotPlaced.ts';
import type { DayProblem, Plan, VanShift, VisitFact } from '#shared/schedule/types.ts';
import { smallDay, smallVan, smallVisit } from './support/smallDay.ts';

const at = (hours: number, minutes = 0) => hours * 3600 + minutes * 60;

function oneVan(van: Partial<VanShift>, visit: Partial<VisitFact>): DayProblem {
  return smallDay([0, 10, 20], {
    vans: [smallVan('curlew', van)],
    visits: [smallVisit('a', 1), smallVisit('x', 2, visit)],
  });
}

function why(problem: DayProblem, plan: Plan = withFirst(problem)) {
  return explainNotPlaced(problem, plan)[0]!;
}

function withFirst(problem: DayProblem): Plan {
  return {
    runs: [{ vanId: 'curlew', stops: [{ kind: 'visit', id: 'a', visitId: 'a' }] }],
    notPlaced: problem.visits.slice(1).map(({ id }) => id),
  };
}

describe('why a visit is not placed', () => {
  it('says how much later the van would finish', () => {
    // 8:00 + 20 + 60 + 10 … a, 10, x, 60, 20 home: 10:40; the shift may last until 10:15.
    const reason = why(oneVan({ endSeconds: at(10), mostOvertimeSeconds: 900 }, {}));
    expect(reason.words).toBe('fits if Curlew may finish 25 min later');
    expect(reason.smallest).toMatchObject({ rule: 'overtime', byAmount: 1500, vanId: 'curlew' });
  });

  it('names skill, weight, groomer, pin and hours', () => {
    expect(why(oneVan({}, { needs: ['cats'] })).words).toBe('Curlew needs skill cats');
    expect(why(oneVan({}, { heaviestGrams: 62_500 })).words).toBe(
      "pet is 12.5 kg over Curlew's table limit",
    );
    expect(why(oneVan({}, { barredGroomerIds: ['g-curlew'] })).words).toBe(
      'household does not want Groomer of curlew',
    );
    expect(why(oneVan({}, { pin: { vanId: 'otter' } })).words).toMatch(/^pinned to/);
    const evening = [{ startSeconds: at(20), endSeconds: at(21), binds: 'arrival' as const }];
    expect(why(oneVan({}, { allowed: evening })).words).toBe('no van works then');
    const nobody = smallDay([0, 1], { vans: [], visits: [smallVisit('x', 1)] });
    expect(why(nobody, emptyPlan(nobody)).words).toBe('no van works then');
  });

  it('gives the window that would have to move, its own or another', () => {
    const early = [{ startSeconds: at(8), endSeconds: at(8, 15), binds: 'arrival' as const }];
    const own = why(oneVan({}, { allowed: early }));
    expect(own.words).toBe('fits Curlew if its window ends 5 min later');
    const problem = oneVan({}, { allowed: [{ ...early[0]!, endSeconds: at(8, 30) }] });
    const tight = {
      ...problem,
      visits: [smallVisit('a', 1, { label: 'Rook & Wren', allowed: early }), problem.visits[1]!],
    };
    expect(why(tight)).toMatchObject({ smallest: { rule: 'window', stopId: 'x', byAmount: 3000 } });
  });

  it('names water, meal and driving', () => {
    const tanks = [{ kind: 'fresh' as const, capacityMl: 50_000, usedAtStartMl: 0 }];
    expect(why(oneVan({ tanks }, { tankUse: [{ kind: 'fresh', ml: 52_000 }] })).words).toMatch(
      /2.0 l more tank/,
    );
    expect(why(oneVan({ mostDriveSeconds: 2100 }, {})).words).toBe(
      'fits if Curlew may drive 5 min more',
    );
    const meal = {
      lengthSeconds: 1800,
      earliestStartSeconds: at(9, 30),
      latestStartSeconds: at(10),
      dueAfterSeconds: 3600,
    };
    const early = [{ startSeconds: at(8), endSeconds: at(9, 25), binds: 'arrival' as const }];
    const work = { meanSeconds: at(3), varianceSeconds2: 0 };
    const reason = why(oneVan({ meal }, { work, allowed: early }));
    expect(reason.vans[0]!.rule).toBe('meal');
    expect(reason.words).toMatch(/no meal between 9:30 and 10:00/);
  });

  it('says when it fits after all, and prefers that', () => {
    const reason = why(oneVan({}, {}));
    expect(reason.smallest).toMatchObject({ rule: 'fits', addedCost: 1200, index: 0 });
  });
});

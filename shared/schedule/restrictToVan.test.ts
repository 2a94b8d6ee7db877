import { describe, expect, it } from 'vitest';
import { restrictToVan } from './restrictToVan.ts';
import type { DayProblem, Plan, VanShift, VisitFact } from './types.ts';

const points = ['depot', 'a', 'b', 'c', 'quay', 'errand'];
const size = points.length;

const van = (vanId: string, startPoint: number): VanShift => ({
  vanId,
  vanName: vanId,
  groomerId: `g-${vanId}`,
  groomerName: 'Mika',
  startSeconds: 0,
  endSeconds: 36_000,
  mostOvertimeSeconds: 0,
  mostDriveSeconds: null,
  loadSeconds: 0,
  washDownSeconds: 0,
  startPoint,
  endPoint: 0,
  skills: [],
  tableLimitGrams: 50_000,
  tanks: [],
  meal: null,
});

const visit = (id: string, point: number): VisitFact => ({
  id,
  householdId: `h-${id}`,
  label: id,
  point,
  siteId: null,
  work: { meanSeconds: 3600, varianceSeconds2: 0 },
  workByGroomer: {},
  setUpSeconds: 0,
  cleanDownSeconds: 0,
  allowed: [],
  promise: null,
  tankUse: [],
  needs: [],
  heaviestGrams: 5000,
  preferredGroomerIds: [],
  barredGroomerIds: [],
  valueSeconds: 0,
  pin: null,
});

const plan: Plan = {
  runs: [
    { vanId: 'otter', stops: [{ kind: 'visit', id: 'va', visitId: 'va' }] },
    {
      vanId: 'plover',
      stops: [
        { kind: 'visit', id: 'vc', visitId: 'vc' },
        { kind: 'errand', id: 'e', point: 5, lengthSeconds: 600 },
        { kind: 'visit', id: 'vb', visitId: 'vb' },
      ],
    },
  ],
  notPlaced: ['vd'],
};

const problem: DayProblem = {
  v: 1,
  date: '2026-04-14',
  dayStartUtc: '2026-04-14T00:00:00.000Z',
  timeZone: 'UTC',
  dayLengthSeconds: 86_400,
  points: points.map((id) => ({ id, lat: 0, lon: 0, rough: false })),
  drive: {
    baseSeconds: Array.from({ length: size * size }, (_, at) => at),
    metres: Array.from({ length: size * size }, (_, at) => at * 10),
    bands: [{ fromSeconds: 0, permille: 1000 }],
    cvPermille: 150,
  },
  vans: [van('otter', 0), van('plover', 0)],
  visits: [visit('va', 1), visit('vb', 2), visit('vc', 3), visit('vd', 1)],
  refills: [
    {
      id: 'quay',
      name: 'Quay Yard',
      point: 4,
      kinds: ['fresh'],
      lengthSeconds: 720,
      opensSeconds: 0,
      closesSeconds: 86_400,
    },
  ],
  weights: {
    lateFactor: 6,
    waitFactorPermille: 300,
    overtimeFactor: 2,
    otherGroomerSeconds: 600,
    disturbSeconds: 300,
  },
  nowSeconds: null,
  facts: [],
  sent: plan,
};

describe('restrictToVan', () => {
  const mine = restrictToVan(problem, plan, 'plover');

  it('keeps only what the van touches, points renumbered', () => {
    expect(mine.problem.points.map(({ id }) => id)).toEqual(['depot', 'b', 'c', 'quay', 'errand']);
    expect(mine.problem.visits.map(({ id, point }) => [id, point])).toEqual([
      ['vb', 1],
      ['vc', 2],
    ]);
    expect(mine.problem.vans.map(({ vanId }) => vanId)).toEqual(['plover']);
    expect(mine.problem.refills[0]?.point).toBe(3);
    expect(JSON.stringify(mine)).not.toContain('h-va');
  });

  it('keeps every leg as long as it was', () => {
    for (const [row, from] of mine.problem.points.entries())
      for (const [column, to] of mine.problem.points.entries()) {
        const old = points.indexOf(from.id) * size + points.indexOf(to.id);
        expect(mine.problem.drive.baseSeconds[row * 5 + column]).toBe(old);
        expect(mine.problem.drive.metres[row * 5 + column]).toBe(old * 10);
      }
  });

  it('keeps the order, with errands at their new point', () => {
    expect(mine.plan).toEqual({
      runs: [
        {
          vanId: 'plover',
          stops: [
            { kind: 'visit', id: 'vc', visitId: 'vc' },
            { kind: 'errand', id: 'e', point: 4, lengthSeconds: 600 },
            { kind: 'visit', id: 'vb', visitId: 'vb' },
          ],
        },
      ],
      notPlaced: [],
    });
    expect(mine.problem.sent).toEqual(mine.plan);
  });

  it('names a van that does not work that day', () => {
    expect(() => restrictToVan(problem, plan, 'curlew')).toThrow(/'curlew' has no shift/);
  });
});

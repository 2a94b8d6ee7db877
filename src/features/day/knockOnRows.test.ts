import { describe, expect, it } from 'vitest';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import type { Move } from '#shared/schedule/types.ts';
import { knockOnRows } from './knockOnRows.ts';
import { ruleWords } from './ruleWords.ts';
import { sampleDay, uuid } from './sampleDay.ts';
import { tryMove } from './tryMove.ts';

const day = sampleDay();
const { problem, plan } = day;
const before = evaluateDay(problem, plan);
const idOf = (label: string) => problem.visits.find((visit) => visit.label === label)!.id;
const rowsOf = (move: Move) => {
  const trial = tryMove(problem, plan, before, move);
  return knockOnRows(problem, trial.times, trial.knockOn, move, 'kg');
};

describe('knockOnRows', () => {
  it('says the moved household’s own promise first, then driving', () => {
    const rows = rowsOf({
      kind: 'placeVisit',
      visitId: idOf('Juniper'),
      vanId: uuid(102),
      index: 3,
    });
    expect(rows[0]!.label).toBe('Juniper, promised 12:00–14:00');
    expect(rows[0]!.value).toMatch(/^\d+ % on time$/);
    expect(rows[1]!.label).toBe('Driving');
    expect(rows.filter((row) => row.key.startsWith('finish-'))).toHaveLength(2);
  });
  it('marks a promised visit on no van as bad, an unpromised one as plain', () => {
    const promised = rowsOf({ kind: 'unplaceVisit', visitId: idOf('Juniper') });
    expect(promised[0]).toMatchObject({ value: 'on no van', tone: 'bad' });
    const biscuit = rowsOf({
      kind: 'placeVisit',
      visitId: idOf('Biscuit'),
      vanId: uuid(102),
      index: 4,
    });
    expect(biscuit[0]!.label).toBe('Biscuit, nothing promised yet');
    expect(biscuit[0]!.value).toMatch(/^arrives \d+:\d\d$/);
  });
  it('names the refill a fuller tank needs', () => {
    const rows = rowsOf({
      kind: 'placeVisit',
      visitId: idOf('Biscuit'),
      vanId: uuid(100),
      index: 4,
    });
    expect(rows.find((row) => row.key.startsWith('refill-'))?.value).toBe(
      'refill added at Quay Yard, 12 min',
    );
  });
  it('counts the arrivals it shifts', () => {
    const rows = rowsOf({
      kind: 'placeVisit',
      visitId: idOf('Otis'),
      vanId: uuid(100),
      index: 0,
    });
    expect(rows.some((row) => /^\d+ other arrivals?$/.test(row.label))).toBe(true);
  });
});

describe('tryMove', () => {
  it('answers within the day when the visit is gone', () => {
    const trial = tryMove(problem, plan, before, {
      kind: 'placeVisit',
      visitId: uuid(777),
      vanId: uuid(100),
      index: 0,
    });
    expect(trial.refusedBecause).toMatch(/not on this day any more/);
    expect(trial.plan).toBe(plan);
  });
});

describe('ruleWords', () => {
  it('says the amount in the business’s unit', () => {
    const broken = {
      rule: 'tableLimit' as const,
      hard: true,
      vanId: uuid(100),
      stopId: idOf('Biscuit'),
      byAmount: 4536,
      inherited: false,
    };
    expect(ruleWords(problem, broken, 'kg')).toBe(
      'Biscuit is 4.5 kg over what Otter’s table takes',
    );
    expect(ruleWords(problem, broken, 'lb')).toBe('Biscuit is 10 lb over what Otter’s table takes');
    expect(ruleWords(problem, { ...broken, rule: 'overtime', byAmount: 1500 }, 'kg')).toBe(
      'Otter finishes 25 min past its longest overtime',
    );
  });
});

import { describe, expect, it } from 'vitest';
import { applyMove } from '#shared/schedule/applyMove.ts';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import { movedVisits, placedAndTakenOff, proposalRows } from './proposalRows.ts';
import { sampleDay, uuid } from './sampleDay.ts';

const { problem, plan } = sampleDay();
const times = evaluateDay(problem, plan);

describe('proposalRows', () => {
  it('says the same day as the same', () => {
    const rows = proposalRows(problem, { plan, times }, { plan, times }, 'km');
    expect(rows.every((row) => row.tone === 'same')).toBe(true);
  });
  it('calls less driving better and more not placed worse', () => {
    const after = {
      plan: { ...plan, notPlaced: [...plan.notPlaced, 'x'] },
      times: { ...times, driveSeconds: times.driveSeconds - 1800 },
    };
    const rows = proposalRows(problem, { plan, times }, after, 'km');
    const tone = (label: string) => rows.find((row) => row.label === label)?.tone;
    expect(tone('Driving')).toBe('better');
    expect(tone('Not placed')).toBe('worse');
    expect(tone('Waiting')).toBe('same');
  });
});

describe('movedVisits', () => {
  it('names the visit that moved and the one whose neighbour changed', () => {
    const juniper = problem.visits.find((visit) => visit.label === 'Juniper')!.id;
    const wren = problem.visits.find((visit) => visit.label === 'Rook & Wren')!.id;
    const moved = applyMove(problem, plan, {
      kind: 'placeVisit',
      visitId: juniper,
      vanId: uuid(102),
      index: 4,
    }).plan;
    expect([...movedVisits(plan, moved)].sort()).toEqual([juniper, wren].sort());
    expect(movedVisits(plan, plan).size).toBe(0);
  });
});

describe('placedAndTakenOff', () => {
  it('names who leaves the vans, with the promise, and who joins', () => {
    const juniper = problem.visits.find((visit) => visit.label === 'Juniper')!.id;
    const biscuit = problem.visits.find((visit) => visit.label === 'Biscuit')!.id;
    const off = applyMove(problem, plan, { kind: 'unplaceVisit', visitId: juniper }).plan;
    const swapped = applyMove(problem, off, {
      kind: 'placeVisit',
      visitId: biscuit,
      vanId: uuid(100),
      index: 2,
    }).plan;
    expect(placedAndTakenOff(problem, plan, swapped)).toEqual({
      takenOff: ['Juniper (promised 12:00–14:00)'],
      placed: ['Biscuit'],
    });
  });
});

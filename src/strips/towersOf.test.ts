import { describe, expect, it } from 'vitest';
import { joinNarrow } from './joinNarrow.ts';
import { towersOf, type TowerStep } from './towersOf.ts';

const step = (key: string, family: TowerStep['family'], minutes: number, petId = 'pip') => ({
  petId,
  key,
  family,
  label: key,
  meanSeconds: minutes * 60,
  attentionPermille: family === 'scissor' ? 1000 : 400,
  reasons: [],
});
const names = new Map([['pip', 'Pip']]);

describe('towersOf', () => {
  it('lays the steps one after another from the start of work', () => {
    const towers = towersOf(
      [step('bath', 'wash', 15), step('scissor', 'scissor', 30)],
      names,
      9 * 3600,
      45 * 60,
    );
    expect(towers.map((t) => [t.petName, t.family, t.fromSeconds, t.toSeconds])).toEqual([
      ['Pip', 'wash', 32_400, 33_300],
      ['Pip', 'scissor', 33_300, 35_100],
    ]);
  });
  it('fills the groomer’s own minutes exactly', () => {
    const towers = towersOf([step('a', 'wash', 10), step('b', 'dry', 20)], names, 0, 3600);
    expect(towers.map((t) => t.toSeconds)).toEqual([1200, 3600]);
    expect(towers[1]!.steps[0]!.seconds).toBe(2400);
  });
  it('draws nothing for a visit without steps', () => {
    expect(towersOf([], names, 0, 3600)).toEqual([]);
  });
});

describe('joinNarrow', () => {
  const towers = towersOf(
    [step('nails', 'prep', 2), step('ears', 'prep', 3), step('bath', 'wash', 15)],
    names,
    0,
    20 * 60,
  );
  it('joins slivers of one family and keeps their steps', () => {
    const joined = joinNarrow(towers, 150);
    expect(joined.map((t) => [t.family, t.toSeconds - t.fromSeconds])).toEqual([
      ['prep', 300],
      ['wash', 900],
    ]);
    expect(joined[0]!.steps.map((s) => s.label)).toEqual(['nails', 'ears']);
  });
  it('leaves towers alone that are wide enough', () => {
    expect(joinNarrow(towers, 100)).toHaveLength(3);
  });
  it('never joins two pets', () => {
    const two = towersOf(
      [step('nails', 'prep', 2), step('nails', 'prep', 2, 'wren')],
      names,
      0,
      240,
    );
    expect(joinNarrow(two, 1000)).toHaveLength(2);
  });
});

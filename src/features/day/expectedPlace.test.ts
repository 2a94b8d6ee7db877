import { describe, expect, it } from 'vitest';
import { evaluateDay } from '#shared/schedule/evaluateDay.ts';
import { expectedPlace } from './expectedPlace.ts';
import { routePoints } from './routePoints.ts';
import { sampleDay } from './sampleDay.ts';

const { problem, plan } = sampleDay();
const run = evaluateDay(problem, plan).runs[0]!;
const first = run.stops[0]!;
const at = (index: number) => [problem.points[index]!.lat, problem.points[index]!.lon];

describe('expectedPlace', () => {
  it('is nowhere before leaving and after coming home', () => {
    expect(expectedPlace(problem, run, null, run.leaveSeconds - 1)).toBeNull();
    expect(expectedPlace(problem, run, null, run.finishSeconds + 1)).toBeNull();
  });
  it('stands at the stop until the van leaves it', () => {
    expect(expectedPlace(problem, run, null, first.endSeconds - 1)).toEqual(at(first.point));
  });
  it('goes along the road line by the share of the time gone', () => {
    const half = (first.departSeconds + first.arriveSeconds) / 2;
    const line: [number, number][] = [
      [43.5, -8.2],
      [43.5, -8.19],
      [43.5, -8.18],
    ];
    const place = expectedPlace(problem, run, [{ line }], half)!;
    expect(place[0]).toBeCloseTo(43.5, 6);
    expect(place[1]).toBeCloseTo(-8.19, 4);
  });
});

describe('routePoints', () => {
  it('goes from the start over every stop with a place to the end', () => {
    const points = routePoints(problem, run);
    // Four visits between start and end; the meal has no place of its own.
    expect(points).toHaveLength(6);
    expect(points[0]).toEqual(points.at(-1));
    expect(routePoints(problem, { ...run, stops: [] })).toEqual([]);
  });
});

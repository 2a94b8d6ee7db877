import { addDays } from '#shared/time/localDate.ts';
import { weekOf } from '#shared/time/weekOf.ts';
import { today } from '#server/services/days/today.ts';
import { addTotals, noTotals, type Totals } from './totals.ts';
import { type ReviewedRun, reviewRuns } from './reviewRuns.ts';

/** A week of runs as they really went, from sent versions and taps, with the week before to compare. */
export async function getReview(businessId: string, date: string | undefined, now: Date) {
  const week = weekOf(date ?? (await today(businessId, now)));
  const before = weekOf(addDays(week[0]!, -7));
  const [runs, earlier] = await Promise.all([
    reviewRuns(businessId, week[0]!, week[6]!),
    reviewRuns(businessId, before[0]!, before[6]!),
  ]);
  return {
    from: week[0]!,
    to: week[6]!,
    week: sum(runs),
    weekBefore: sum(earlier),
    days: week.map((day) => ({ date: day, ...sum(runs.filter((run) => run.date === day)) })),
    vans: groupBy(runs, (run) => run.vanId).map((list) => ({
      vanId: list[0]!.vanId,
      vanName: list[0]!.vanName,
      shape: list[0]!.shape,
      ...sum(list),
    })),
    vanDays: runs.map(({ date: day, vanId, vanName, totals }) => ({
      date: day,
      vanId,
      vanName,
      ...totals,
    })),
    visits: runs.flatMap((run) => run.visits),
    leans: leansOf(runs),
  };
}

function sum(runs: ReviewedRun[]): Totals {
  return runs.map((run) => run.totals).reduce(addTotals, noTotals);
}

/** Forecast against clock by coat and style, the most visited first; fewer than three visits say nothing. */
function leansOf(runs: ReviewedRun[]) {
  return groupBy(
    runs.flatMap((run) => run.visits),
    (visit) => visit.coatStyle,
  )
    .filter((list) => list.length >= 3)
    .map((list) => {
      const forecastSeconds = Math.round(
        list.reduce((total, one) => total + one.forecastSeconds, 0) / list.length,
      );
      const clockSeconds = Math.round(
        list.reduce((total, one) => total + one.clockSeconds, 0) / list.length,
      );
      return {
        coatStyle: list[0]!.coatStyle,
        visits: list.length,
        forecastSeconds,
        clockSeconds,
        leanPermille:
          forecastSeconds === 0 ? 0 : Math.round((clockSeconds / forecastSeconds - 1) * 1000),
      };
    })
    .sort((a, b) => b.visits - a.visits);
}

function groupBy<Item>(items: Item[], key: (item: Item) => string): Item[][] {
  const groups = new Map<string, Item[]>();
  for (const item of items) groups.set(key(item), [...(groups.get(key(item)) ?? []), item]);
  return [...groups.values()];
}

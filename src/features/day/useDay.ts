import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useCallback } from 'react';
import type { Day } from '#shared/api/days.ts';
import { dayKeys, dayQueries } from '#src/api/days.ts';

/** The day, read again every 10 s while the page is in sight, and a way to put a newer one in. */
export function useDay(date: string) {
  const client = useQueryClient();
  const query = useQuery({ ...dayQueries.one(date), refetchInterval: 10_000 });
  const onDay = useCallback(
    (day: Day) => {
      // An answer of a read that began before this change would bring the old day back.
      void client.cancelQueries({ queryKey: dayKeys.one(day.date) });
      client.setQueryData(dayKeys.one(day.date), day);
    },
    [client],
  );
  return { query, onDay };
}

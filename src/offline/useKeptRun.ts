import { useQuery } from '@tanstack/react-query';
import { useEffect } from 'react';
import type { RunDetail } from '#shared/api/runs.ts';
import { queryClient } from '#src/api/queryClient.ts';
import { runQueries } from '#src/api/runs.ts';
import { useSession } from '#src/api/sessionStore.ts';
import { noteServerNow } from './clockOffset.ts';
import { openPhoneStore } from './openPhoneStore.ts';
import { ownerKeyOf } from './startQueue.ts';

/**
 * A run from the server, read again every 30 s while the page is in front; the copy kept on the
 * phone until an answer comes. Copies of other dates are forgotten.
 */
export function useKeptRun(runId: string): {
  run: RunDetail | null;
  error: Error | null;
  refetch: () => void;
} {
  const ownerKey = ownerKeyOf(useSession());
  const { data, error, refetch, dataUpdatedAt } = useQuery({
    ...runQueries.one(runId),
    refetchInterval: 30_000,
    refetchOnWindowFocus: true,
  });
  useEffect(() => {
    let wanted = true;
    const { queryKey } = runQueries.one(runId);
    void openPhoneStore()
      .then((store) => store.readRun(ownerKey, runId))
      .then((kept) => {
        // Older than any answer: it only fills the screen until one comes.
        if (wanted && kept && !queryClient.getQueryData(queryKey))
          queryClient.setQueryData(queryKey, kept.run, { updatedAt: 1 });
      });
    return () => {
      wanted = false;
    };
  }, [ownerKey, runId]);
  useEffect(() => {
    if (!data || dataUpdatedAt <= 1) return;
    noteServerNow(data.serverNow, dataUpdatedAt);
    void openPhoneStore().then(async (store) => {
      await store.keepRun({ ownerKey, run: data, keptAtMs: dataUpdatedAt });
      await store.forgetRuns((kept) => kept.ownerKey === ownerKey && kept.run.date !== data.date);
    });
  }, [data, dataUpdatedAt, ownerKey]);
  return { run: data ?? null, error, refetch: () => void refetch() };
}

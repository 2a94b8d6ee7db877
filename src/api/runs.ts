import { queryOptions } from '@tanstack/react-query';
import { addRunEvents, addRunFix, getRun, listRuns } from '#shared/api/runs.ts';
import { callApi } from './callApi.ts';
import { useApiMutation } from './useApiMutation.ts';

export const runKeys = { all: ['runs'] as const };

export const runQueries = {
  list: (date?: string) =>
    queryOptions({
      queryKey: [...runKeys.all, 'list', date ?? 'today'],
      queryFn: ({ signal }) => callApi(listRuns, { query: date ? { date } : {}, signal }),
    }),
  one: (runId: string) =>
    queryOptions({
      queryKey: [...runKeys.all, 'one', runId],
      queryFn: ({ signal }) => callApi(getRun, { params: { runId }, signal }),
    }),
};

export const useAddRunEvents = () => useApiMutation(addRunEvents, []);
export const useAddRunFix = () => useApiMutation(addRunFix, []);

import { queryOptions } from '@tanstack/react-query';
import {
  dropProposal,
  getDay,
  getProposal,
  keepProposal,
  moveVisit,
  pinVisit,
  redoMove,
  sendRuns,
  startProposal,
  undoMove,
} from '#shared/api/days.ts';
import { callApi } from './callApi.ts';
import { useApiMutation } from './useApiMutation.ts';

export const dayKeys = {
  all: ['days'] as const,
  one: (date: string) => ['days', date] as const,
  proposals: ['proposals'] as const,
};

export const dayQueries = {
  one: (date: string) =>
    queryOptions({
      queryKey: dayKeys.one(date),
      queryFn: ({ signal }) => callApi(getDay, { params: { date }, signal }),
    }),
  proposal: (proposalId: string) =>
    queryOptions({
      queryKey: [...dayKeys.proposals, proposalId],
      queryFn: ({ signal }) => callApi(getProposal, { params: { proposalId }, signal }),
      refetchInterval: (query) => (query.state.data?.state === 'working' ? 400 : false),
    }),
};

/** Each answers with the whole day: put it into the cache with `setQueryData(dayKeys.one(date))`. */
export const useMoveVisit = () => useApiMutation(moveVisit, []);
export const usePinVisit = () => useApiMutation(pinVisit, []);
export const useUndoMove = () => useApiMutation(undoMove, []);
export const useRedoMove = () => useApiMutation(redoMove, []);
export const useSendRuns = () => useApiMutation(sendRuns, [['runs']]);
export const useStartProposal = () => useApiMutation(startProposal, []);
export const useKeepProposal = () => useApiMutation(keepProposal, [dayKeys.proposals]);
export const useDropProposal = () => useApiMutation(dropProposal, [dayKeys.all, dayKeys.proposals]);

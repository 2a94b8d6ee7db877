import { queryOptions } from '@tanstack/react-query';
import { getPetLearned, learnMinutes, listFits } from '#shared/api/learning.ts';
import { callApi } from './callApi.ts';
import { useApiMutation } from './useApiMutation.ts';

export const learningKeys = { all: ['learning'] as const };

const lookAgainMs = 1000;

export const learningQueries = {
  /** Read again every second while a fit is under way. */
  fits: () =>
    queryOptions({
      queryKey: [...learningKeys.all, 'fits'],
      queryFn: ({ signal }) => callApi(listFits, { signal }),
      refetchInterval: ({ state }) =>
        state.data?.fits[0]?.state === 'working' ? lookAgainMs : false,
    }),
  pet: (petId: string) =>
    queryOptions({
      queryKey: [...learningKeys.all, 'pets', petId],
      queryFn: ({ signal }) => callApi(getPetLearned, { params: { petId }, signal }),
    }),
};

export const useLearnMinutes = () => useApiMutation(learnMinutes, [learningKeys.all]);

import { queryOptions } from '@tanstack/react-query';
import { cancelVisit, createVisit, getVisit, updateVisit } from '#shared/api/visits.ts';
import { callApi } from './callApi.ts';
import { dayKeys } from './days.ts';
import { householdKeys } from './households.ts';
import { petKeys } from './pets.ts';
import { useApiMutation } from './useApiMutation.ts';

export const visitKeys = { all: ['visits'] as const };

export const visitQueries = {
  one: (visitId: string) =>
    queryOptions({
      queryKey: [...visitKeys.all, visitId],
      queryFn: ({ signal }) => callApi(getVisit, { params: { visitId }, signal }),
    }),
};

const touched = [visitKeys.all, dayKeys.all, householdKeys.all, petKeys.all];

export const useCreateVisit = () => useApiMutation(createVisit, touched);
export const useUpdateVisit = () => useApiMutation(updateVisit, touched);
export const useCancelVisit = () => useApiMutation(cancelVisit, touched);

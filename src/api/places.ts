import { queryOptions } from '@tanstack/react-query';
import { createPlace, listPlaces, removePlace, updatePlace } from '#shared/api/places.ts';
import { callApi } from './callApi.ts';
import { dayKeys } from './days.ts';
import { useApiMutation } from './useApiMutation.ts';

export const placeKeys = { all: ['places'] as const };

export const placeQueries = {
  list: () =>
    queryOptions({
      queryKey: placeKeys.all,
      queryFn: ({ signal }) => callApi(listPlaces, { signal }),
    }),
};

const touched = [placeKeys.all, dayKeys.all];

export const useCreatePlace = () => useApiMutation(createPlace, touched);
export const useUpdatePlace = () => useApiMutation(updatePlace, touched);
export const useRemovePlace = () => useApiMutation(removePlace, touched);

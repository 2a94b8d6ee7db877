import { queryOptions } from '@tanstack/react-query';
import { createVan, listVans, retireVan, updateVan } from '#shared/api/vans.ts';
import { callApi } from './callApi.ts';
import { dayKeys } from './days.ts';
import { useApiMutation } from './useApiMutation.ts';

export const vanKeys = { all: ['vans'] as const };

export const vanQueries = {
  list: () =>
    queryOptions({
      queryKey: vanKeys.all,
      queryFn: ({ signal }) => callApi(listVans, { signal }),
    }),
};

const touched = [vanKeys.all, dayKeys.all];

export const useCreateVan = () => useApiMutation(createVan, touched);
export const useUpdateVan = () => useApiMutation(updateVan, touched);
export const useRetireVan = () => useApiMutation(retireVan, touched);

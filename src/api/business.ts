import { queryOptions } from '@tanstack/react-query';
import { getBusiness, listAreas, updateBusiness } from '#shared/api/business.ts';
import { callApi } from './callApi.ts';
import { dayKeys } from './days.ts';
import { useApiMutation } from './useApiMutation.ts';

export const businessKeys = { one: ['business'] as const, areas: ['areas'] as const };

export const businessQueries = {
  one: () =>
    queryOptions({
      queryKey: businessKeys.one,
      queryFn: ({ signal }) => callApi(getBusiness, { signal }),
    }),
  areas: () =>
    queryOptions({
      queryKey: businessKeys.areas,
      queryFn: ({ signal }) => callApi(listAreas, { signal }),
      staleTime: 60_000,
    }),
};

export const useUpdateBusiness = () =>
  useApiMutation(updateBusiness, [businessKeys.one, dayKeys.all]);

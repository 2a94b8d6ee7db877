import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { getBusiness, listAreas, updateBusiness } from '#shared/api/business.ts';
import { getSession } from '#shared/api/session.ts';
import { callApi } from './callApi.ts';
import type { CallParts } from './sendRequest.ts';
import { setSession } from './sessionStore.ts';

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

/** The sign-in carries name, zone and units too, so it is read again. */
export function useUpdateBusiness() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (parts: CallParts<typeof updateBusiness>) => callApi(updateBusiness, parts),
    onSuccess: async () => {
      setSession(await callApi(getSession, {}));
      await client.invalidateQueries();
    },
  });
}

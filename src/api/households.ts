import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import {
  createHousehold,
  createSite,
  getHousehold,
  listHouseholds,
  listSites,
  openGate,
  removeSite,
  updateHousehold,
  updateSite,
} from '#shared/api/households.ts';
import { callApi } from './callApi.ts';
import { useApiMutation } from './useApiMutation.ts';

export const householdKeys = { all: ['households'] as const, sites: ['sites'] as const };

export const householdQueries = {
  list: (text: string, page: number) =>
    queryOptions({
      queryKey: [...householdKeys.all, 'list', text, page],
      queryFn: ({ signal }) => callApi(listHouseholds, { query: { text, page }, signal }),
      placeholderData: keepPreviousData,
    }),
  one: (householdId: string) =>
    queryOptions({
      queryKey: [...householdKeys.all, 'one', householdId],
      queryFn: ({ signal }) => callApi(getHousehold, { params: { householdId }, signal }),
    }),
  sites: () =>
    queryOptions({
      queryKey: householdKeys.sites,
      queryFn: ({ signal }) => callApi(listSites, { signal }),
    }),
};

export const useCreateHousehold = () =>
  useApiMutation(createHousehold, [householdKeys.all, householdKeys.sites]);
export const useUpdateHousehold = () =>
  useApiMutation(updateHousehold, [householdKeys.all, householdKeys.sites]);
/** Every call is logged on the server with who and when. */
export const useOpenGate = () => useApiMutation(openGate, []);
export const useCreateSite = () => useApiMutation(createSite, [householdKeys.sites]);
export const useUpdateSite = () =>
  useApiMutation(updateSite, [householdKeys.sites, householdKeys.all]);
export const useRemoveSite = () => useApiMutation(removeSite, [householdKeys.sites]);

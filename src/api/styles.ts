import { queryOptions } from '@tanstack/react-query';
import { createStyle, listStyles, retireStyle, updateStyle } from '#shared/api/styles.ts';
import { callApi } from './callApi.ts';
import { householdKeys } from './households.ts';
import { petKeys } from './pets.ts';
import { petStyleKeys } from './petStyles.ts';
import { useApiMutation } from './useApiMutation.ts';

export const styleKeys = { all: ['styles'] as const };

export const styleQueries = {
  list: () =>
    queryOptions({
      queryKey: styleKeys.all,
      queryFn: ({ signal }) => callApi(listStyles, { signal }),
      staleTime: 60_000,
    }),
};

/** Pets that have a style follow its changes. */
const touched = [styleKeys.all, petKeys.all, petStyleKeys.all, householdKeys.all];

export const useCreateStyle = () => useApiMutation(createStyle, [styleKeys.all]);
export const useUpdateStyle = () => useApiMutation(updateStyle, touched);
export const useRetireStyle = () => useApiMutation(retireStyle, [styleKeys.all]);

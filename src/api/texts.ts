import { queryOptions } from '@tanstack/react-query';
import {
  listFakeLetters,
  listFakePhones,
  listTexts,
  replyFromFakePhone,
} from '#shared/api/texts.ts';
import { callApi } from './callApi.ts';
import { useApiMutation } from './useApiMutation.ts';

export const textKeys = { all: ['texts'] as const, fakes: ['fakes'] as const };

export const textQueries = {
  latest: () =>
    queryOptions({
      queryKey: [...textKeys.all, 'latest'],
      queryFn: ({ signal }) => callApi(listTexts, { signal }),
    }),
  ofHousehold: (householdId: string) =>
    queryOptions({
      queryKey: [...textKeys.all, householdId],
      queryFn: ({ signal }) => callApi(listTexts, { query: { householdId }, signal }),
    }),
  fakePhones: () =>
    queryOptions({
      queryKey: [...textKeys.fakes, 'phones'],
      queryFn: ({ signal }) => callApi(listFakePhones, { signal }),
    }),
  fakeLetters: () =>
    queryOptions({
      queryKey: [...textKeys.fakes, 'letters'],
      queryFn: ({ signal }) => callApi(listFakeLetters, { signal }),
    }),
};

export const useReplyFromFakePhone = () =>
  useApiMutation(replyFromFakePhone, [textKeys.all, textKeys.fakes]);

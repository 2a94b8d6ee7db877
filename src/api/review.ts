import { queryOptions } from '@tanstack/react-query';
import { exportReview, getReview } from '#shared/api/review.ts';
import { callApi } from './callApi.ts';
import { addressOf } from './sendRequest.ts';

export const reviewKeys = { all: ['review'] as const };

export const reviewQueries = {
  week: (date?: string) =>
    queryOptions({
      queryKey: [...reviewKeys.all, date ?? 'today'],
      queryFn: ({ signal }) => callApi(getReview, { query: date ? { date } : {}, signal }),
    }),
};

/** Where the same week comes as CSV, for a plain link. */
export const reviewCsvAddress = (date: string) => addressOf(exportReview.path, {}, { date });

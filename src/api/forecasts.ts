import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import type { z } from 'zod';
import { quickForecast } from '#shared/api/forecasts.ts';
import { callApi } from './callApi.ts';

export type QuickForecastFields = z.input<typeof quickForecast.body>;

export const forecastQueries = {
  /** A reading although it is sent as a body: nothing is stored. null: not enough told yet. */
  quick: (body: QuickForecastFields | null) =>
    queryOptions({
      queryKey: ['quick-forecast', body],
      queryFn: ({ signal }) => callApi(quickForecast, { body: body!, signal }),
      enabled: body !== null,
      placeholderData: keepPreviousData,
      staleTime: 30_000,
    }),
};

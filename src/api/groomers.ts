import { queryOptions } from '@tanstack/react-query';
import {
  createGroomer,
  listGroomers,
  listShifts,
  removeShift,
  setShift,
  updateGroomer,
} from '#shared/api/groomers.ts';
import { callApi } from './callApi.ts';
import { dayKeys } from './days.ts';
import { useApiMutation } from './useApiMutation.ts';

export const groomerKeys = { all: ['groomers'] as const, shifts: ['shifts'] as const };

export const groomerQueries = {
  list: () =>
    queryOptions({
      queryKey: groomerKeys.all,
      queryFn: ({ signal }) => callApi(listGroomers, { signal }),
    }),
  shifts: (from: string, to: string) =>
    queryOptions({
      queryKey: [...groomerKeys.shifts, from, to],
      queryFn: ({ signal }) => callApi(listShifts, { query: { from, to }, signal }),
    }),
};

export const useCreateGroomer = () => useApiMutation(createGroomer, [groomerKeys.all]);
export const useUpdateGroomer = () => useApiMutation(updateGroomer, [groomerKeys.all, dayKeys.all]);
export const useSetShift = () => useApiMutation(setShift, [groomerKeys.shifts, dayKeys.all]);
export const useRemoveShift = () => useApiMutation(removeShift, [groomerKeys.shifts, dayKeys.all]);

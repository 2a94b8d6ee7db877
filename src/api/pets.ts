import { queryOptions } from '@tanstack/react-query';
import { createPet, getPet, updatePet } from '#shared/api/pets.ts';
import { callApi } from './callApi.ts';
import { householdKeys } from './households.ts';
import { useApiMutation } from './useApiMutation.ts';

export const petKeys = { all: ['pets'] as const };

export const petQueries = {
  one: (petId: string) =>
    queryOptions({
      queryKey: [...petKeys.all, petId],
      queryFn: ({ signal }) => callApi(getPet, { params: { petId }, signal }),
    }),
};

export const useCreatePet = () => useApiMutation(createPet, [petKeys.all, householdKeys.all]);
export const useUpdatePet = () => useApiMutation(updatePet, [petKeys.all, householdKeys.all]);

import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { addPetStyle, listPetStyles } from '#shared/api/petStyles.ts';
import { removePhoto } from '#shared/api/photos.ts';
import { callApi } from './callApi.ts';
import { householdKeys } from './households.ts';
import { petKeys } from './pets.ts';
import { uploadPhoto } from './uploadPhoto.ts';
import { useApiMutation } from './useApiMutation.ts';

export const petStyleKeys = { all: ['pet-styles'] as const };

export const petStyleQueries = {
  list: (petId: string) =>
    queryOptions({
      queryKey: [...petStyleKeys.all, petId],
      queryFn: ({ signal }) => callApi(listPetStyles, { params: { petId }, signal }),
    }),
};

export const useAddPetStyle = () =>
  useApiMutation(addPetStyle, [petStyleKeys.all, petKeys.all, householdKeys.all]);
export const useRemovePhoto = () => useApiMutation(removePhoto, [petStyleKeys.all]);

/** Sends one photo; `onShare` hears how much of it has gone, 0 to 1. */
export function useAddPhoto() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (parts: {
      petId: string;
      version: number;
      file: Blob;
      onShare: (share: number) => void;
    }) => uploadPhoto(parts),
    onSuccess: () => client.invalidateQueries({ queryKey: petStyleKeys.all }),
  });
}

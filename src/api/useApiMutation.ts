import {
  useMutation,
  useQueryClient,
  type QueryKey,
  type UseMutationResult,
} from '@tanstack/react-query';
import type { Endpoint, ResponseOf } from '#shared/api/endpoint.ts';
import { callApi } from './callApi.ts';
import type { CallParts } from './sendRequest.ts';

/** A use-case as a hook: `mutateAsync({ params, body })`; the named queries are read again after it. */
export function useApiMutation<E extends Endpoint>(
  endpoint: E,
  invalidates: readonly QueryKey[],
): UseMutationResult<ResponseOf<E>, Error, CallParts<E>> {
  const client = useQueryClient();
  return useMutation({
    mutationKey: [endpoint.method, endpoint.path],
    mutationFn: (parts: CallParts<E>) => callApi(endpoint, parts),
    onSuccess: () =>
      Promise.all(invalidates.map((queryKey) => client.invalidateQueries({ queryKey }))),
  });
}

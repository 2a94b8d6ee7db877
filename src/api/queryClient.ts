import { QueryClient } from '@tanstack/react-query';
import { ApiError } from './ApiError.ts';

/** Tries again only when trying again can help. */
export const queryClient = new QueryClient({
  defaultOptions: {
    queries: {
      // A paused query would show its skeleton for ever; offline is an answer too.
      networkMode: 'always',
      staleTime: 15_000,
      retry: (tries, error) =>
        tries < 2 && !(error instanceof ApiError && error.status >= 400 && error.status < 500),
    },
    mutations: { networkMode: 'always', retry: false },
  },
});

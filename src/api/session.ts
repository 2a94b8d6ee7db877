import { useMutation, useQueryClient } from '@tanstack/react-query';
import { acceptInvitation } from '#shared/api/members.ts';
import {
  requestPasswordReset,
  resetPassword,
  signIn,
  signOut,
  signUp,
  switchBusiness,
  type Session,
} from '#shared/api/session.ts';
import { localDateAt } from '#shared/time/dayStart.ts';
import type { Endpoint } from '#shared/api/endpoint.ts';
import { callApi } from './callApi.ts';
import type { CallParts } from './sendRequest.ts';
import { serverNowMs, setSession, useSession } from './sessionStore.ts';
import { useApiMutation } from './useApiMutation.ts';

export const useSignIn = () => useEntry(signIn);
export const useSignUp = () => useEntry(signUp);
export const useAcceptInvitation = () => useEntry(acceptInvitation);
export const useSwitchBusiness = () => useEntry(switchBusiness);
export const useRequestPasswordReset = () => useApiMutation(requestPasswordReset, []);
export const useResetPassword = () => useApiMutation(resetPassword, []);

/** Ends the sign-in here even when the server cannot be told. */
export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: () => callApi(signOut, {}),
    onSettled: () => {
      setSession(null);
      client.clear();
    },
  });
}

/** Today's date where the business works, by the server's clock. */
export function useToday(): string {
  return localDateAt(serverNowMs(), useSession().business.timeZone);
}

/** A use-case that answers with a sign-in: what another person or business saw is forgotten first. */
function useEntry<E extends Endpoint>(endpoint: E) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (parts: CallParts<E>) => callApi(endpoint, parts),
    onSuccess: (answer) => {
      client.clear();
      setSession(answer as Session);
    },
  });
}

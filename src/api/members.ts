import { queryOptions } from '@tanstack/react-query';
import {
  getInvitation,
  inviteMember,
  listMembers,
  removeMember,
  updateMember,
  withdrawInvitation,
} from '#shared/api/members.ts';
import { callApi } from './callApi.ts';
import { groomerKeys } from './groomers.ts';
import { useApiMutation } from './useApiMutation.ts';

export const memberKeys = { all: ['members'] as const };

export const memberQueries = {
  list: () =>
    queryOptions({
      queryKey: memberKeys.all,
      queryFn: ({ signal }) => callApi(listMembers, { signal }),
    }),
  invitation: (token: string) =>
    queryOptions({
      queryKey: ['invitation', token],
      queryFn: ({ signal }) => callApi(getInvitation, { params: { token }, signal }),
      staleTime: Infinity,
    }),
};

export const useInviteMember = () => useApiMutation(inviteMember, [memberKeys.all]);
export const useWithdrawInvitation = () => useApiMutation(withdrawInvitation, [memberKeys.all]);
export const useUpdateMember = () =>
  useApiMutation(updateMember, [memberKeys.all, groomerKeys.all]);
export const useRemoveMember = () =>
  useApiMutation(removeMember, [memberKeys.all, groomerKeys.all]);

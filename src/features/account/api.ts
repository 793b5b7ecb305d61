import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import {
  acceptInvitation,
  changePassword,
  forgotPassword,
  readInvitation,
  renameMe,
  resetPassword,
  signIn,
  signOutEverywhere,
} from '../../../shared/contracts/account';
import type { Input } from '../../../shared/contracts/endpoint';
import { call } from '../../lib/api';
import { meQuery, useChangeOfPerson } from '../../lib/session';

export const useSignIn = () => {
  const changePerson = useChangeOfPerson();
  return useMutation({
    mutationFn: (input: Input<typeof signIn>) => call(signIn, input),
    onSuccess: ({ me }) => changePerson(me),
  });
};

export const useSignOutEverywhere = () => {
  const changePerson = useChangeOfPerson();
  return useMutation({ mutationFn: () => call(signOutEverywhere, {}), onSuccess: () => changePerson(null) });
};

export const useForgotPassword = () =>
  useMutation({ mutationFn: (input: Input<typeof forgotPassword>) => call(forgotPassword, input) });

export const useResetPassword = () =>
  useMutation({ mutationFn: (input: Input<typeof resetPassword>) => call(resetPassword, input) });

export const useChangePassword = () =>
  useMutation({ mutationFn: (input: Input<typeof changePassword>) => call(changePassword, input) });

export const useRenameMe = () => {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: (input: Input<typeof renameMe>) => call(renameMe, input),
    onSuccess: ({ me }) => queries.setQueryData(meQuery.queryKey, me),
  });
};

export const invitationQuery = (secret: string) =>
  queryOptions({
    queryKey: ['invitation', secret],
    queryFn: ({ signal }) => call(readInvitation, { secret }, { signal }),
    retry: false,
    staleTime: Number.POSITIVE_INFINITY,
  });

export const useAcceptInvitation = () => {
  const changePerson = useChangeOfPerson();
  return useMutation({
    mutationFn: (input: Input<typeof acceptInvitation>) => call(acceptInvitation, input),
    onSuccess: ({ me }) => changePerson(me),
  });
};

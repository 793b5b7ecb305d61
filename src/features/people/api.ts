import { infiniteQueryOptions, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { Input } from '../../../shared/contracts/endpoint';
import * as contract from '../../../shared/contracts/people';
import { call } from '../../lib/api';

export const teamQuery = (team: string) =>
  queryOptions({ queryKey: ['team', team], queryFn: ({ signal }) => call(contract.getTeam, { team }, { signal }) });

export const peopleQuery = (team: string) =>
  infiniteQueryOptions({
    queryKey: ['people', team],
    queryFn: ({ pageParam, signal }) => call(contract.listPeople, { team, ...pageParam }, { signal }),
    initialPageParam: {} as { cursor?: string },
    getNextPageParam: ({ nextCursor }) => (nextCursor ? { cursor: nextCursor } : undefined),
  });

export const invitationsQuery = (team: string) =>
  queryOptions({
    queryKey: ['invitations', team],
    queryFn: ({ signal }) => call(contract.listInvitations, { team }, { signal }),
  });

export const trailQuery = (team: string) =>
  infiniteQueryOptions({
    queryKey: ['trail', team],
    queryFn: ({ pageParam, signal }) => call(contract.listAudit, { team, ...pageParam }, { signal }),
    initialPageParam: {} as { cursor?: string },
    getNextPageParam: ({ nextCursor }) => (nextCursor ? { cursor: nextCursor } : undefined),
  });

export const noticesQuery = (team: string) =>
  infiniteQueryOptions({
    queryKey: ['notices', team],
    queryFn: ({ pageParam, signal }) => call(contract.listNotices, { team, ...pageParam }, { signal }),
    initialPageParam: {} as { cursor?: string },
    getNextPageParam: ({ nextCursor }) => (nextCursor ? { cursor: nextCursor } : undefined),
  });

export const useReadNotices = (team: string) => {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: () => call(contract.readNotices, { team }),
    onSuccess: () => queries.invalidateQueries({ queryKey: ['notices', team] }),
  });
};

const useChangeOfPeople = (team: string) => {
  const queries = useQueryClient();
  return () =>
    Promise.all([
      queries.invalidateQueries({ queryKey: ['people', team] }),
      queries.invalidateQueries({ queryKey: ['invitations', team] }),
      queries.invalidateQueries({ queryKey: ['me'] }),
    ]);
};

export const useInvite = (team: string) => {
  const onSuccess = useChangeOfPeople(team);
  return useMutation({
    mutationFn: (input: Omit<Input<typeof contract.invitePerson>, 'team'>) =>
      call(contract.invitePerson, { team, ...input }),
    onSuccess,
  });
};

export const useRevokeInvitation = (team: string) => {
  const onSuccess = useChangeOfPeople(team);
  return useMutation({
    mutationFn: (invitationId: string) => call(contract.revokeInvitation, { team, invitationId }),
    onSuccess,
  });
};

export const useChangeRole = (team: string) => {
  const onSuccess = useChangeOfPeople(team);
  return useMutation({
    mutationFn: (input: Omit<Input<typeof contract.changeRole>, 'team'>) =>
      call(contract.changeRole, { team, ...input }),
    onSuccess,
  });
};

export const useRemovePerson = (team: string) => {
  const onSuccess = useChangeOfPeople(team);
  return useMutation({ mutationFn: (personId: string) => call(contract.removePerson, { team, personId }), onSuccess });
};

export const useUpdateTeam = (team: string) => {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: (input: Omit<Input<typeof contract.updateTeam>, 'team'>) =>
      call(contract.updateTeam, { team, ...input }),
    onSuccess: (changed) => {
      queries.setQueryData(teamQuery(team).queryKey, changed);
      return queries.invalidateQueries({ queryKey: ['me'] });
    },
  });
};

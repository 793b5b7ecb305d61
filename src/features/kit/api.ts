import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { Input } from '../../../shared/contracts/endpoint';
import * as contract from '../../../shared/contracts/kit';
import type { OwnedKit } from '../../../shared/domain/kit/kit';
import { call } from '../../lib/api';

export const myKitQuery = (team: string) =>
  queryOptions({
    queryKey: ['my-kit', team],
    queryFn: async ({ signal }) => (await call(contract.getMyKit, { team }, { signal })).items,
  });

/** What one owns decides what a day and a search show. */
export const useSaveMyKit = (team: string) => {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: (items: OwnedKit[]) => call(contract.saveMyKit, { team, items }),
    onSuccess: ({ items }) => {
      queries.setQueryData(myKitQuery(team).queryKey, items);
      return Promise.all([
        queries.invalidateQueries({ queryKey: ['my-day', team] }),
        queries.invalidateQueries({ queryKey: ['search', team] }),
      ]);
    },
  });
};

const useChangeOfKit = (team: string) => {
  const queries = useQueryClient();
  return () => queries.invalidateQueries({ queryKey: ['kit', team] });
};

export const useAddKitItem = (team: string) => {
  const onSuccess = useChangeOfKit(team);
  return useMutation({
    mutationFn: (input: Omit<Input<typeof contract.addKitItem>, 'team'>) =>
      call(contract.addKitItem, { team, ...input }),
    onSuccess,
  });
};

export const useUpdateKitItem = (team: string) => {
  const onSuccess = useChangeOfKit(team);
  return useMutation({
    mutationFn: (input: Omit<Input<typeof contract.updateKitItem>, 'team'>) =>
      call(contract.updateKitItem, { team, ...input }),
    onSuccess,
  });
};

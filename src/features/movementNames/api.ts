import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { Input } from '../../../shared/contracts/endpoint';
import { listKit } from '../../../shared/contracts/kit';
import { createMovement, listMovementNames } from '../../../shared/contracts/movements';
import { call } from '../../lib/api';

export const movementNamesQuery = (team: string) =>
  queryOptions({
    queryKey: ['movements', team, 'names'],
    queryFn: async ({ signal }) => (await call(listMovementNames, { team }, { signal })).items,
    staleTime: 60_000,
  });

export const kitQuery = (team: string) =>
  queryOptions({
    queryKey: ['kit', team],
    queryFn: async ({ signal }) => (await call(listKit, { team }, { signal })).items,
    staleTime: 60_000,
  });

export function useCreateMovement(team: string) {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: (fields: Input<typeof createMovement>) => call(createMovement, fields),
    onSuccess: ({ id, name, otherNames, pattern }) => {
      // at hand at once: it is chosen before the list is asked for again
      queries.setQueryData(movementNamesQuery(team).queryKey, (names = []) => [
        ...names,
        { id, name, otherNames, pattern },
      ]);
      void queries.invalidateQueries({ queryKey: ['movements', team] });
    },
  });
}

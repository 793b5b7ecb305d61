import { useMutation, useQueryClient } from '@tanstack/react-query';
import type { Input } from '../../../shared/contracts/endpoint';
import { createMovement } from '../../../shared/contracts/movements';
import { call } from '../../lib/api';
import { movementNamesQuery } from '../../lib/libraryQueries';

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

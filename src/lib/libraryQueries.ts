import { queryOptions } from '@tanstack/react-query';
import { listKit } from '../../shared/contracts/kit';
import { listMovementNames } from '../../shared/contracts/movements';
import { call } from './api';

/** What several features choose from while one types: the team's kit and the names of its movements. */

export const kitQuery = (team: string) =>
  queryOptions({
    queryKey: ['kit', team],
    queryFn: async ({ signal }) => (await call(listKit, { team }, { signal })).items,
    staleTime: 60_000,
  });

export const movementNamesQuery = (team: string) =>
  queryOptions({
    queryKey: ['movements', team, 'names'],
    queryFn: async ({ signal }) => (await call(listMovementNames, { team }, { signal })).items,
    staleTime: 60_000,
  });

import {
  infiniteQueryOptions,
  keepPreviousData,
  type QueryClient,
  queryOptions,
  useMutation,
  useQueryClient,
} from '@tanstack/react-query';
import type { Input, Output } from '../../../shared/contracts/endpoint';
import * as contract from '../../../shared/contracts/movements';
import type { Pattern } from '../../../shared/domain/words';
import { call, callWithFile } from '../../lib/api';

export type MovementPage = Output<typeof contract.getMovement>;

export const movementsQuery = (team: string, { q, pattern }: { q: string; pattern: Pattern | undefined }) =>
  infiniteQueryOptions({
    queryKey: ['movements', team, 'list', q, pattern ?? null],
    queryFn: ({ pageParam, signal }) =>
      call(
        contract.listMovements,
        { team, ...(q ? { q } : {}), ...(pattern ? { pattern } : {}), ...pageParam },
        { signal },
      ),
    initialPageParam: {} as { cursor?: string },
    getNextPageParam: ({ nextCursor }) => (nextCursor ? { cursor: nextCursor } : undefined),
    placeholderData: keepPreviousData,
  });

export const movementQuery = (team: string, movementId: string) =>
  queryOptions({
    queryKey: ['movements', team, movementId],
    queryFn: ({ signal }) => call(contract.getMovement, { team, movementId }, { signal }),
  });

/** The dictionary is read everywhere: lists, plans, the day, search. */
const refresh = (queries: QueryClient, team: string) =>
  void Promise.all(
    [
      ['movements', team],
      ['search', team],
      ['my-day', team],
      ['watch', team],
    ].map((queryKey) => queries.invalidateQueries({ queryKey })),
  );

/** A changed movement is shown at once; the rest follows. */
function useTakeMovement(team: string) {
  const queries = useQueryClient();
  return (movement: contract.Movement) => {
    queries.setQueryData(movementQuery(team, movement.id).queryKey, (page) => page && { ...page, movement });
    refresh(queries, team);
  };
}

type Fields<E extends Parameters<typeof call>[0]> = Omit<Input<E>, 'team'>;

export const useCreateMovement = (team: string) => {
  const onSuccess = useTakeMovement(team);
  return useMutation({
    mutationFn: (fields: contract.MovementFields) => call(contract.createMovement, { team, ...fields }),
    onSuccess,
  });
};

export const useUpdateMovement = (team: string, movementId: string) => {
  const onSuccess = useTakeMovement(team);
  return useMutation({
    mutationFn: (change: contract.MovementFields & { version: number }) =>
      call(contract.updateMovement, { team, movementId, ...change }),
    onSuccess,
  });
};

export const useMergeMovements = (team: string) => {
  const onSuccess = useTakeMovement(team);
  return useMutation({
    mutationFn: (two: Fields<typeof contract.mergeMovements>) => call(contract.mergeMovements, { team, ...two }),
    onSuccess,
  });
};

export const useSetPicture = (team: string, movementId: string) => {
  const onSuccess = useTakeMovement(team);
  return useMutation({
    mutationFn: (file: File) => callWithFile(contract.setMovementPicture, { team, movementId }, file),
    onSuccess,
  });
};

export const useRemovePicture = (team: string, movementId: string) => {
  const onSuccess = useTakeMovement(team);
  return useMutation({ mutationFn: () => call(contract.removeMovementPicture, { team, movementId }), onSuccess });
};

export type SubstitutionFields = Omit<Fields<typeof contract.addSubstitution>, 'movementId'>;

const useChangeSubstitutions = (team: string, movementId: string) => {
  const queries = useQueryClient();
  return (change: (before: contract.Substitution[]) => contract.Substitution[]) => {
    queries.setQueryData(
      movementQuery(team, movementId).queryKey,
      (page) => page && { ...page, substitutions: change(page.substitutions) },
    );
    refresh(queries, team);
  };
};

export const useAddSubstitution = (team: string, movementId: string) => {
  const change = useChangeSubstitutions(team, movementId);
  return useMutation({
    mutationFn: (fields: SubstitutionFields) => call(contract.addSubstitution, { team, movementId, ...fields }),
    onSuccess: (added) => change((before) => [...before, added]),
  });
};

export const useUpdateSubstitution = (team: string, movementId: string) => {
  const change = useChangeSubstitutions(team, movementId);
  return useMutation({
    mutationFn: (fields: SubstitutionFields & { substitutionId: string; version: number }) =>
      call(contract.updateSubstitution, { team, movementId, ...fields }),
    onSuccess: (changed) => change((before) => before.map((one) => (one.id === changed.id ? changed : one))),
  });
};

export const useRemoveSubstitution = (team: string, movementId: string) => {
  const change = useChangeSubstitutions(team, movementId);
  return useMutation({
    mutationFn: (substitutionId: string) => call(contract.removeSubstitution, { team, movementId, substitutionId }),
    onSuccess: (_, removed) => change((before) => before.filter(({ id }) => id !== removed)),
  });
};

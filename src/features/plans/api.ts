import { infiniteQueryOptions, queryOptions, useMutation, useQueries, useQueryClient } from '@tanstack/react-query';
import { useMemo } from 'react';
import type { Input } from '../../../shared/contracts/endpoint';
import { getMovement } from '../../../shared/contracts/movements';
import type { Session } from '../../../shared/contracts/sessions';
import * as contract from '../../../shared/contracts/sessions';
import { ApiError, call } from '../../lib/api';
import { draftPlace } from '../../lib/drafts';
import type { DocumentSource, Saved } from '../../lib/keptDocument';
import type { MovementFacts } from './lineWays';
import { asWritten, readPlan, WrittenPlan } from './writtenPlan';

export const sessionsQuery = (team: string) =>
  infiniteQueryOptions({
    queryKey: ['sessions', team, 'newest first'],
    queryFn: ({ pageParam, signal }) => call(contract.listSessions, { team, ...pageParam }, { signal }),
    initialPageParam: {} as { cursor?: string },
    getNextPageParam: ({ nextCursor }) => (nextCursor ? { cursor: nextCursor } : undefined),
  });

export const sessionQuery = (team: string, sessionId: string) =>
  queryOptions({
    queryKey: ['sessions', team, sessionId],
    queryFn: ({ signal }) => call(contract.getSession, { team, sessionId }, { signal }),
  });

/** Asked again for every saved version: a plan that changed has other gaps. */
export const publishCheckQuery = (team: string, sessionId: string, version: number) =>
  queryOptions({
    queryKey: ['sessions', team, sessionId, 'publish check', version],
    queryFn: async ({ signal }) => (await call(contract.checkPublish, { team, sessionId }, { signal })).remarks,
    placeholderData: (before) => before,
    staleTime: 0,
  });

const movementFactsQuery = (team: string, movementId: string) =>
  queryOptions({
    queryKey: ['movements', team, movementId],
    queryFn: ({ signal }) => call(getMovement, { team, movementId }, { signal }),
    staleTime: 60_000,
  });

/** What is known of the movements that a plan names, by id, as far as it has arrived. */
export function useMovementFacts(team: string, movementIds: readonly string[]): ReadonlyMap<string, MovementFacts> {
  return useQueries({
    queries: movementIds.map((id) => movementFactsQuery(team, id)),
    combine: (results) =>
      new Map(results.flatMap(({ data }, at) => (data && movementIds[at] ? [[movementIds[at], data] as const] : []))),
  });
}

/** What a changed session changes elsewhere; its own page is told by what it did. */
function useTakeSession(team: string) {
  const queries = useQueryClient();
  return (session: Session): Session => {
    queries.setQueryData(sessionQuery(team, session.id).queryKey, session);
    void queries.invalidateQueries({
      queryKey: ['sessions', team],
      predicate: ({ queryKey }) => queryKey[2] !== session.id,
    });
    void queries.invalidateQueries({ queryKey: ['my-day', team] });
    return session;
  };
}

export function useCreateSession(team: string) {
  const take = useTakeSession(team);
  return useMutation({
    mutationFn: (plan: Omit<Input<typeof contract.createSession>, 'team'>) =>
      call(contract.createSession, { team, ...plan }),
    onSuccess: take,
  });
}

export type PlanDocument = Saved<WrittenPlan>;

export const asDocument = (session: Session): PlanDocument => ({
  version: session.version,
  content: asWritten(session),
});

/** Where a plan is saved, and kept until it is. */
export function usePlanSource(
  { team, sessionId, person }: { team: string; sessionId: string; person: string },
  nameOf: (movementId: string) => string,
): DocumentSource<WrittenPlan> {
  const take = useTakeSession(team);
  return {
    faultOf: (plan) => {
      const read = readPlan(plan, nameOf);
      return 'faults' in read ? (read.faults[0] ?? null) : null;
    },
    save: async (version, written) => {
      const plan = readPlan(written, nameOf);
      if ('faults' in plan) throw new ApiError('invalid', plan.faults[0] ?? 'The plan cannot be read.', 400);
      return asDocument(take(await call(contract.saveSession, { team, sessionId, version, ...plan })));
    },
    readCurrent: (current) => {
      const read = contract.getSession.response.safeParse(current);
      return read.success ? asDocument(read.data) : null;
    },
    drafts: useMemo(
      () => draftPlace({ person, team, document: 'plan', recording: sessionId }, WrittenPlan),
      [person, team, sessionId],
    ),
  };
}

/** A refusal as stale brings the session as it is now: it is shown at once. */
function useTakeCurrent(team: string) {
  const take = useTakeSession(team);
  return (error: Error) => {
    const current =
      error instanceof ApiError && error.code === 'stale' && contract.getSession.response.safeParse(error.current);
    if (current && 'data' in current && current.data) take(current.data);
  };
}

export function usePublish(team: string, sessionId: string) {
  const [take, takeCurrent] = [useTakeSession(team), useTakeCurrent(team)];
  const queries = useQueryClient();
  return useMutation({
    mutationFn: (version: number) => call(contract.publishSession, { team, sessionId, version }),
    onSuccess: (session) => {
      take(session);
      void queries.invalidateQueries({ queryKey: ['search', team] });
    },
    onError: takeCurrent,
  });
}

export function useUnpublish(team: string, sessionId: string) {
  const [take, takeCurrent] = [useTakeSession(team), useTakeCurrent(team)];
  const queries = useQueryClient();
  return useMutation({
    mutationFn: (version: number) => call(contract.unpublishSession, { team, sessionId, version }),
    onSuccess: (session) => {
      take(session);
      void queries.invalidateQueries({ queryKey: ['search', team] });
    },
    onError: takeCurrent,
  });
}

/** Removes a draft. Its own query is left alone: its page is still open. */
export function useRemoveSession(team: string, sessionId: string) {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: () => call(contract.removeSession, { team, sessionId }),
    onSuccess: () => {
      void queries.invalidateQueries({
        queryKey: ['sessions', team],
        predicate: ({ queryKey }) => queryKey[2] !== sessionId,
      });
      void queries.invalidateQueries({ queryKey: ['recordings', team] });
    },
  });
}

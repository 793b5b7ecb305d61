import {
  type InfiniteData,
  infiniteQueryOptions,
  type QueryClient,
  queryOptions,
  useMutation,
  useQueryClient,
} from '@tanstack/react-query';
import type { Input, Output } from '../../../shared/contracts/endpoint';
import {
  getRecording,
  listRecordings,
  type Recording,
  removeRecording,
  retryMaking,
  updateRecording,
} from '../../../shared/contracts/recordings';
import { listSessions } from '../../../shared/contracts/sessions';
import { call } from '../../lib/api';

/** A team's footage: one recording under ['recordings', team, id], the lists under ['recordings', team, 'list']. */

type Page = Output<typeof listRecordings>;
export type RecordingPages = InfiniteData<Page, string | undefined>;

const pageSize = 24;

export const listKey = (team: string) => ['recordings', team, 'list'] as const;

export const recordingsQuery = (team: string) =>
  infiniteQueryOptions({
    queryKey: listKey(team),
    queryFn: ({ pageParam, signal }) => call(listRecordings, { team, cursor: pageParam, limit: pageSize }, { signal }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (last: Page) => last.nextCursor ?? undefined,
  });

export const recordingQuery = (team: string, recordingId: string) =>
  queryOptions({
    queryKey: ['recordings', team, recordingId],
    queryFn: ({ signal }) => call(getRecording, { team, recordingId }, { signal }),
  });

/** The newest sessions, to choose one for a recording. */
export const sessionsToChooseQuery = (team: string) =>
  queryOptions({
    queryKey: ['sessions', team, 'to choose'],
    queryFn: async ({ signal }) => (await call(listSessions, { team, limit: 100 }, { signal })).items,
  });

/** Puts a recording as the server has it wherever it is shown. */
export function keepRecording(queries: QueryClient, team: string, recording: Recording): void {
  changeRecording(queries, team, recording.id, () => recording);
}

/** Changes a recording in the cache wherever it is shown. @returns whether any page has it */
export function changeRecording(
  queries: QueryClient,
  team: string,
  recordingId: string,
  change: (recording: Recording) => Recording,
): boolean {
  let found = false;
  const changed = (recording: Recording) => {
    if (recording.id !== recordingId) return recording;
    found = true;
    return change(recording);
  };
  queries.setQueryData(recordingQuery(team, recordingId).queryKey, (one) => (one ? changed(one) : one));
  queries.setQueryData(recordingsQuery(team).queryKey, (list) =>
    list ? { ...list, pages: list.pages.map((page) => ({ ...page, items: page.items.map(changed) })) } : list,
  );
  return found;
}

/** Takes a recording that is gone out of the cache. */
export function forgetRecording(queries: QueryClient, team: string, recordingId: string): void {
  queries.setQueryData(recordingsQuery(team).queryKey, (list) =>
    list
      ? {
          ...list,
          pages: list.pages.map((page) => ({ ...page, items: page.items.filter(({ id }) => id !== recordingId) })),
        }
      : list,
  );
}

export function useUpdateRecording(team: string) {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: (change: Omit<Input<typeof updateRecording>, 'team'>) => call(updateRecording, { team, ...change }),
    onSuccess: (recording) => {
      keepRecording(queries, team, recording);
      return queries.invalidateQueries({ queryKey: ['sessions', team] });
    },
  });
}

export function useRetryMaking(team: string) {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: (recordingId: string) => call(retryMaking, { team, recordingId }),
    onSuccess: (recording) => keepRecording(queries, team, recording),
  });
}

export function useRemoveRecording(team: string) {
  const queries = useQueryClient();
  return useMutation({
    mutationFn: (recordingId: string) => call(removeRecording, { team, recordingId }),
    onSuccess: async (_, recordingId) => {
      forgetRecording(queries, team, recordingId);
      await Promise.all([
        queries.invalidateQueries({ queryKey: listKey(team) }),
        queries.invalidateQueries({ queryKey: ['sessions', team] }),
        queries.invalidateQueries({ queryKey: ['search', team] }),
      ]);
    },
  });
}

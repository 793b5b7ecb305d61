import { infiniteQueryOptions, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { Input } from '../../../shared/contracts/endpoint';
import {
  getRecording,
  listRecordings,
  type Recording,
  retryMaking,
  updateRecording,
} from '../../../shared/contracts/recordings';
import { getSession, listSessions } from '../../../shared/contracts/sessions';
import { getWatch } from '../../../shared/contracts/watch';
import { ApiError, call } from '../../lib/api';

/** How often to ask where nothing tells of progress, ms. */
const unheardMs = 15_000;
/** Addresses are renewed this long before they end, ms. */
const renewBeforeMs = 5 * 60_000;

export const recordingQuery = (team: string, recordingId: string) =>
  queryOptions({
    queryKey: ['recordings', team, recordingId],
    queryFn: ({ signal }) => call(getRecording, { team, recordingId }, { signal }),
    refetchInterval: ({ state }) =>
      state.data?.state === 'making' || state.data?.state === 'uploading' ? unheardMs : false,
  });

/** What the picture needs. Another address in mid-play would only interrupt, so it is asked for when the old one ends. */
export const pictureQuery = (team: string, recordingId: string) =>
  queryOptions({
    queryKey: ['watch', team, recordingId, 'picture'],
    queryFn: ({ signal }) => call(getWatch, { team, recordingId }, { signal }),
    staleTime: Number.POSITIVE_INFINITY,
    gcTime: 0,
    refetchOnWindowFocus: false,
    refetchInterval: ({ state }) =>
      state.data ? Math.max(30_000, new Date(state.data.addressesEndAt).getTime() - Date.now() - renewBeforeMs) : false,
  });

export const recordingsByDate = (team: string) =>
  infiniteQueryOptions({
    queryKey: ['recordings', team, 'newest first'],
    queryFn: ({ pageParam, signal }) =>
      call(listRecordings, { team, limit: 50, ...(pageParam ? { cursor: pageParam } : {}) }, { signal }),
    initialPageParam: null as string | null,
    getNextPageParam: (last) => last.nextCursor,
  });

export const sessionOfRecording = (team: string, sessionId: string) =>
  queryOptions({
    queryKey: ['sessions', team, sessionId],
    queryFn: ({ signal }) => call(getSession, { team, sessionId }, { signal }),
  });

/** To link a recording to: the newest hundred. */
export const sessionsToLink = (team: string) =>
  queryOptions({
    queryKey: ['sessions', team, 'to link'],
    queryFn: async ({ signal }) => (await call(listSessions, { team, limit: 100 }, { signal })).items,
  });

function useTakeOver(team: string) {
  const queries = useQueryClient();
  return (recording: Recording) => {
    queries.setQueryData(recordingQuery(team, recording.id).queryKey, recording);
    // in another session its chapters lose the blocks that they showed
    void queries.invalidateQueries({ queryKey: ['chapters', team, recording.id] });
    void queries.invalidateQueries({ queryKey: ['recordings', team, 'newest first'] });
    void queries.invalidateQueries({ queryKey: ['sessions', team] });
  };
}

export function useUpdateRecording(team: string) {
  const takeOver = useTakeOver(team);
  return useMutation({
    mutationFn: (change: Input<typeof updateRecording>) => call(updateRecording, change),
    onSuccess: takeOver,
    onError: (error) => {
      if (!(error instanceof ApiError) || error.code !== 'stale') return;
      const current = getRecording.response.safeParse(error.current);
      if (current.success) takeOver(current.data);
    },
  });
}

export function useRetryMaking(team: string) {
  const takeOver = useTakeOver(team);
  return useMutation({
    mutationFn: (recordingId: string) => call(retryMaking, { team, recordingId }),
    onSuccess: takeOver,
  });
}

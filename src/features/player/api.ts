import { queryOptions, useQueryClient } from '@tanstack/react-query';
import { useMemo } from 'react';
import { getWatch, keepPlace } from '../../../shared/contracts/watch';
import { ApiError, call } from '../../lib/api';

/** The addresses in an answer are exchanged this long before they end. */
export const renewBeforeMs = 120_000;

/** How often a recording that is not ready is asked for again. */
const askAgainMs = 5000;

const isNotReady = (error: Error | null) => error instanceof ApiError && error.code === 'notReady';

/** All that the player needs, asked for anew before its addresses end, or until there is something to play. */
export const watchQuery = (team: string, recordingId: string) =>
  queryOptions({
    queryKey: ['watch', team, recordingId],
    queryFn: ({ signal }) => call(getWatch, { team, recordingId }, { signal }),
    staleTime: 60_000,
    refetchInterval: ({ state }) => {
      if (isNotReady(state.error)) return askAgainMs;
      if (!state.data) return false;
      return Math.max(1000, Date.parse(state.data.addressesEndAt) - Date.now() - renewBeforeMs);
    },
    // the sound goes on behind another tab, so its address must too
    refetchIntervalInBackground: true,
  });

/** Keeps where one stopped. What does not arrive is not worth a word: the next one says it anew. */
export function useKeepPlace(team: string, recordingId: string) {
  const queries = useQueryClient();
  return useMemo(
    () => ({
      keep(atMs: number) {
        call(keepPlace, { team, recordingId, atMs }, { afterPage: 'kept' }).catch(() => undefined);
      },
      /** Only now is the answer at hand changed: while it is watched, a change would put off its renewal. */
      leave(placeMs: number) {
        const { queryKey } = watchQuery(team, recordingId);
        const updatedAt = queries.getQueryState(queryKey)?.dataUpdatedAt;
        if (updatedAt !== undefined)
          queries.setQueryData(queryKey, (watch) => watch && { ...watch, placeMs }, { updatedAt });
      },
    }),
    [queries, team, recordingId],
  );
}

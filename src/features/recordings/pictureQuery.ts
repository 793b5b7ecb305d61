import { queryOptions } from '@tanstack/react-query';
import { getWatch } from '../../../shared/contracts/watch';
import { call } from '../../lib/api';

/** Addresses are exchanged this long before they end, ms. */
const renewBeforeMs = 5 * 60_000;

/**
 * What the desk's picture needs. Another address in mid-play would only interrupt, so one is asked for when the old one is
 * about to end and at no other time: the key stands apart from the player's, which changed chapters and cues renew.
 */
export const pictureQuery = (team: string, recordingId: string) =>
  queryOptions({
    queryKey: ['picture', team, recordingId],
    queryFn: ({ signal }) => call(getWatch, { team, recordingId }, { signal }),
    staleTime: Number.POSITIVE_INFINITY,
    gcTime: 0,
    refetchOnReconnect: false,
    refetchInterval: ({ state }) =>
      state.data ? Math.max(30_000, Date.parse(state.data.addressesEndAt) - Date.now() - renewBeforeMs) : false,
  });

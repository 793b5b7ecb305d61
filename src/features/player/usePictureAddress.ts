import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useState } from 'react';
import type { Watch } from '../../../shared/contracts/watch';
import { renewBeforeMs, watchQuery } from './api';

/**
 * The address that the picture is fetched from. Each answer brings a new one; it is taken only when the old one is about to end,
 * or did not work, so that nothing interrupts who is watching.
 */
export function usePictureAddress(team: string, watch: Watch) {
  const queries = useQueryClient();
  const fresh = { ...watch.playback, endsAt: Date.parse(watch.addressesEndAt) };
  const [held, setHeld] = useState(fresh);
  const [health, setHealth] = useState<'works' | 'failed'>('works');
  const isOver = health === 'failed' || held.endsAt - Date.now() < renewBeforeMs + 5000;
  if (fresh.url !== held.url && isOver) {
    setHeld(fresh);
    setHealth('works');
  }
  const onExpired = useCallback(() => {
    setHealth('failed');
    queries.invalidateQueries({ queryKey: watchQuery(team, watch.recordingId).queryKey });
  }, [queries, team, watch.recordingId]);
  return { source: held, onExpired };
}

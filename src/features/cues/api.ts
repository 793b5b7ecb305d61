import { queryOptions, useQueryClient } from '@tanstack/react-query';
import { useMemo } from 'react';
import { z } from 'zod';
import { type Cues, getCues, listCueVersions, restoreCues, saveCues } from '../../../shared/contracts/marks';
import { Cue } from '../../../shared/domain/chapters/cue';
import { call } from '../../lib/api';
import { draftPlace } from '../../lib/drafts';
import type { DocumentSource, Saved } from '../../lib/keptDocument';

export type CueList = readonly Cue[];

export const cuesQuery = (team: string, recordingId: string) =>
  queryOptions({
    queryKey: ['cues', team, recordingId],
    queryFn: ({ signal }) => call(getCues, { team, recordingId }, { signal }),
  });

export const cueVersionsQuery = (team: string, recordingId: string) =>
  queryOptions({
    queryKey: ['cues', team, recordingId, 'versions'],
    queryFn: async ({ signal }) => (await call(listCueVersions, { team, recordingId }, { signal })).items,
    staleTime: 0,
  });

export const asCues = ({ version, items }: Cues): Saved<CueList> => ({ version, content: items });

const kept = z.array(Cue) as z.ZodType<CueList>;

type About = { team: string; recordingId: string; person: string };

/** Where a recording's cues are saved, and kept until they are. */
export function useCueSource({ team, recordingId, person }: About): DocumentSource<CueList> {
  const take = useTakeCues(team, recordingId);
  return {
    // an edit that would break a cue is refused when it is made
    faultOf: () => null,
    save: async (version, cues) => take(await call(saveCues, { team, recordingId, version, items: [...cues] })),
    readCurrent: (current) => {
      const read = getCues.response.safeParse(current);
      return read.success ? asCues(read.data) : null;
    },
    drafts: useMemo(
      () => draftPlace({ person, team, document: 'cues', recording: recordingId }, kept),
      [person, team, recordingId],
    ),
  };
}

/** Brings an earlier version back. @throws ApiError */
export function useRestoreCues(team: string, recordingId: string) {
  const take = useTakeCues(team, recordingId);
  return async (restore: number, version: number) =>
    take(await call(restoreCues, { team, recordingId, restore, version }));
}

function useTakeCues(team: string, recordingId: string) {
  const queries = useQueryClient();
  return (cues: Cues): Saved<CueList> => {
    queries.setQueryData(cuesQuery(team, recordingId).queryKey, cues);
    void queries.invalidateQueries({ queryKey: cueVersionsQuery(team, recordingId).queryKey });
    return asCues(cues);
  };
}

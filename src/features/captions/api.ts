import { queryOptions, useQueryClient } from '@tanstack/react-query';
import { useMemo } from 'react';
import { z } from 'zod';
import {
  type Captions,
  exportCaptions,
  getCaptions,
  importCaptions,
  listCaptionVersions,
  restoreCaptions,
  saveCaptions,
} from '../../../shared/contracts/marks';
import { CaptionLine } from '../../../shared/domain/captions/captionLine';
import { addressOf, call, callWithFile } from '../../lib/api';
import { draftPlace } from '../../lib/drafts';
import type { DocumentSource, Saved } from '../../lib/keptDocument';

export type Lines = readonly CaptionLine[];

export const captionsQuery = (team: string, recordingId: string) =>
  queryOptions({
    queryKey: ['captions', team, recordingId],
    queryFn: ({ signal }) => call(getCaptions, { team, recordingId }, { signal }),
  });

export const captionVersionsQuery = (team: string, recordingId: string) =>
  queryOptions({
    queryKey: ['captions', team, recordingId, 'versions'],
    queryFn: async ({ signal }) => (await call(listCaptionVersions, { team, recordingId }, { signal })).items,
    staleTime: 0,
  });

export const captionFileAddress = (team: string, recordingId: string) =>
  addressOf(exportCaptions, { team, recordingId });

export const asLines = ({ version, lines }: Captions): Saved<Lines> => ({ version, content: lines });

/** The server's current state out of a `stale` refusal; null when it cannot be read. */
export function currentLines(current: unknown): Saved<Lines> | null {
  const read = getCaptions.response.safeParse(current);
  return read.success ? asLines(read.data) : null;
}

const kept = z.array(CaptionLine) as z.ZodType<Lines>;

type About = { team: string; recordingId: string; person: string };

/** Where a recording's caption lines are saved, and kept until they are. */
export function useCaptionSource({ team, recordingId, person }: About): DocumentSource<Lines> {
  const take = useTakeCaptions(team, recordingId);
  return {
    // an edit that would break a line is refused when it is made
    faultOf: () => null,
    save: async (version, lines) => take(await call(saveCaptions, { team, recordingId, version, lines: [...lines] })),
    readCurrent: currentLines,
    drafts: useMemo(
      () => draftPlace({ person, team, document: 'captions', recording: recordingId }, kept),
      [person, team, recordingId],
    ),
  };
}

/** Brings an earlier version back. @throws ApiError */
export function useRestoreCaptions(team: string, recordingId: string) {
  const take = useTakeCaptions(team, recordingId);
  return async (restore: number, version: number) =>
    take(await call(restoreCaptions, { team, recordingId, restore, version }));
}

/** Puts a file's lines in the place of the present ones. @throws ApiError */
export function useImportCaptions(team: string, recordingId: string) {
  const take = useTakeCaptions(team, recordingId);
  return async (file: File, version: number) => {
    const captions = await callWithFile(importCaptions, { team, recordingId, version }, file);
    return { saved: take(captions), warnings: captions.warnings };
  };
}

function useTakeCaptions(team: string, recordingId: string) {
  const queries = useQueryClient();
  return (captions: Captions): Saved<Lines> => {
    queries.setQueryData(captionsQuery(team, recordingId).queryKey, captions);
    for (const queryKey of [captionVersionsQuery(team, recordingId).queryKey, ['recordings', team], ['search', team]])
      void queries.invalidateQueries({ queryKey });
    return asLines(captions);
  };
}

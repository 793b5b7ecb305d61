import { queryOptions, useQueryClient } from '@tanstack/react-query';
import { useMemo } from 'react';
import { z } from 'zod';
import {
  type Chapters,
  exportChapters,
  getChapters,
  listChapterVersions,
  restoreChapters,
  saveChapters,
} from '../../../shared/contracts/marks';
import { Chapter } from '../../../shared/domain/chapters/chapter';
import { addressOf, call } from '../../lib/api';
import { draftPlace } from '../../lib/drafts';
import type { DocumentSource, Saved } from '../../lib/keptDocument';

export type ChapterDocument = Saved<readonly Chapter[]>;

export const chaptersQuery = (team: string, recordingId: string) =>
  queryOptions({
    queryKey: ['chapters', team, recordingId],
    queryFn: ({ signal }) => call(getChapters, { team, recordingId }, { signal }),
  });

export const chapterVersionsQuery = (team: string, recordingId: string) =>
  queryOptions({
    queryKey: ['chapters', team, recordingId, 'versions'],
    queryFn: async ({ signal }) => (await call(listChapterVersions, { team, recordingId }, { signal })).items,
    staleTime: 0,
  });

export const chapterFileAddress = (team: string, recordingId: string) =>
  addressOf(exportChapters, { team, recordingId });

/** The document without the pictures, which the server makes and nobody edits. */
export const asDocument = ({ version, items }: Chapters): ChapterDocument => ({
  version,
  content: items.map((item) => Chapter.parse(item)),
});

const listed = z.array(Chapter) as z.ZodType<readonly Chapter[]>;

type Recording = { team: string; recordingId: string; person: string };

/** Where the chapters of a recording are saved, and kept until they are. @param faultOf why they cannot be saved, or null */
export function useChapterSource(
  { team, recordingId, person }: Recording,
  faultOf: (chapters: readonly Chapter[]) => string | null,
): DocumentSource<readonly Chapter[]> {
  const take = useTakeChapters(team, recordingId);
  return {
    faultOf,
    save: async (version, content) =>
      take(await call(saveChapters, { team, recordingId, version, items: [...content] })),
    readCurrent: (current) => {
      const read = getChapters.response.safeParse(current);
      return read.success ? asDocument(read.data) : null;
    },
    drafts: useMemo(
      () => draftPlace({ person, team, document: 'chapters', recording: recordingId }, listed),
      [person, team, recordingId],
    ),
  };
}

/** Brings an earlier version back. @throws ApiError */
export function useRestoreChapters(team: string, recordingId: string) {
  const take = useTakeChapters(team, recordingId);
  return async (restore: number, version: number) =>
    take(await call(restoreChapters, { team, recordingId, restore, version }));
}

function useTakeChapters(team: string, recordingId: string) {
  const queries = useQueryClient();
  return (chapters: Chapters): ChapterDocument => {
    queries.setQueryData(chaptersQuery(team, recordingId).queryKey, chapters);
    for (const queryKey of [chapterVersionsQuery(team, recordingId).queryKey, ['recordings', team], ['search', team]])
      void queries.invalidateQueries({ queryKey });
    return asDocument(chapters);
  };
}

import { keepPreviousData, queryOptions } from '@tanstack/react-query';
import { find, suggest } from '../../../shared/contracts/search';
import type { ChapterKind } from '../../../shared/domain/words';
import { call } from '../../lib/api';

export type FindOptions = { q: string; kit: 'mine' | 'any'; kind?: ChapterKind | undefined };

export const findQuery = (team: string, { q, kit, kind }: FindOptions) =>
  queryOptions({
    queryKey: ['search', team, 'find', q, kit, kind ?? null],
    queryFn: ({ signal }) => call(find, { team, q, kit, ...(kind ? { kind } : {}) }, { signal }),
    enabled: q !== '',
    placeholderData: keepPreviousData,
  });

export const suggestQuery = (team: string, q: string) =>
  queryOptions({
    queryKey: ['search', team, 'suggest', q],
    queryFn: ({ signal }) => call(suggest, { team, q }, { signal }),
    enabled: q.trim().length > 1,
    placeholderData: keepPreviousData,
  });

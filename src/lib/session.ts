import { queryOptions, useQueryClient, useSuspenseQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { type Me, whoAmI } from '../../shared/contracts/account';
import { type Action, may } from '../../shared/domain/permissions';
import type { Role } from '../../shared/domain/words';
import { call } from './api';

/** Who is signed in, and what they may do in the team whose pages are open. */

export const meQuery = queryOptions({
  queryKey: ['me'],
  queryFn: async ({ signal }) => (await call(whoAmI, {}, { signal })).me,
  staleTime: 60_000,
});

/** Whoever is signed in, or null. */
export function useMe(): Me | null {
  return useSuspenseQuery(meQuery).data;
}

/** After sign-in or sign-out: nothing that the last person saw stays in memory. */
export function useChangeOfPerson(): (me: Me | null) => void {
  const queries = useQueryClient();
  return (me) => {
    // told first, so that open pages leave; clearing everything would leave them without word of it
    queries.setQueryData(meQuery.queryKey, me);
    queries.removeQueries({ predicate: ({ queryKey }) => queryKey[0] !== meQuery.queryKey[0] });
    queries.getMutationCache().clear();
  };
}

export type MyTeam = { slug: string; name: string; role: Role };

/** The team of the open page; inside the team's layouts there always is one. */
export function useTeam(): MyTeam {
  const { team: slug } = useParams();
  const team = useMe()?.teams.find((mine) => mine.slug === slug);
  if (!team) throw new Error('This page belongs inside a team.');
  return team;
}

/** Whether the person may do something in the team of the open page: what they may not is hidden; the server refuses it too. */
export function useMay(action: Action): boolean {
  return may(useTeam().role, action);
}

/** The path of a page of a team: `teamPath('rowers', 'find')`. */
export const teamPath = (slug: string, ...parts: string[]): string => ['/t', slug, ...parts].join('/');

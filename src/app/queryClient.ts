import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { ApiError } from '../lib/api';
import { meQuery } from '../lib/session';

/** Worth another try: what may be different the next time. */
const passing = new Set(['offline', 'broken', 'unavailable']);

export function makeQueryClient(): QueryClient {
  // a sign-in that ended anywhere shows the sign-in page, with the way back
  const onError = (error: Error) => {
    if (error instanceof ApiError && error.code === 'signInFirst') client.setQueryData(meQuery.queryKey, null);
  };
  const client = new QueryClient({
    queryCache: new QueryCache({ onError }),
    mutationCache: new MutationCache({ onError }),
    defaultOptions: {
      queries: {
        staleTime: 15_000,
        retry: (count, error) => count < 2 && error instanceof ApiError && passing.has(error.code),
      },
      mutations: { retry: false },
    },
  });
  return client;
}

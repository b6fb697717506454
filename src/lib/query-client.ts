import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';
import { isCallError } from './call-error.ts';
import { meQuery, sessionEndedQuery } from './session.ts';

/** The cache of all that the server told. A call that finds the session ended tells the shell, which asks to sign in again. */
export function createQueryClient(): QueryClient {
  const onError = (error: Error) => {
    if (isCallError(error, 'sign-in-needed') && client.getQueryData(meQuery.queryKey)) client.setQueryData(sessionEndedQuery.queryKey, true);
  };
  const client: QueryClient = new QueryClient({
    queryCache: new QueryCache({ onError }),
    mutationCache: new MutationCache({ onError }),
    defaultOptions: {
      queries: {
        staleTime: 15_000,
        // A 4xx will not get better by asking again; a lost line may.
        retry: (failures, error) => failures < 2 && isCallError(error) && (error.status === 0 || error.status >= 502),
      },
      mutations: { networkMode: 'always' },
    },
  });
  return client;
}
